import type { ReactElement } from 'react';
import type { JudgedRule } from '@/lib/checks/domain/checklist';
import type { AnswerValue } from '@/lib/checks/domain/knowledge';
import type { Question } from '@/lib/checks/domain/questions';
import { findQuestion } from '@/lib/checks/domain/steps';
import { words } from '@/lib/kernel/words';
import { answerWords, questionWords } from './question-words';

/** A yes or no is a sentence by itself; other answers need the name of their question. */
function saidOf(question: Question, answer: AnswerValue, names: Props['names']): string {
  const said = answerWords(question, answer, names);
  return question.kind === 'yesno'
    ? said
    : words('checks.result.answered', { question: questionWords(question.id, 'short'), answer: said });
}

type Props = { readonly because: JudgedRule['because']; readonly names: ReadonlyMap<string, string> };

/** The answers that settle a line, in words: "Because you said: Inside depth: 95 mm". */
export function BecauseLine({ because, names }: Props): ReactElement {
  const said = because.flatMap(({ question: id, answer }) => {
    const question = findQuestion(id);
    return question === null ? [] : [saidOf(question, answer, names)];
  });
  return (
    <p className="mt-2 font-sans text-plain">
      {said.length === 0 ? words('checks.result.becauseAlways') : words('checks.result.because', { answers: said.join('; ') })}
    </p>
  );
}
