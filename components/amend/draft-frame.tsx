import type { ReactElement, ReactNode } from 'react';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';

type Props = {
  readonly title: string;
  /** Of the place. */
  readonly name: string;
  readonly back: string;
  /** Of the way back; the amendment as a whole where none is given. */
  readonly backText?: string;
  readonly takesFocus?: boolean;
  readonly children: ReactNode;
};

/** A page about a part of an amendment: the way back to the whole, its heading, and its part. */
export function DraftFrame({ title, name, back, backText, takesFocus = false, children }: Props): ReactElement {
  return (
    <>
      <p className="mb-2 font-sans text-plain">
        <a href={back}>{backText ?? words('amend.form.back', { name })}</a>
      </p>
      <PageHeading takesFocus={takesFocus}>{title}</PageHeading>
      {children}
    </>
  );
}
