import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { StillPageFrame } from '@/components/site/still-page-frame';
import { words } from '@/lib/kernel/words';
import { readStillPage } from '@/lib/server/still-page';

export const metadata: Metadata = {
  title: words('site.pages.accessibility.title'),
  description: words('site.pages.accessibility.description'),
};

export default async function AccessibilityPage(): Promise<ReactElement> {
  return <StillPageFrame title={words('site.pages.accessibility.title')}>{await readStillPage('accessibility')}</StillPageFrame>;
}
