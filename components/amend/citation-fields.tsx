import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';
import { rowsIn, textIn } from '@/lib/regions/domain/entry';
import { DoButton, SelectInput, TextInput, type FormView } from './form-view';

type Props = {
  readonly view: FormView;
  /** Where a source is added that is not in the sheet yet. */
  readonly newSource: string;
};

const STANDINGS = ['law', 'guidance', 'standard', 'lab', 'common-practice'] as const;
const EVIDENCE = ['read', 'memory'] as const;

export const evidenceOptions = (): readonly { value: string; label: string }[] =>
  EVIDENCE.map((value) => ({ value, label: words(`amend.option.evidence.${value}`) }));

/** What a rule or a word rests on: sources of the sheet, each with the place in it and the lines themselves. */
export function CitationFields({ view, newSource }: Props): ReactElement {
  const rows = Array.from({ length: rowsIn(view.values, 'sources') }, (_, row) => row);
  const error = view.faults['sources'];
  return (
    <>
      {error === undefined ? null : <p className="field-error">{error}</p>}
      {rows.map((row) => (
        <Citation key={row} view={view} row={row} />
      ))}
      <div className="flex flex-wrap items-center gap-4">
        <DoButton act="add:sources" id="add-sources">
          {words('amend.citation.add')}
        </DoButton>
        <a href={newSource}>{words('amend.citation.newSource')}</a>
      </div>
    </>
  );
}

function Citation({ view, row }: { readonly view: FormView; readonly row: number }): ReactElement {
  const at = `sources.${String(row)}`;
  const about = words('amend.citation.number', { number: row + 1 });
  return (
    <fieldset className="amend-block">
      <legend className="font-sans text-plain font-strong">{about}</legend>
      <div className="flex flex-col gap-4">
        <SelectInput
          view={view}
          name={`${at}.source`}
          label={words('amend.citation.source')}
          options={view.sources.map(({ id, title }) => ({ value: id, label: title }))}
        />
        <TextInput
          view={view}
          name={`${at}.locator`}
          label={words('amend.citation.locator')}
          hint={words('amend.citation.locatorHint')}
          optional
        />
        <TextInput
          view={view}
          name={`${at}.passage`}
          label={words('amend.citation.passage')}
          hint={words('amend.citation.passageHint')}
          kind="long"
          lang={textIn(view.values, `${at}.passageLang`)}
        />
        <div className="amend-row">
          <TextInput
            view={view}
            name={`${at}.passageLang`}
            label={words('amend.citation.passageLang')}
            hint={words('amend.citation.passageLangHint')}
          />
          <SelectInput
            view={view}
            name={`${at}.standing`}
            label={words('amend.citation.standing')}
            options={STANDINGS.map((value) => ({ value, label: words(`amend.option.standing.${value}`) }))}
          />
          <SelectInput view={view} name={`${at}.evidence`} label={words('amend.citation.evidence')} options={evidenceOptions()} />
        </div>
        <div className="flex flex-wrap gap-3">
          {row === 0 ? null : (
            <DoButton act={`up:${at}`} about={about}>
              {words('amend.citation.up')}
            </DoButton>
          )}
          <DoButton act={`remove:${at}`} about={about}>
            {words('amend.citation.remove')}
          </DoButton>
        </div>
      </div>
    </fieldset>
  );
}
