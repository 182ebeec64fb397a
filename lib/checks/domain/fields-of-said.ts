import { moneyField, unknownField, type Fields } from './entry';
import type { AnswerValue, Answers } from './knowledge';
import type { Question } from './questions';

/** At most this many answers stand as circles on a page; longer lists become a select. */
export const RADIOS = 7;

/** The fields a page shows for what was said before: the other way round of `readEntry`. */
export function fieldsOfSaid(questions: readonly Question[], answers: Answers, declined: readonly string[]): Fields {
  return Object.fromEntries(questions.flatMap((question) => fieldsOf(question, answers[question.id], declined.includes(question.id))));
}

type Entry = readonly [string, readonly string[]];

function fieldsOf(question: Question, value: AnswerValue | undefined, isDeclined: boolean): readonly Entry[] {
  const { id, kind } = question;
  if (value === undefined && !isDeclined) return [];
  if (value === undefined) return [hasBoxForUnknown(question) ? [unknownField(id), ['on']] : [id, ['unknown']]];
  return kind === 'money' ? moneyFieldsOf(id, value) : [[id, textsOf(kind, value)]];
}

/** Typed fields and long lists have a box of their own for "I don't know yet"; elsewhere it is one of the circles. */
function hasBoxForUnknown(question: Question): boolean {
  if (question.kind === 'choice') return question.options.length > RADIOS;
  return question.kind === 'amount' || question.kind === 'money' || question.kind === 'region';
}

function textsOf(kind: Question['kind'], value: AnswerValue): readonly string[] {
  if (kind === 'yesno') return [value === true ? 'yes' : 'no'];
  if (kind === 'several') return Array.isArray(value) && value.length > 0 ? value.map(String) : ['none'];
  return typeof value === 'number' || typeof value === 'string' ? [String(value)] : [];
}

function moneyFieldsOf(id: string, value: AnswerValue): readonly Entry[] {
  const list = typeof value === 'object' ? [value].flat() : [];
  return list.flatMap((item): readonly Entry[] => (typeof item === 'object' ? [[moneyField(id, item.currency), [item.amount]]] : []));
}
