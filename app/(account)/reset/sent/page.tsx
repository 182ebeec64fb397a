import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';

export const metadata: Metadata = { title: words('accounts.reset.sent.title'), robots: { index: false } };

export default function ResetSentPage(): ReactElement {
  return (
    <div className="max-w-text">
      <PageHeading takesFocus>{words('accounts.reset.sent.title')}</PageHeading>
      <p className="mt-4">{words('accounts.reset.sent.lead')}</p>
    </div>
  );
}
