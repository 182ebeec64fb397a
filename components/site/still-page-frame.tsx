import type { ReactElement, ReactNode } from 'react';
import { PageHeading } from '@/components/ui/page-heading';

type Props = { readonly title: string; readonly children: ReactNode };

/** A page that is only read: its heading and its text, in one column. */
export function StillPageFrame({ title, children }: Props): ReactElement {
  return (
    <article className="max-w-text">
      <PageHeading>{title}</PageHeading>
      <div className="prose mt-6">{children}</div>
    </article>
  );
}
