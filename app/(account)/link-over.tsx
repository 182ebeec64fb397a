import type { ReactElement } from 'react';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';

/** A mailed link that cannot be used any more, and the ways on. */
export function LinkOver(): ReactElement {
  return (
    <div className="max-w-text">
      <PageHeading takesFocus>{words('accounts.over.title')}</PageHeading>
      <p className="mt-4">{words('accounts.over.lead')}</p>
      <ul className="mt-6" role="list">
        <li className="py-1">
          <a href="/sign-in">{words('accounts.over.signIn')}</a>
        </li>
        <li className="py-1">
          <a href="/sign-in/link">{words('accounts.over.link')}</a>
        </li>
        <li className="py-1">
          <a href="/reset">{words('accounts.over.reset')}</a>
        </li>
        <li className="py-1">
          <a href="/sign-up">{words('accounts.over.signUp')}</a>
        </li>
      </ul>
    </div>
  );
}
