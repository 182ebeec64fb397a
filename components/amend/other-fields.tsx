import type { ReactElement, ReactNode } from 'react';
import { words } from '@/lib/kernel/words';
import { rowsIn } from '@/lib/regions/domain/entry';
import { CitationFields, evidenceOptions } from './citation-fields';
import { ConditionFields } from './condition-fields';
import { DoButton, FormSection, SelectInput, TextInput, TickInput, type FormView } from './form-view';
import { DateFields, ruleOptions } from './rule-fields';

type Props = { readonly view: FormView };
type TermProps = Props & { readonly newSource: string; readonly said: ReactNode };

/** Sections of the form of a word. */
export const termSections = (): readonly (readonly [id: string, title: string])[] =>
  (['says', 'condition', 'sources', 'dates'] as const).map((id) => [`part-${id}`, words(`amend.term.part.${id}`)]);

/** The form of a word that rules use. */
export function TermFields({ view, newSource, said }: TermProps): ReactElement {
  return (
    <>
      <FormSection id="part-says" title={words('amend.term.part.says')}>
        <TextInput view={view} name="name" label={words('amend.term.name')} />
        <TextInput view={view} name="says" label={words('amend.term.says')} hint={words('amend.term.saysHint')} kind="long" />
        <TickInput view={view} name="category" label={words('amend.term.category')} hint={words('amend.term.categoryHint')} />
      </FormSection>
      <FormSection id="part-condition" title={words('amend.term.part.condition')} lead={words('amend.condition.lead')}>
        <div className="amend-beside">
          <ConditionFields view={view} />
          {said}
        </div>
      </FormSection>
      <FormSection id="part-sources" title={words('amend.term.part.sources')} lead={words('amend.citation.lead')}>
        <CitationFields view={view} newSource={newSource} />
      </FormSection>
      <FormSection id="part-dates" title={words('amend.term.part.dates')}>
        <DateFields view={view} />
      </FormSection>
    </>
  );
}

/** The form of a source. The page as it was seen is attached below, by a form of its own. */
export function SourceFields({ view }: Props): ReactElement {
  return (
    <div className="flex flex-col gap-6">
      <TextInput view={view} name="title" label={words('amend.source.title')} hint={words('amend.source.titleHint')} />
      <TextInput view={view} name="publisher" label={words('amend.source.publisher')} />
      <TextInput
        view={view}
        name="identifier"
        label={words('amend.source.identifier')}
        hint={words('amend.source.identifierHint')}
        optional
      />
      <TextInput view={view} name="url" label={words('amend.source.url')} kind="url" optional />
      <TextInput
        view={view}
        name="versionDate"
        label={words('amend.source.versionDate')}
        hint={words('amend.source.versionHint')}
        optional
      />
      <TextInput view={view} name="seenOn" label={words('amend.source.seenOn')} kind="date" optional />
      <TextInput view={view} name="seenVia" label={words('amend.source.seenVia')} hint={words('amend.source.seenViaHint')} optional />
    </div>
  );
}

/** The form of a layer above. */
export function MembershipFields({ view }: Props): ReactElement {
  const rows = Array.from({ length: rowsIn(view.values, 'except') }, (_, row) => row);
  return (
    <div className="flex flex-col gap-6">
      <p className="max-w-text">{words('amend.membership.lead')}</p>
      <DateFields view={view} />
      <fieldset>
        <legend className="font-sans text-plain font-strong">{words('amend.membership.except')}</legend>
        <p className="field-hint">{words('amend.membership.exceptHint')}</p>
        {rows.map((row) => (
          <div key={row} className="amend-row mt-3">
            <SelectInput
              view={view}
              name={`except.${String(row)}.rule`}
              label={words('amend.rule.pick', { number: row + 1 })}
              options={ruleOptions(view)}
            />
            <TextInput view={view} name={`except.${String(row)}.why`} label={words('amend.membership.why', { number: row + 1 })} />
            <DoButton act={`remove:except.${String(row)}`}>{words('amend.rule.removePick', { number: row + 1 })}</DoButton>
          </div>
        ))}
        <div className="mt-2">
          <DoButton act="add:except" id="add-except">
            {words('amend.membership.add')}
          </DoButton>
        </div>
      </fieldset>
    </div>
  );
}

/** The form of somebody one can ask. */
export function ContactFields({ view }: Props): ReactElement {
  return (
    <div className="flex flex-col gap-6">
      <TextInput view={view} name="name" label={words('amend.contact.name')} />
      <TextInput view={view} name="url" label={words('amend.contact.url')} kind="url" optional />
      <TextInput view={view} name="role" label={words('amend.contact.role')} />
      <SelectInput view={view} name="evidence" label={words('amend.citation.evidence')} options={evidenceOptions()} />
    </div>
  );
}

const KINDS = ['bloc', 'country', 'part', 'standard', 'base'] as const;

/** The form of the place itself. */
export function PlaceFields({ view }: Props): ReactElement {
  return (
    <div className="flex flex-col gap-6">
      <TextInput view={view} name="name" label={words('amend.place.name')} />
      <SelectInput
        view={view}
        name="kind"
        label={words('amend.place.kind')}
        options={KINDS.map((value) => ({ value, label: words(`editions.regionKind.${value}`) }))}
      />
      <TextInput view={view} name="languages" label={words('amend.place.languages')} hint={words('amend.place.languagesHint')} />
    </div>
  );
}

/** The form of the sheet's introduction; what it looks like stands beside it. */
export function WordsFields({ view, name }: Props & { readonly name: 'text' | 'gaps' }): ReactElement {
  return <TextInput view={view} name={name} label={words(`amend.${name}.label`)} hint={words(`amend.${name}.hint`)} kind="longest" />;
}
