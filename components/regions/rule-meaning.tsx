import type { ReactElement } from 'react';
import { amountWords, answerWords, questionWords } from '@/components/checks/question-words';
import type { AnswerValue, Answers } from '@/lib/checks/domain/knowledge';
import type { MeaningExample, RuleMeaning } from '@/lib/checks/domain/meaning';
import { findQuestion } from '@/lib/checks/domain/steps';
import { words, wordsAt } from '@/lib/kernel/words';

/** Two editions that both were, or an amendment beside the sheet as it stands. */
export type Sides = 'editions' | 'amendment';

type Props = { readonly meaning: RuleMeaning; readonly placeNames: ReadonlyMap<string, string>; readonly sides: Sides };

/** Counts longer than this tell a reader nothing. */
const MOST_DIGITS = 6;

/** What a change does to a rule: the same meaning, or a piece that shows the difference, and how much of it there is. */
export function RuleMeaningWords({ meaning: { kind, example, share }, placeNames, sides }: Props): ReactElement {
  if (kind === 'same') return <p className="font-sans text-plain">{words('editions.means.sameOf')}</p>;
  return (
    <div className="flex flex-col gap-1 font-sans text-plain">
      {example === null ? (
        <p>{words('editions.means.noExample')}</p>
      ) : (
        <>
          <p>{pieceWords(example.answers, placeNames)}.</p>
          <p className="font-strong">
            {words(`editions.means.${sides}`, { before: statusWords(example.before), after: statusWords(example.after) })}
          </p>
        </>
      )}
      <p className="text-umber">{words(share.of.length > MOST_DIGITS ? 'editions.means.shareOnly' : 'editions.means.share', share)}</p>
    </div>
  );
}

/** The status of a rule within a sentence. */
export function statusWords(status: MeaningExample['before']): string {
  return status === null ? words('editions.example.absent') : words(`editions.status.${status}`);
}

/** The piece in a sentence: "A bowl; 40 mm deep inside; Made to be drunk from". */
export function pieceWords(answers: Answers, placeNames: ReadonlyMap<string, string>): string {
  const { form, ...others } = answers;
  const said = Object.entries(others).map(([id, answer]) => sayAnswer(id, answer, placeNames));
  if (form === undefined && said.length === 0) return words('editions.example.any');
  const shape = typeof form === 'string' ? wordsAt(`editions.example.form.${form}`) : null;
  return [shape ?? words('editions.example.piece'), ...said].join('; ');
}

function sayAnswer(id: string, answer: AnswerValue, placeNames: ReadonlyMap<string, string>): string {
  const measure = MEASURES.get(id);
  if (measure !== undefined && typeof answer === 'number') return measure(answer);
  const question = findQuestion(id);
  if (question === null) return id;
  if (question.kind === 'yesno') return questionWords(id, answer === true ? 'yes' : 'no');
  return words('editions.example.answer', { question: questionWords(id, 'short'), answer: answerWords(question, answer, placeNames) });
}

/** Measures that have a phrase of their own. */
const MEASURES = new Map<string, (value: number) => string>([
  ['depth-mm', (value) => words('editions.example.depth', { amount: amountWords(value, 'mm') })],
  ['capacity-ml', (value) => words('editions.example.capacity', { amount: amountWords(value, 'mL') })],
]);
