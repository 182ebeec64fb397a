import type { ReactElement, ReactNode } from 'react';

type Props = {
  readonly children: ReactNode;
  /** A step of something begun on an earlier page: reading goes on here, not at the top of the page. */
  readonly takesFocus?: boolean;
};

/** The page's one h1. */
export function PageHeading({ children, takesFocus = false }: Props): ReactElement {
  return (
    <h1 tabIndex={-1} autoFocus={takesFocus}>
      {children}
    </h1>
  );
}
