import type { ComponentProps, ReactElement } from 'react';
import { controlProps, Field } from '@/components/ui/field';
import { SelectField } from '@/components/ui/select-field';
import { TextField } from '@/components/ui/text-field';

/** A field in words alone, so that a page can hand it to a form that runs in the browser. */
export type EntryFieldPlan = {
  readonly name: string;
  readonly label: string;
  readonly hint?: string;
  readonly type: 'text' | 'email' | 'password' | 'code' | 'long-text' | 'choice';
  readonly autoComplete?: string;
  /** What it holds before anybody has typed. */
  readonly value?: string;
  /** For a choice: the line for none, and the others. */
  readonly none?: string;
  readonly options?: readonly { readonly value: string; readonly label: string }[];
};

type Props = { readonly plan: EntryFieldPlan; readonly value: string; readonly error: string | undefined; readonly tries: number };

const INPUTS: Readonly<Record<'text' | 'email' | 'password' | 'code', Partial<ComponentProps<typeof TextField>>>> = {
  text: {},
  email: { type: 'email', spellCheck: false },
  password: { type: 'password', spellCheck: false },
  // No `numeric`: a recovery code has letters.
  code: { spellCheck: false },
};

/** One labelled field of the kind its plan names. */
export function EntryField({ plan, value, error, tries }: Props): ReactElement {
  const { name, label, hint, type, autoComplete, none = '', options = [] } = plan;
  const said = { label, hint, error };
  if (type === 'choice') return <SelectField id={name} name={name} none={none} options={options} chosen={value} tries={tries} {...said} />;
  if (type === 'long-text') {
    return (
      <Field id={name} {...said}>
        <textarea className="control control-long" name={name} rows={8} defaultValue={value} {...controlProps(name, said)} />
      </Field>
    );
  }
  return (
    <TextField
      id={name}
      name={name}
      {...INPUTS[type]}
      {...(autoComplete === undefined ? {} : { autoComplete })}
      {...(type === 'password' || type === 'code' ? {} : { defaultValue: value })}
      {...said}
    />
  );
}
