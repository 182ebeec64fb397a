import type { ReactElement, ReactNode } from 'react';

export type FieldWords = { readonly label: ReactNode; readonly hint?: ReactNode | undefined; readonly error?: string | undefined };

/** Ids of a field's parts, all made from its own, so that a summary can link to it. */
export const hintId = (id: string): string => `${id}-hint`;
export const errorId = (id: string): string => `${id}-error`;

/** What a control points to: its hint, then its error. Undefined when it has neither. */
export function describedBy(id: string, { hint, error }: FieldWords): string | undefined {
  const ids = [hint === undefined ? null : hintId(id), error === undefined ? null : errorId(id)].filter((part) => part !== null);
  return ids.length === 0 ? undefined : ids.join(' ');
}

/** Properties a refused or explained control carries. */
export function controlProps(id: string, said: FieldWords): { id: string; 'aria-describedby'?: string; 'aria-invalid'?: true } {
  const pointed = describedBy(id, said);
  return {
    id,
    ...(pointed === undefined ? {} : { 'aria-describedby': pointed }),
    ...(said.error === undefined ? {} : { 'aria-invalid': true }),
  };
}

/** Hint and error of a field or a group, in that order, above the control. */
export function FieldNotes({ id, hint, error }: Omit<FieldWords, 'label'> & { readonly id: string }): ReactElement {
  return (
    <>
      {hint === undefined ? null : (
        <p id={hintId(id)} className="field-hint">
          {hint}
        </p>
      )}
      {error === undefined ? null : (
        <p id={errorId(id)} className="field-error">
          {error}
        </p>
      )}
    </>
  );
}

type FieldProps = FieldWords & { readonly id: string; readonly children: ReactNode };

/** A visible label above its control, with hint and error between them. */
export function Field({ id, label, hint, error, children }: FieldProps): ReactElement {
  return (
    <div className={error === undefined ? 'flex flex-col gap-1' : 'field-refused flex flex-col gap-1'}>
      <label htmlFor={id} className="font-sans text-plain font-strong">
        {label}
      </label>
      <FieldNotes id={id} hint={hint} error={error} />
      {children}
    </div>
  );
}

type GroupProps = {
  readonly id: string;
  readonly legend: ReactNode;
  readonly hint?: ReactNode | undefined;
  readonly error?: string | undefined;
  /** The legend is the page's own heading already: kept for assistive technology only. */
  readonly legendIsHeading?: true | undefined;
  readonly children: ReactNode;
};

/** A fieldset for what belongs together. Links to its error land on the first control, which carries `id`. */
export function FieldGroup({ id, legend, hint, error, legendIsHeading, children }: GroupProps): ReactElement {
  const pointed = describedBy(id, { label: legend, hint, error });
  return (
    <fieldset
      className={error === undefined ? undefined : 'field-refused'}
      {...(pointed === undefined ? {} : { 'aria-describedby': pointed })}
    >
      <legend className={legendIsHeading === true ? 'sr-only' : 'mb-1 font-sans text-plain font-strong'}>{legend}</legend>
      <FieldNotes id={id} hint={hint} error={error} />
      <div className="mt-2 flex flex-col gap-1">{children}</div>
    </fieldset>
  );
}
