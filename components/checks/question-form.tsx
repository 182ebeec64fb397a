import type { ReactElement } from 'react';
import { Disclosure } from '@/components/ui/disclosure';
import { ErrorSummary } from '@/components/ui/error-summary';
import { PageHeading } from '@/components/ui/page-heading';
import { SubmitButton } from '@/components/ui/submit-button';
import type { EntryFault, Fields } from '@/lib/checks/domain/entry';
import type { Question } from '@/lib/checks/domain/questions';
import { words, wordsAt } from '@/lib/kernel/words';
import { faultWords } from './fault-words';
import { QuestionField, type FilledBy, type PlaceOption } from './question-field';
import { questionWords } from './question-words';

export type QuestionPage = {
  readonly checkId: string;
  readonly asked: string;
  readonly questions: readonly Question[];
  readonly fields: Fields;
  readonly faults: readonly EntryFault[];
  readonly suggested: readonly string[];
  readonly fromNote: readonly string[];
  readonly settled: boolean;
  /** Names of the places the questions matter for. */
  readonly matters: readonly string[];
  readonly currencies: Readonly<Record<string, readonly string[]>>;
  readonly places: readonly PlaceOption[];
  readonly back: string;
  readonly regionsNamed: string;
};

type Props = { readonly page: QuestionPage; readonly answer: (form: FormData) => Promise<void> };

/** The heading of a page of questions: the question itself, or the name of a group asked together. */
export function headingOf(questions: readonly Question[]): string {
  const [first] = questions;
  if (first === undefined) return '';
  const group = questions.length > 1 ? wordsAt(`checks.question.groups.${first.id}`) : null;
  return group ?? (questions.length > 1 ? words('checks.question.together') : questionWords(first.id, 'title'));
}

/** One page of the check: question, why it is asked, the answers, and what it means. */
export function QuestionForm({ page, answer }: Props): ReactElement {
  const { questions, faults } = page;
  const alone = questions.length === 1;
  return (
    <form action={answer} noValidate className="flex flex-col gap-6">
      {faults.length === 0 ? null : (
        <ErrorSummary
          heading={words('checks.faults.heading', { count: faults.length })}
          faults={faults.map((fault) => ({ id: fault.field, said: faultWords(fault) }))}
          tries={faults.length}
        />
      )}
      <PageHeading takesFocus={faults.length === 0}>{headingOf(questions)}</PageHeading>
      {alone ? questions.map(({ id }) => <p key={id}>{questionWords(id, 'why')}</p>) : null}
      <Notes page={page} />
      <input type="hidden" name="id" value={page.checkId} />
      <input type="hidden" name="question" value={page.asked} />
      {questions.map((question) => (
        <Asked key={question.id} question={question} page={page} alone={alone} />
      ))}
      <div className="flex flex-wrap items-center gap-4">
        <SubmitButton busy={words('checks.question.busy')}>{words('checks.question.carryOn')}</SubmitButton>
        <a href={page.back}>{words('checks.question.back')}</a>
      </div>
    </form>
  );
}

function Notes({ page }: Pick<Props, 'page'>): ReactElement {
  return (
    <>
      {page.suggested.length > 0 ? <p className="field-hint">{words('checks.question.formNote')}</p> : null}
      {page.settled ? (
        <div className="panel panel-plain">
          <p className="font-strong">{words('checks.question.settled')}</p>
          <p>{words('checks.question.settledText')}</p>
        </div>
      ) : null}
      {page.matters.length > 0 ? <p className="field-hint">{words('checks.question.matters', { regions: page.regionsNamed })}</p> : null}
    </>
  );
}

function filledBy({ suggested, fromNote }: QuestionPage, id: string): FilledBy | undefined {
  if (fromNote.includes(id)) return 'note';
  return suggested.includes(id) ? 'form' : undefined;
}

type AskedProps = { readonly question: Question; readonly page: QuestionPage; readonly alone: boolean };

function Asked({ question, page, alone }: AskedProps): ReactElement {
  const fault = page.faults.find((one) => one.question === question.id);
  return (
    <div className="flex flex-col gap-2">
      <input type="hidden" name="asked" value={question.id} />
      <QuestionField
        question={question}
        alone={alone}
        fields={page.fields}
        error={fault === undefined ? undefined : faultWords(fault)}
        filledBy={filledBy(page, question.id)}
        currencies={page.currencies[question.id] ?? []}
        places={page.places}
        tries={page.faults.length}
      />
      <Disclosure summary={words('checks.question.help')}>
        <p>{questionWords(question.id, 'help')}</p>
        <p>{questionWords(question.id, 'findOut')}</p>
      </Disclosure>
    </div>
  );
}
