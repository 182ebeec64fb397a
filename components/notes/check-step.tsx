import type { ReactElement } from 'react';
import { answerWords, questionWords } from '@/components/checks/question-words';
import { answerInNote, beginWith } from '@/lib/checks/domain/note-answer';
import { findQuestion } from '@/lib/checks/domain/steps';
import { words } from '@/lib/kernel/words';

type Props = { readonly question: string; readonly answer: string };

const NO_NAMES: ReadonlyMap<string, string> = new Map();

/** The way from a note to the step-by-step helper, with the answer it speaks of filled in. */
export function CheckStep({ question: id, answer: text }: Props): ReactElement {
  const question = findQuestion(id);
  const answer = question === null ? null : answerInNote(question, text);
  if (question === null || answer === null) throw new Error(`The checks take no answer "${text}" to "${id}"`);
  return (
    <div className="panel panel-celadon note-check not-in-print">
      <p>
        <a className="font-strong" href={beginWith(id, text)}>
          {words('notes.check.link')}
        </a>
      </p>
      <p>{words('notes.check.asks', { question: questionWords(id, 'title') })}</p>
      <p>{words('notes.check.answer', { answer: answerWords(question, answer, NO_NAMES) })}</p>
    </div>
  );
}
