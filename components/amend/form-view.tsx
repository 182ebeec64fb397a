import type { ReactElement, ReactNode } from 'react';
import { controlProps, Field } from '@/components/ui/field';
import { words } from '@/lib/kernel/words';
import { listIn, type Entry } from '@/lib/regions/domain/entry';
import type { FormGround } from '@/lib/regions/domain/form-ground';

/** What the form of one item shows: what was typed, what is to be mended, what there is to choose from, and where to go on. */
export type FormView = {
  readonly values: Entry;
  readonly faults: Readonly<Record<string, string>>;
  readonly ground: FormGround;
  /** Sources of the sheet. */
  readonly sources: readonly { readonly id: string; readonly title: string }[];
  /** Name of the field that takes the focus as the page comes. */
  readonly at: string | null;
};

export type Option = { readonly value: string; readonly label: string };

type Named = {
  readonly view: FormView;
  readonly name: string;
  readonly label: string;
  readonly hint?: ReactNode;
  readonly optional?: true;
};

/** The words around a field; what need not be filled in says so. */
function saidOf({ view, name, label, hint, optional }: Named): {
  label: ReactNode;
  hint: ReactNode | undefined;
  error: string | undefined;
} {
  return { label: optional === true ? words('amend.form.optional', { label }) : label, hint, error: view.faults[name] };
}

const valueIn = ({ values }: FormView, name: string): string => {
  const value = values[name];
  return typeof value === 'string' ? value : (value?.[0] ?? '');
};

type TextProps = Named & {
  readonly kind?: 'text' | 'url' | 'date' | 'number' | 'long' | 'longest';
  /** Beside a number. */
  readonly unit?: string | undefined;
  readonly lang?: string;
};

/** Where reading goes on after a button: a script gives this the focus, a browser without one the field in it. */
function Arrival({ isHere, children }: { readonly isHere: boolean; readonly children: ReactElement }): ReactElement {
  return isHere ? (
    <div data-arrival="" tabIndex={-1}>
      {children}
    </div>
  ) : (
    children
  );
}

/** A field of text: a line, several, a day or a number. */
export function TextInput(props: TextProps): ReactElement {
  const { view, name, kind = 'text', unit, lang } = props;
  const said = saidOf(props);
  const control: Control = {
    name,
    defaultValue: valueIn(view, name),
    autoFocus: view.at === name,
    ...(lang === undefined ? {} : { lang }),
    ...controlProps(name, said),
  };
  return (
    <Arrival isHere={view.at === name}>
      <Field id={name} {...said}>
        {kind === 'long' || kind === 'longest' ? (
          <textarea className="control amend-long" rows={kind === 'long' ? 4 : 16} {...control} />
        ) : (
          <OneLine kind={kind} unit={unit} control={control} />
        )}
      </Field>
    </Arrival>
  );
}

type Control = ReturnType<typeof controlProps> & {
  readonly name: string;
  readonly defaultValue: string;
  readonly autoFocus: boolean;
  readonly lang?: string;
};

type LineProps = {
  readonly kind: 'text' | 'url' | 'date' | 'number';
  readonly unit: string | undefined;
  readonly control: Control;
};

/** A number is text, since a field of numbers loses what it cannot read. */
function OneLine({ kind, unit, control }: LineProps): ReactElement {
  const isNumber = kind === 'number';
  return (
    <div className="flex flex-wrap items-center gap-2">
      <input
        type={isNumber ? 'text' : kind}
        className={isNumber ? 'control control-amount' : 'control'}
        {...(isNumber ? { inputMode: 'decimal' as const, autoComplete: 'off' } : {})}
        {...control}
      />
      {unit === undefined ? null : <span className="font-sans text-plain">{unit}</span>}
    </div>
  );
}

type SelectProps = Named & {
  readonly options: readonly Option[];
  readonly groups?: readonly { readonly label: string; readonly options: readonly Option[] }[];
  /** The first line, while nothing is chosen. Undefined: something always is. */
  readonly none?: string;
};

/** One of a list. What was chosen stays in the list even when it is no longer offered. */
export function SelectInput(props: SelectProps): ReactElement {
  const { view, name, options, groups = [], none = words('amend.form.choose') } = props;
  const said = saidOf(props);
  const chosen = valueIn(view, name);
  const isKnown = chosen === '' || [...options, ...groups.flatMap((group) => group.options)].some(({ value }) => value === chosen);
  return (
    <Arrival isHere={view.at === name}>
      <Field id={name} {...said}>
        <select className="control" name={name} defaultValue={chosen} autoFocus={view.at === name} {...controlProps(name, said)}>
          <option value="">{none}</option>
          {isKnown ? null : <option value={chosen}>{chosen}</option>}
          <Options options={options} />
          {groups.map((group) => (
            <optgroup key={group.label} label={group.label}>
              <Options options={group.options} />
            </optgroup>
          ))}
        </select>
      </Field>
    </Arrival>
  );
}

function Options({ options }: { readonly options: readonly Option[] }): ReactElement {
  return (
    <>
      {options.map(({ value, label }) => (
        <option key={value} value={value}>
          {label}
        </option>
      ))}
    </>
  );
}

type TicksProps = { readonly view: FormView; readonly name: string; readonly legend: string; readonly options: readonly Option[] };

/** Any number of a few. */
export function TickInputs({ view, name, legend, options }: TicksProps): ReactElement {
  const chosen = listIn(view.values, name);
  const error = view.faults[name];
  return (
    <fieldset className={error === undefined ? undefined : 'field-refused'}>
      <legend className="font-sans text-plain font-strong">{legend}</legend>
      {error === undefined ? null : (
        <p id={`${name}-error`} className="field-error">
          {error}
        </p>
      )}
      <div className="amend-ticks">
        {options.map(({ value, label }, place) => (
          <label key={value} className="amend-tick">
            <input
              id={place === 0 ? name : `${name}-${value}`}
              type="checkbox"
              name={name}
              value={value}
              defaultChecked={chosen.includes(value)}
            />
            <span>{label}</span>
          </label>
        ))}
      </div>
    </fieldset>
  );
}

/** One box: ticked or not. */
export function TickInput({ view, name, label, hint }: Omit<Named, 'optional'>): ReactElement {
  return (
    <div>
      <label className="amend-tick">
        <input
          id={name}
          type="checkbox"
          name={name}
          value="yes"
          defaultChecked={valueIn(view, name) === 'yes'}
          {...(hint === undefined ? {} : { 'aria-describedby': `${name}-hint` })}
        />
        <span>{label}</span>
      </label>
      {hint === undefined ? null : (
        <p id={`${name}-hint`} className="field-hint">
          {hint}
        </p>
      )}
    </div>
  );
}

type DoProps = { readonly act: string; readonly children: string; readonly about?: string; readonly id?: string };

/** A button inside the form: keeps what was typed and shows the form again with the part added, moved or taken out. */
export function DoButton({ act, children, about, id }: DoProps): ReactElement {
  return (
    <button type="submit" name="do" value={act} className="button button-plain amend-do" {...(id === undefined ? {} : { id })}>
      {children}
      {about === undefined ? null : <span className="sr-only">: {about}</span>}
    </button>
  );
}

/** A part of a form with its heading, to which the list of contents leads. */
export function FormSection({
  id,
  title,
  lead,
  children,
}: {
  readonly id: string;
  readonly title: string;
  readonly lead?: string;
  readonly children: ReactNode;
}): ReactElement {
  return (
    <section id={id} className="amend-section" aria-labelledby={`${id}-title`}>
      <h2 id={`${id}-title`}>{title}</h2>
      {lead === undefined ? null : <p className="mt-2 max-w-text">{lead}</p>}
      <div className="mt-4 flex flex-col gap-6">{children}</div>
    </section>
  );
}
