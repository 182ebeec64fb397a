import type { ReactElement } from 'react';

type Props = {
  readonly field: string;
  /** Spoken name: row and column together, since the table's headings are out of sight on a narrow screen. */
  readonly label: string;
  readonly value: string;
  readonly error?: string | undefined;
  readonly decimal?: true;
};

/** A field in a cell of a table. What is wrong with it stands below it. */
export function CellInput({ field, label, value, error, decimal }: Props): ReactElement {
  return (
    <>
      <input
        type="text"
        className="control"
        id={field}
        name={field}
        aria-label={label}
        defaultValue={value}
        autoComplete="off"
        {...(decimal === true ? { inputMode: 'decimal' as const } : {})}
        {...refused(field, error)}
      />
      <CellError field={field} error={error} />
    </>
  );
}

type SelectProps = Omit<Props, 'decimal'> & {
  readonly none?: string;
  readonly options: readonly { readonly value: string; readonly label: string }[];
};

/** One of a fixed list, in a cell. */
export function CellSelect({ field, label, value, error, none, options }: SelectProps): ReactElement {
  return (
    <>
      <select className="control" id={field} name={field} aria-label={label} defaultValue={value} {...refused(field, error)}>
        {none === undefined ? null : <option value="">{none}</option>}
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
      <CellError field={field} error={error} />
    </>
  );
}

/** A box to tick, in a cell. */
export function CellBox({ field, label, value, error }: Omit<Props, 'decimal'>): ReactElement {
  return (
    <>
      <input
        type="checkbox"
        className="cell-box"
        id={field}
        name={field}
        value="yes"
        aria-label={label}
        defaultChecked={value !== ''}
        {...refused(field, error)}
      />
      <CellError field={field} error={error} />
    </>
  );
}

const refused = (field: string, error: string | undefined): { 'aria-invalid'?: true; 'aria-describedby'?: string } =>
  error === undefined ? {} : { 'aria-invalid': true, 'aria-describedby': `${field}-error` };

function CellError({ field, error }: Pick<Props, 'field' | 'error'>): ReactElement | null {
  if (error === undefined) return null;
  return (
    <p id={`${field}-error`} className="field-error">
      {error}
    </p>
  );
}
