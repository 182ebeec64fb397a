import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { StillPageFrame } from '@/components/site/still-page-frame';
import { words } from '@/lib/kernel/words';
import { readStillPage } from '@/lib/server/still-page';

export const metadata: Metadata = { title: words('site.pages.privacy.title'), description: words('site.pages.privacy.description') };

export default async function PrivacyPage(): Promise<ReactElement> {
  return <StillPageFrame title={words('site.pages.privacy.title')}>{await readStillPage('privacy')}</StillPageFrame>;
}
