import type { ReactElement } from 'react';
import { HiddenFields } from './hidden-fields';

type Props = {
  readonly action: (form: FormData) => Promise<void>;
  readonly hidden: Readonly<Record<string, string>>;
  readonly children: string;
  /** What the act is on, where its own words stand on several buttons. */
  readonly about?: string;
  readonly kind?: 'primary' | 'plain';
};

/** One act that needs no answer. */
export function PressButton({ action, hidden, children, about, kind = 'plain' }: Props): ReactElement {
  return (
    <form action={action} className="amend-press">
      <HiddenFields values={hidden} />
      <button type="submit" className={`button button-${kind}`}>
        {children}
        {about === undefined ? null : <span className="sr-only">: {about}</span>}
      </button>
    </form>
  );
}
