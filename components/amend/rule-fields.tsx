import type { ReactElement, ReactNode } from 'react';
import { words } from '@/lib/kernel/words';
import { rowsIn, textIn } from '@/lib/regions/domain/entry';
import { CitationFields } from './citation-fields';
import { ConditionFields } from './condition-fields';
import { DoButton, FormSection, SelectInput, TextInput, TickInput, type FormView, type Option } from './form-view';
import { PayloadFields } from './payload-fields';

type Props = {
  readonly view: FormView;
  readonly newSource: string;
  /** The condition in words, and the sample pots beside it. */
  readonly said: ReactNode;
};

const STRENGTHS = ['must', 'should', 'may', 'note'] as const;
const KINDS = ['adds', 'replaces', 'excepts'] as const;

/** Sections of the form of a rule: ids and headings, for its list of contents. */
export const ruleSections = (): readonly (readonly [id: string, title: string])[] =>
  (['says', 'condition', 'meets', 'sources', 'dates'] as const).map((id) => [`part-${id}`, words(`amend.rule.part.${id}`)]);

/** The form of a rule, in parts. */
export function RuleFields({ view, newSource, said }: Props): ReactElement {
  return (
    <>
      <FormSection id="part-says" title={words('amend.rule.part.says')}>
        <TextInput view={view} name="title" label={words('amend.rule.title')} />
        <TextInput view={view} name="says" label={words('amend.rule.says')} hint={words('amend.rule.saysHint')} kind="long" />
        <SelectInput
          view={view}
          name="strength"
          label={words('amend.rule.strength')}
          hint={words('amend.rule.strengthHint')}
          options={STRENGTHS.map((value) => ({ value, label: words(`amend.option.strength.${value}`) }))}
        />
        <PayloadFields view={view} />
      </FormSection>
      <FormSection id="part-condition" title={words('amend.rule.part.condition')} lead={words('amend.condition.lead')}>
        <div className="amend-beside">
          <ConditionFields view={view} />
          {said}
        </div>
      </FormSection>
      <FormSection id="part-meets" title={words('amend.rule.part.meets')}>
        <MeetsFields view={view} />
      </FormSection>
      <FormSection id="part-sources" title={words('amend.rule.part.sources')} lead={words('amend.citation.lead')}>
        <CitationFields view={view} newSource={newSource} />
      </FormSection>
      <FormSection id="part-dates" title={words('amend.rule.part.dates')}>
        <DateFields view={view} />
        <TextInput
          view={view}
          name="lookAgainBy"
          label={words('amend.rule.lookAgainBy')}
          hint={words('amend.rule.lookAgainHint')}
          kind="date"
        />
        <TextInput view={view} name="note" label={words('amend.rule.note')} kind="long" optional />
      </FormSection>
    </>
  );
}

/** In force from and until. */
export function DateFields({ view }: { readonly view: FormView }): ReactElement {
  return (
    <div className="amend-row">
      <TextInput view={view} name="from" label={words('amend.rule.from')} hint={words('amend.rule.fromHint')} kind="date" optional />
      <TextInput view={view} name="to" label={words('amend.rule.to')} hint={words('amend.rule.toHint')} kind="date" optional />
    </div>
  );
}

function MeetsFields({ view }: { readonly view: FormView }): ReactElement {
  return (
    <>
      <SelectInput
        view={view}
        name="kind"
        label={words('amend.rule.kind')}
        options={KINDS.map((value) => ({ value, label: words(`amend.option.kind.${value}`) }))}
      />
      <RulePicker view={view} list="targets" legend={words('amend.rule.targets')} hint={words('amend.rule.targetsHint')} />
      <RulePicker view={view} list="alongside" legend={words('amend.rule.alongside')} hint={words('amend.rule.alongsideHint')} />
      <TickInput view={view} name="firm" label={words('amend.rule.firm')} hint={words('amend.rule.firmHint')} />
      <TextInput view={view} name="order" label={words('amend.rule.order')} hint={words('amend.rule.orderHint')} kind="number" />
    </>
  );
}

/** Rules of the line, the sheet's own first. */
export const ruleOptions = ({ ground }: FormView): readonly Option[] =>
  ground.rules.toReversed().map(({ id, title, region }) => ({
    value: id,
    label: words('amend.condition.wordOption', { name: title, code: region.toUpperCase() }),
  }));

type PickerProps = { readonly view: FormView; readonly list: 'targets' | 'alongside'; readonly legend: string; readonly hint: string };

/** Rules that this one meets, with their words below each choice. */
function RulePicker({ view, list, legend, hint }: PickerProps): ReactElement {
  const rows = Array.from({ length: rowsIn(view.values, list) }, (_, row) => row);
  const error = view.faults[list];
  return (
    <fieldset className={error === undefined ? undefined : 'field-refused'} id={list}>
      <legend className="font-sans text-plain font-strong">{legend}</legend>
      <p className="field-hint">{hint}</p>
      {error === undefined ? null : <p className="field-error">{error}</p>}
      {rows.map((row) => (
        <PickedRule key={row} view={view} name={`${list}.${String(row)}`} number={row + 1} />
      ))}
      <div className="mt-2">
        <DoButton act={`add:${list}`} id={`add-${list}`}>
          {words(`amend.rule.add.${list}`)}
        </DoButton>
      </div>
    </fieldset>
  );
}

function PickedRule({ view, name, number }: { readonly view: FormView; readonly name: string; readonly number: number }): ReactElement {
  const chosen = view.ground.rules.find(({ id }) => id === textIn(view.values, name));
  return (
    <div className="mt-3">
      <div className="amend-row">
        <SelectInput view={view} name={name} label={words('amend.rule.pick', { number })} options={ruleOptions(view)} />
        <DoButton act={`remove:${name}`}>{words('amend.rule.removePick', { number })}</DoButton>
      </div>
      {chosen === undefined ? null : (
        <blockquote className="mt-2 font-sans text-plain">
          <strong className="font-strong">{chosen.title}</strong>: {chosen.says}
        </blockquote>
      )}
    </div>
  );
}
