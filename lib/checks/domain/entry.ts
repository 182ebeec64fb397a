import { err, ok, type Result } from '@/lib/kernel/result';
import type { AnswerValue } from './knowledge';
import type { Question } from './questions';
import { understand, type Misread, type Spoken, type Understood } from './spoken-answer';
import { findQuestion } from './steps';

/** The fields of a page of questions, as a form sends them: `depth-mm`, `depth-mm.unknown`, `turnover-a-year.DKK`. */
export type Fields = Readonly<Record<string, readonly string[]>>;

export type EntryFault = { readonly question: string; readonly field: string; readonly why: Misread | 'nothing-said' };

/** What a page of questions was answered: answers by question, and those answered "I don't know yet". */
export type ReadEntry = {
  readonly answers: Readonly<Record<string, AnswerValue>>;
  readonly declined: readonly string[];
};

/** Name of the box for "I don't know yet" of a question. */
export const unknownField = (question: string): string => `${question}.unknown`;

/** Name of the field of a money question in one currency. */
export const moneyField = (question: string, currency: string): string => `${question}.${currency}`;

/**
 * Reads a page of questions. Every question asked must be answered, were it with "I don't know yet": an empty field is
 * neither "no" nor zero. One fault a question.
 */
export function readEntry(asked: readonly string[], fields: Fields): Result<ReadEntry, readonly EntryFault[]> {
  const questions = asked.flatMap((id) => findQuestion(id) ?? []);
  const read = questions.map((question) => ({ question, understood: understand(question, spokenOf(question, fields)) }));
  const faults = read.flatMap(({ question, understood }) => faultOf(question, understood, fields));
  if (faults.length > 0) return err(faults);
  const answers = read.flatMap(({ question, understood }): readonly (readonly [string, AnswerValue])[] =>
    understood.ok && understood.value.kind === 'answered' ? [[question.id, understood.value.value]] : [],
  );
  const declined = read.filter(({ understood }) => understood.ok && isOpen(understood.value)).map(({ question }) => question.id);
  return ok({ answers: Object.fromEntries(answers), declined });
}

const isOpen = (understood: Understood): boolean => understood.kind === 'declined' || (understood.kind === 'answered' && understood.partly);

function faultOf(question: Question, understood: Result<Understood, Misread>, fields: Fields): readonly EntryFault[] {
  const why = understood.ok ? (understood.value.kind === 'nothing' ? 'nothing-said' : null) : understood.error;
  return why === null ? [] : [{ question: question.id, field: firstFieldOf(question, fields), why }];
}

/** The field that a message about this question points to. */
export function firstFieldOf({ id, kind }: Question, fields: Fields): string {
  const money = moneyFields(id, fields).map(({ currency }) => moneyField(id, currency));
  return kind === 'money' ? (money[0] ?? id) : id;
}

function spokenOf({ id, kind }: Question, fields: Fields): Spoken {
  const values = (fields[id] ?? []).filter((value) => value !== '');
  const boxTicked = (fields[unknownField(id)] ?? []).length > 0;
  if (kind === 'amount') return { chosen: [], typed: values[0] ?? '', money: [], unknown: boxTicked };
  if (kind === 'money') return { chosen: [], typed: '', money: moneyFields(id, fields), unknown: boxTicked };
  const chosen = values.filter((value) => value !== 'unknown');
  return { chosen, typed: '', money: [], unknown: boxTicked || chosen.length < values.length };
}

function moneyFields(id: string, fields: Fields): Spoken['money'] {
  return Object.entries(fields).flatMap(([name, values]) => {
    const currency = name.startsWith(`${id}.`) ? name.slice(id.length + 1) : '';
    return /^[A-Z]{3}$/.test(currency) ? [{ currency, typed: values[0] ?? '' }] : [];
  });
}

type Said = { readonly answers: Readonly<Record<string, AnswerValue>>; readonly declined: readonly string[] };

/** What was said before with a page's answers laid over it: of the questions asked, only the new answer stands. */
export function mergeEntry(before: Said, asked: readonly string[], entry: ReadEntry): Said {
  const kept = Object.entries(before.answers).filter(([id]) => !asked.includes(id));
  return {
    answers: { ...Object.fromEntries(kept), ...entry.answers },
    declined: [...before.declined.filter((id) => !asked.includes(id)), ...entry.declined],
  };
}
