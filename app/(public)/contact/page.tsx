import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { StillPageFrame } from '@/components/site/still-page-frame';
import { words } from '@/lib/kernel/words';
import { readStillPage } from '@/lib/server/still-page';

export const metadata: Metadata = { title: words('site.pages.contact.title'), description: words('site.pages.contact.description') };

export default async function ContactPage(): Promise<ReactElement> {
  return <StillPageFrame title={words('site.pages.contact.title')}>{await readStillPage('contact')}</StillPageFrame>;
}
