import type { ReactElement } from 'react';
import { answerWords, questionWords } from '@/components/checks/question-words';
import type { AnswerValue } from '@/lib/checks/domain/knowledge';
import type { Question } from '@/lib/checks/domain/questions';
import { findQuestion } from '@/lib/checks/domain/steps';
import { words } from '@/lib/kernel/words';

type Props = { readonly question: string; readonly answer: string };

const NO_NAMES: ReadonlyMap<string, string> = new Map();

/** An answer as a note writes it, as the checks' own value. Null where the question takes no such answer. */
export function answerOf(question: Question, text: string): AnswerValue | null {
  switch (question.kind) {
    case 'yesno':
      return text === 'yes' || text === 'no' ? text === 'yes' : null;
    case 'choice':
      return question.options.includes(text) ? text : null;
    case 'several':
      return question.options.includes(text) ? [text] : null;
    case 'amount':
      return /^\d+(\.\d+)?$/.test(text) ? Number(text) : null;
    case 'money':
    case 'region':
      return null;
  }
}

/** The way from a note to the step-by-step helper, naming the question it is about and the answer it speaks of. */
export function CheckStep({ question: id, answer: text }: Props): ReactElement {
  const question = findQuestion(id);
  const answer = question === null ? null : answerOf(question, text);
  if (question === null || answer === null) throw new Error(`The checks take no answer "${text}" to "${id}"`);
  return (
    <div className="panel panel-celadon note-check not-in-print">
      <p>
        <a className="font-strong" href="/check">
          {words('notes.check.label')}
        </a>
      </p>
      <p>{words('notes.check.asks', { question: questionWords(id, 'title') })}</p>
      <p>{words('notes.check.answer', { answer: answerWords(question, answer, NO_NAMES) })}</p>
    </div>
  );
}
