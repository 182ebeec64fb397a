import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';

type Props = {
  readonly what: 'mail' | 'job';
  readonly id: string;
  /** One a form: pressed twice, it is one try. */
  readonly formKey: string;
  readonly label: string;
  readonly act: (form: FormData) => Promise<void>;
};

/** Has one thing tried again that was given up. */
export function RetryButton({ what, id, formKey, label, act }: Props): ReactElement {
  return (
    <form action={act}>
      <input type="hidden" name="key" value={formKey} />
      <input type="hidden" name="what" value={what} />
      <input type="hidden" name="id" value={id} />
      <button type="submit" className="button button-plain" aria-label={label}>
        {words('stewards.outbox.retry')}
      </button>
    </form>
  );
}
