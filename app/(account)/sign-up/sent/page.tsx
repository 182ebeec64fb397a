import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';

export const metadata: Metadata = { title: words('accounts.signUp.sent.title'), robots: { index: false } };

export default function SignUpSentPage(): ReactElement {
  return (
    <div className="max-w-text">
      <PageHeading takesFocus>{words('accounts.signUp.sent.title')}</PageHeading>
      <p className="mt-4">{words('accounts.signUp.sent.lead')}</p>
      <p className="mt-3">{words.rich('accounts.signUp.sent.none', { link: (said) => <a href="/sign-up">{said}</a> })}</p>
    </div>
  );
}
