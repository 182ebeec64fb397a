'use client';

import { useActionState, type ReactElement } from 'react';
import { SubmitButton } from '@/components/ui/submit-button';
import type { EntryState } from './entry-form';

type Props = {
  readonly action: (prev: EntryState, form: FormData) => Promise<EntryState>;
  readonly first: EntryState;
  readonly hidden?: Readonly<Record<string, string>>;
  readonly submit: string;
  readonly busy: string;
  readonly kind?: 'primary' | 'plain';
  /** What the button does, where its own words stand on several. */
  readonly about?: string;
};

/** One act that needs no answer: a button, and above it why it was refused, if it was. */
export function Press({ action, first, hidden = {}, submit, busy, kind = 'plain', about }: Props): ReactElement {
  const [state, send] = useActionState(action, first);
  const faults = Object.values(state.errors);
  return (
    <form action={send} className="flex flex-col gap-2">
      <input type="hidden" name="key" value={state.key} />
      {Object.entries(hidden).map(([name, value]) => (
        <input key={name} type="hidden" name={name} value={value} />
      ))}
      {faults.length === 0 ? null : (
        <p className="field-error" role="alert">
          {faults.join('. ')}
        </p>
      )}
      <div>
        <SubmitButton busy={busy} kind={kind}>
          {submit}
          {about === undefined ? null : <span className="sr-only">: {about}</span>}
        </SubmitButton>
      </div>
    </form>
  );
}
