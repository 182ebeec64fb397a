import { fieldsOfSaid } from './fields-of-said';
import type { AnswerValue } from './knowledge';
import type { Question } from './questions';
import { findQuestion } from './steps';

/** One answer that a studio note speaks of, on its way into a check. */
export type NoteAnswer = { readonly question: Question; readonly value: AnswerValue };

/** An answer as a note writes it, as the checks' own value. Null where the question takes no such answer. */
export function answerInNote(question: Question, text: string): AnswerValue | null {
  switch (question.kind) {
    case 'yesno':
      return text === 'yes' || text === 'no' ? text === 'yes' : null;
    case 'choice':
      return question.options.includes(text) ? text : null;
    case 'several':
      return question.options.includes(text) ? [text] : null;
    case 'amount':
      return /^\d{1,9}(\.\d{1,3})?$/.test(text) ? Number(text) : null;
    case 'money':
    case 'region':
      return null;
  }
}

/** The question and the answer of an address' part such as "crazed:yes". Null for anything else. */
export function readNoteAnswer(text: string): NoteAnswer | null {
  const [, id = '', said = ''] = /^([a-z][a-z-]*):([a-z0-9.-]+)$/.exec(text) ?? [];
  const question = findQuestion(id);
  const value = question === null ? null : answerInNote(question, said);
  return question === null || value === null ? null : { question, value };
}

/** The page that begins a check with that answer filled in. */
export const beginWith = (question: string, answer: string): string => `/check?with=${question}:${answer}`;

/** The other way round of `readNoteAnswer`. */
export function noteAnswerText({ question, value }: NoteAnswer): string {
  const [said] = fieldsOfSaid([question], { [question.id]: value }, [])[question.id] ?? [];
  return `${question.id}:${said ?? ''}`;
}
