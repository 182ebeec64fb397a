'use client';

import { useActionState, useId, type ReactElement } from 'react';
import type { EntryState } from '@/components/accounts/entry-form';
import { controlProps, Field } from '@/components/ui/field';
import { SubmitButton } from '@/components/ui/submit-button';

type Props = {
  readonly action: (prev: EntryState, form: FormData) => Promise<EntryState>;
  readonly first: EntryState;
  /** What it is about: the amendment and its line, or the remark it answers. */
  readonly hidden: Readonly<Record<string, string>>;
  readonly label: string;
  readonly hint: string;
  readonly submit: string;
  readonly busy: string;
};

/** A few words on one line. There are many such forms on a page, so each says its faults itself. */
export function RemarkForm({ action, first, hidden, label, hint, submit, busy }: Props): ReactElement {
  const id = useId();
  const [state, send] = useActionState(action, first);
  const { words: atField, ...others } = state.errors;
  const error = [atField, ...Object.values(others)].find((said) => said !== undefined);
  const said = { label, hint, error };
  const { words: typed } = state.values;
  return (
    <form action={send} noValidate className="flex flex-col gap-3">
      {Object.entries({ ...hidden, key: state.key }).map(([name, value]) => (
        <input key={name} type="hidden" name={name} value={value} />
      ))}
      {error === undefined ? null : (
        <span role="alert" className="sr-only">
          {error}
        </span>
      )}
      <Field id={id} {...said}>
        <textarea
          className="control control-remark"
          name="words"
          rows={3}
          defaultValue={typeof typed === 'string' ? typed : ''}
          autoFocus={error !== undefined}
          {...controlProps(id, said)}
        />
      </Field>
      <div>
        <SubmitButton busy={busy} kind="plain">
          {submit}
        </SubmitButton>
      </div>
    </form>
  );
}
