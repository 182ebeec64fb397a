import type { ReactElement } from 'react';
import { controlProps, Field, type FieldWords } from './field';

type Props = FieldWords & {
  readonly id: string;
  readonly name: string;
  /** The first line, with an empty value: nothing is chosen beforehand. */
  readonly none: string;
  readonly options: readonly { readonly value: string; readonly label: string }[];
  readonly chosen?: string | undefined;
  /** Count of the tries so far: a changed key keeps the choice after a refusal, which a script would empty. */
  readonly tries?: number;
};

/** One of a longer, fixed list. */
export function SelectField({ id, name, none, options, chosen, tries = 0, ...said }: Props): ReactElement {
  return (
    <Field id={id} {...said}>
      <select key={tries} className="control" name={name} defaultValue={chosen ?? ''} {...controlProps(id, said)}>
        <option value="">{none}</option>
        {options.map(({ value, label }) => (
          <option key={value} value={value}>
            {label}
          </option>
        ))}
      </select>
    </Field>
  );
}
