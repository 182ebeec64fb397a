'use client';

import { useActionState, type ReactElement, type ReactNode } from 'react';
import { CheckboxGroup } from '@/components/ui/checkbox-group';
import { ErrorSummary } from '@/components/ui/error-summary';
import { SubmitButton } from '@/components/ui/submit-button';
import { EntryField, type EntryFieldPlan } from './entry-field';

/** What a form shows, as an action gives it back. */
export type EntryState = {
  readonly key: string;
  readonly values: Readonly<Record<string, string | readonly string[]>>;
  readonly errors: Readonly<Record<string, string>>;
  readonly tries: number;
};

export type EntryGroup = {
  readonly name: string;
  readonly legend: string;
  readonly hint: string;
  readonly options: readonly { readonly value: string; readonly label: string }[];
};

type Props = {
  readonly action: (prev: EntryState, form: FormData) => Promise<EntryState>;
  readonly first: EntryState;
  readonly fields: readonly EntryFieldPlan[];
  /** Boxes below the fields. */
  readonly group?: EntryGroup;
  /** Sent along, unseen. */
  readonly hidden?: Readonly<Record<string, string>>;
  readonly submit: string;
  readonly busy: string;
  /** The summary's heading for one fault, two, and so on. */
  readonly headings: readonly string[];
  readonly label?: string;
  /** Between the fields and the button. */
  readonly children?: ReactNode;
};

const listOf = (value: string | readonly string[] | undefined): readonly string[] =>
  value === undefined ? [] : typeof value === 'string' ? [value] : value;

/** Faults in the order of the page; what belongs to no field is said at the first. */
function faultsOf(state: EntryState, names: readonly string[]): readonly { id: string; said: string }[] {
  const [first = 'form'] = names;
  const inFields = names.flatMap((name) => (state.errors[name] === undefined ? [] : [{ id: name, said: state.errors[name] }]));
  const rest = Object.entries(state.errors).filter(([name]) => !names.includes(name));
  return [...rest.map(([, said]) => ({ id: first, said })), ...inFields];
}

/** A form of labelled fields that says what to mend, keeps what was typed, and works without script. */
export function EntryForm(props: Props): ReactElement {
  const { action, first, fields, group, hidden = {}, submit, busy, headings, label, children } = props;
  const [state, send] = useActionState(action, first);
  const faults = faultsOf(state, [...fields.map(({ name }) => name), ...(group === undefined ? [] : [group.name])]);
  return (
    <form action={send} noValidate className="flex flex-col gap-6" aria-label={label}>
      {faults.length === 0 ? null : (
        <ErrorSummary heading={headings[faults.length - 1] ?? headings.at(-1) ?? ''} faults={faults} tries={state.tries} />
      )}
      <input type="hidden" name="key" value={state.key} />
      {Object.entries(hidden).map(([name, value]) => (
        <input key={name} type="hidden" name={name} value={value} />
      ))}
      {fields.map((plan) => (
        <EntryField
          key={plan.name}
          plan={plan}
          value={listOf(state.values[plan.name])[0] ?? plan.value ?? ''}
          error={state.errors[plan.name]}
          tries={state.tries}
        />
      ))}
      {group === undefined ? null : (
        <CheckboxGroup
          key={state.tries}
          id={group.name}
          name={group.name}
          legend={group.legend}
          hint={group.hint}
          error={state.errors[group.name]}
          options={group.options}
          last={[]}
          chosen={listOf(state.values[group.name])}
        />
      )}
      {children}
      <div>
        <SubmitButton busy={busy}>{submit}</SubmitButton>
      </div>
    </form>
  );
}
