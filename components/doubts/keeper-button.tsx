import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';

type Props = {
  readonly place: { readonly code: string; readonly name: string };
  /** Whether whoever reads is a keeper of it already. */
  readonly isKept: boolean;
  /** One a form: pressed twice, it is one act. */
  readonly formKey: string;
  /** Where the press leads back to. */
  readonly back: 'sheet' | 'list';
  readonly become: (form: FormData) => Promise<void>;
  readonly stop: (form: FormData) => Promise<void>;
};

/** Becomes a keeper of a sheet, or stops being one. */
export function KeeperButton({ place, isKept, formKey, back, become, stop }: Props): ReactElement {
  return (
    <form action={isKept ? stop : become}>
      <input type="hidden" name="key" value={formKey} />
      <input type="hidden" name="region" value={place.code} />
      <input type="hidden" name="back" value={back} />
      <button
        type="submit"
        className="button button-plain"
        aria-label={words(isKept ? 'doubts.keepers.stopOf' : 'doubts.keepers.becomeOf', { place: place.name })}
      >
        {words(isKept ? 'doubts.keepers.stop' : 'doubts.keepers.become')}
      </button>
    </form>
  );
}
