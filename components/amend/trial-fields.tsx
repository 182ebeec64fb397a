import type { ReactElement } from 'react';
import { optionWords, questionWords, unitShort } from '@/components/checks/question-words';
import { Disclosure } from '@/components/ui/disclosure';
import { QUESTIONS, TOPICS, type Question } from '@/lib/checks/domain/questions';
import { words } from '@/lib/kernel/words';
import { listIn, rowsIn } from '@/lib/regions/domain/entry';
import { placeOptions } from './condition-fields';
import { DoButton, FormSection, SelectInput, TextInput, TickInputs, type FormView, type Option } from './form-view';
import { ruleOptions } from './rule-fields';

type Props = { readonly view: FormView };

const LIST: readonly Question[] = QUESTIONS;
const STATUSES = ['applies', 'does-not-apply', 'not-settled', 'treat-as-applying', 'sources-disagree'] as const;

/** Sections of the form of a trial piece. */
export const trialSections = (): readonly (readonly [id: string, title: string])[] =>
  (['piece', 'answers', 'expected'] as const).map((id) => [`part-${id}`, words(`amend.trial.part.${id}`)]);

/** The form of a trial piece: what it is, what is known of it, and what its list must say. */
export function TrialFields({ view }: Props): ReactElement {
  const rows = Array.from({ length: rowsIn(view.values, 'expected') }, (_, row) => row);
  return (
    <>
      <FormSection id="part-piece" title={words('amend.trial.part.piece')}>
        <TextInput view={view} name="title" label={words('amend.trial.title')} hint={words('amend.trial.titleHint')} />
        <TextInput view={view} name="on" label={words('amend.trial.on')} kind="date" />
      </FormSection>
      <FormSection id="part-answers" title={words('amend.trial.part.answers')} lead={words('amend.trial.answersLead')}>
        {TOPICS.map((topic) => (
          <Answers key={topic} view={view} topic={topic} />
        ))}
      </FormSection>
      <FormSection id="part-expected" title={words('amend.trial.part.expected')} lead={words('amend.trial.expectedLead')}>
        {view.faults['expected'] === undefined ? null : <p className="field-error">{view.faults['expected']}</p>}
        {rows.map((row) => (
          <div key={row} className="amend-row">
            <SelectInput
              view={view}
              name={`expected.${String(row)}.rule`}
              label={words('amend.rule.pick', { number: row + 1 })}
              options={ruleOptions(view)}
            />
            <SelectInput
              view={view}
              name={`expected.${String(row)}.status`}
              label={words('amend.trial.status', { number: row + 1 })}
              options={STATUSES.map((value) => ({ value, label: words(`editions.status.${value}`) }))}
            />
            <DoButton act={`remove:expected.${String(row)}`}>{words('amend.rule.removePick', { number: row + 1 })}</DoButton>
          </div>
        ))}
        <div>
          <DoButton act="add:expected" id="add-expected">
            {words('amend.trial.add')}
          </DoButton>
        </div>
      </FormSection>
    </>
  );
}

function Answers({ view, topic }: Props & { readonly topic: (typeof TOPICS)[number] }): ReactElement {
  const own = LIST.filter((question) => question.topic === topic);
  const isSaid = own.some(({ id }) => listIn(view.values, `answers.${id}`).length > 0 || view.faults[`answers.${id}`] !== undefined);
  return (
    <Disclosure summary={words(`checks.topics.${topic}`)} open={isSaid}>
      <div className="flex flex-col gap-6">
        {own.map((question) => (
          <Answer key={question.id} view={view} question={question} />
        ))}
      </div>
    </Disclosure>
  );
}

const unknown = (): Option => ({ value: 'unknown', label: words('amend.trial.unknown') });

function Answer({ view, question }: Props & { readonly question: Question }): ReactElement {
  const { id } = question;
  const said = { view, name: `answers.${id}`, label: questionWords(id, 'short') };
  const none = words('amend.trial.notSaid');
  switch (question.kind) {
    case 'yesno':
      return <SelectInput {...said} none={none} options={[...yesNoOf(id), unknown()]} />;
    case 'choice':
      return (
        <SelectInput
          {...said}
          none={none}
          options={[...question.options.map((value) => ({ value, label: optionWords(id, value) })), unknown()]}
        />
      );
    case 'several':
      return (
        <TickInputs
          view={view}
          name={said.name}
          legend={said.label}
          options={[
            ...question.options.map((value) => ({ value, label: optionWords(id, value) })),
            { value: 'none', label: words('amend.trial.none') },
            unknown(),
          ]}
        />
      );
    case 'region':
      return <SelectInput {...said} none={none} options={[...placeOptions(view), unknown()]} />;
    case 'amount':
      return <TextInput {...said} hint={words('amend.trial.amountHint')} unit={unitShort(question.unit)} />;
    case 'money':
      return <TextInput {...said} hint={words('amend.trial.moneyHint')} />;
  }
}

const yesNoOf = (id: string): readonly Option[] => [
  { value: 'yes', label: questionWords(id, 'yes') },
  { value: 'no', label: questionWords(id, 'no') },
];
