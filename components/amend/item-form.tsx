import type { ReactElement, ReactNode } from 'react';
import { ErrorSummary } from '@/components/ui/error-summary';
import { words } from '@/lib/kernel/words';
import { KeepEntry, type KeepWords } from './keep-entry';

type Props = {
  readonly action: (form: FormData) => Promise<void>;
  /** Of the form: one a submission. */
  readonly submission: string;
  readonly id: string;
  readonly item: string;
  /** Of the entry; 0 while there is none. */
  readonly version: number;
  /** Of the amendment. */
  readonly state: number;
  readonly faults: Readonly<Record<string, string>>;
  readonly sections: readonly (readonly [id: string, title: string])[];
  readonly save: string;
  readonly children: ReactNode;
};

const keepWords = (): KeepWords => ({
  keeping: words('amend.keep.keeping'),
  kept: words('amend.keep.kept', { time: '{time}' }),
  failed: words('amend.keep.failed'),
  signedOut: words('amend.keep.signedOut'),
  moved: words('amend.keep.moved'),
  gone: words('amend.keep.gone'),
  theirs: words('amend.keep.theirs'),
  keepMine: words('amend.keep.keepMine'),
  takeTheirs: words('amend.keep.takeTheirs'),
  copy: words('amend.keep.copy'),
  restore: words('amend.keep.restore'),
  discard: words('amend.keep.discard'),
});

/** The form of one part of an amendment: what is to be mended, its contents, its fields, and the buttons that save or keep it. */
export function ItemForm(props: Props): ReactElement {
  const { action, submission, id, item, version, state, faults, sections, save, children } = props;
  const said = Object.entries(faults).map(([field, fault]) => ({ id: field === 'form' ? 'amend-form' : field, said: fault }));
  return (
    <form action={action} id="amend-form" key={submission} noValidate className="amend-form" aria-label={words('amend.form.label')}>
      {/* Pressing Enter in a field presses the first button there is: it must be the one that loses nothing. */}
      <button type="submit" name="do" value="keep" className="sr-only" tabIndex={-1} aria-hidden="true">
        {words('amend.form.keep')}
      </button>
      {Object.entries({ key: submission, id, item, version: String(version) }).map(([name, value]) => (
        <input key={name} type="hidden" name={name} defaultValue={value} />
      ))}
      {said.length === 0 ? null : <ErrorSummary heading={words('amend.form.mend', { count: said.length })} faults={said} tries={version} />}
      {sections.length < 3 ? null : (
        <nav aria-label={words('amend.form.contents')} className="mt-4">
          <ul className="flex flex-wrap gap-x-6 font-sans text-plain" role="list">
            {sections.map(([section, title]) => (
              <li key={section} className="py-1">
                <a href={`#${section}`}>{title}</a>
              </li>
            ))}
          </ul>
        </nav>
      )}
      {children}
      <KeepEntry key={submission} id={id} item={item} version={version} state={state} said={keepWords()} />
      <div className="mt-6 flex flex-wrap gap-4">
        <button type="submit" name="do" value="save" className="button button-primary">
          {save}
        </button>
        <button type="submit" name="do" value="keep" className="button button-plain">
          {words('amend.form.keep')}
        </button>
      </div>
    </form>
  );
}
