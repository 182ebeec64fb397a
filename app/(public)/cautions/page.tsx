import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { StillPageFrame } from '@/components/site/still-page-frame';
import { words } from '@/lib/kernel/words';
import { readStillPage } from '@/lib/server/still-page';

export const metadata: Metadata = { title: words('site.pages.cautions.title'), description: words('site.pages.cautions.description') };

export default async function CautionsPage(): Promise<ReactElement> {
  return <StillPageFrame title={words('site.pages.cautions.title')}>{await readStillPage('cautions')}</StillPageFrame>;
}
