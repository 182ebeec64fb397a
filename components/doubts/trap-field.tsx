import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';

/** A field that neither eye, keyboard nor screen reader meets: programs that fill in every field fill in this one too. */
export function TrapField(): ReactElement {
  return (
    <div className="sr-only" aria-hidden="true">
      <label htmlFor="homepage">{words('doubts.raise.trap')}</label>
      <input id="homepage" name="homepage" type="text" tabIndex={-1} autoComplete="off" defaultValue="" />
    </div>
  );
}
