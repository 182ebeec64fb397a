import type { ReactElement, ReactNode } from 'react';
import { Note } from '@/components/accounts/note';
import { PageHeading } from '@/components/ui/page-heading';

type Props = {
  readonly title: ReactNode;
  /** The page this one belongs to. */
  readonly back?: { readonly href: string; readonly text: string };
  /** What was just done. */
  readonly done?: ReactNode;
  readonly children: ReactNode;
};

/** A page of the moderators' desk: where it belongs, what was just done, its heading. */
export function ReviewFrame({ title, back, done, children }: Props): ReactElement {
  return (
    <>
      {back === undefined ? null : (
        <p className="not-in-print mb-2 font-sans text-plain">
          <a href={back.href}>{back.text}</a>
        </p>
      )}
      {done === undefined || done === null ? null : <Note>{done}</Note>}
      <PageHeading>{title}</PageHeading>
      {children}
    </>
  );
}
