import type { ReactElement, ReactNode } from 'react';

type Props = { readonly summary: ReactNode; readonly open?: boolean; readonly children: ReactNode };

/** Folded until it is asked for; open in print. */
export function Disclosure({ summary, open = false, children }: Props): ReactElement {
  return (
    <details className="disclosure" open={open}>
      <summary>{summary}</summary>
      <div className="pb-3">{children}</div>
    </details>
  );
}
