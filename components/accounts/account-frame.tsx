import type { ReactElement, ReactNode } from 'react';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';

type Props = {
  readonly title: string;
  readonly back?: { readonly href: string; readonly text: string };
  readonly takesFocus?: boolean;
  readonly children: ReactNode;
};

/** A page of one's own account: where it belongs, its heading, and its part. */
export function AccountFrame({ title, back, takesFocus = false, children }: Props): ReactElement {
  const { href, text } = back ?? { href: '/bench/account', text: words('bench.account.back') };
  return (
    <div className="max-w-text">
      <p className="mb-2 font-sans text-plain">
        <a href={href}>{text}</a>
      </p>
      <PageHeading takesFocus={takesFocus}>{title}</PageHeading>
      {children}
    </div>
  );
}
