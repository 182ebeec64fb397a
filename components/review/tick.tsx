'use client';

import { useActionState, useEffect, type ReactElement } from 'react';

/** `key`: of the next press, one each. */
export type TickState = { readonly key: string; readonly isRead: boolean; readonly fault: string | null };

type Props = {
  readonly action: (prev: TickState, form: FormData) => Promise<TickState>;
  readonly first: TickState;
  /** Which claim of which version of which amendment. */
  readonly hidden: Readonly<Record<'id' | 'version' | 'claim', string>>;
  readonly label: string;
  /** Which source, where the label stands on several. */
  readonly about: string;
};

/** Told to whatever counts the ticks of the page. */
export const TICKED = 'review-ticked';

/** A box that says "I have read this source". A button, so that nothing is sent by choosing; it works without script as well. */
export function Tick({ action, first, hidden, label, about }: Props): ReactElement {
  const [{ key, isRead, fault }, send] = useActionState(action, first);
  useEffect(() => {
    window.dispatchEvent(new Event(TICKED));
  }, [isRead]);
  return (
    <form action={send} className="tick">
      {Object.entries({ ...hidden, key, read: isRead ? 'no' : 'yes' }).map(([name, value]) => (
        <input key={name} type="hidden" name={name} value={value} />
      ))}
      <button type="submit" className="tick-button" aria-pressed={isRead} data-tick="">
        <span className="tick-box" aria-hidden="true" />
        <span>
          {label}
          <span className="sr-only">: {about}</span>
        </span>
      </button>
      {fault === null ? null : (
        <p className="field-error" role="alert">
          {fault}
        </p>
      )}
    </form>
  );
}
