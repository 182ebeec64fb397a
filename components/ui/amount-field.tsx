import type { ReactElement } from 'react';
import { controlProps, Field, type FieldWords } from './field';

type Props = FieldWords & {
  readonly id: string;
  readonly name: string;
  readonly defaultValue?: string | undefined;
  /** Beside the field, as short as it is written: "mm". */
  readonly unit: string;
  /** As it is spoken: "millimetres". Part of the field's name. */
  readonly unitSpoken: string;
};

/** An amount as it is typed, comma or point. Text, not a number field: those lose what they cannot read. */
export function AmountField({ id, name, defaultValue, unit, unitSpoken, ...said }: Props): ReactElement {
  const label = (
    <>
      {said.label} <span className="sr-only">({unitSpoken})</span>
    </>
  );
  return (
    <Field id={id} hint={said.hint} error={said.error} label={label}>
      <div className="flex flex-wrap items-center gap-2">
        <input
          type="text"
          inputMode="decimal"
          autoComplete="off"
          className="control control-amount"
          name={name}
          defaultValue={defaultValue}
          {...controlProps(id, said)}
        />
        <span aria-hidden="true" className="font-sans text-plain">
          {unit}
        </span>
      </div>
    </Field>
  );
}
