import { QUESTIONS, type Question } from '@/lib/checks/domain/questions';
import type { Json } from '@/lib/kernel/canonical-json';
import { words } from '@/lib/kernel/words';
import { numberIn } from './condition-form';
import { listIn, rowsIn, textIn, type Entry } from './domain/entry';
import type { Trial } from './domain/trial';
import type { ReadPart } from './payload-form';

const LIST: readonly Question[] = QUESTIONS;

/** The value of the box "I don't know yet" of an example piece. */
export const UNKNOWN = 'unknown';
export const answerName = (question: string): string => `answers.${question}`;

/** Reads an example piece: what it is, and what its list must say. */
export function readTrial(entry: Entry): ReadPart {
  const answers: Record<string, Json> = {};
  const declined: string[] = [];
  const faults: Record<string, string> = {};
  for (const question of LIST) {
    const name = answerName(question.id);
    const chosen = listIn(entry, name);
    if (chosen.length === 0) continue;
    const value = chosen.includes(UNKNOWN) ? null : answerOf(question, chosen);
    if (value === undefined) faults[name] = words('amend.fault.answer');
    else if (value === null) declined.push(question.id);
    else answers[question.id] = value;
  }
  const expected = readExpected(entry, faults);
  return { value: { title: textIn(entry, 'title'), on: textIn(entry, 'on'), answers, declined, expected }, faults };
}

/** What was answered; null for "I don't know yet"; undefined for what answers nothing. */
function answerOf(question: Question, chosen: readonly string[]): Json | undefined {
  const [first = ''] = chosen;
  switch (question.kind) {
    case 'yesno':
      return { yes: true, no: false }[first];
    case 'choice':
      return question.options.includes(first) ? first : undefined;
    case 'several':
      return severalOf(question.options, chosen);
    case 'amount':
      return numberIn(first) ?? undefined;
    case 'money':
      return moneyOf(first);
    case 'region':
      return /^[a-z][a-z0-9]{1,9}(-[a-z0-9]{1,6})?$/.test(first) ? first : undefined;
  }
}

function severalOf(options: readonly string[], chosen: readonly string[]): Json | undefined {
  if (chosen.includes('none')) return chosen.length === 1 ? [] : undefined;
  return chosen.every((option) => options.includes(option)) ? chosen : undefined;
}

/** "50000.00 DKK", or several with a line for each. */
function moneyOf(typed: string): Json | undefined {
  const amounts = typed.split('\n').flatMap((line): readonly Json[] => {
    const parts = /^(?<amount>[\d\s.,]+?)\s*(?<currency>[A-Za-z]{3})$/.exec(line.trim())?.groups;
    const amount = parts?.['amount']?.replaceAll(/\s/g, '').replace(',', '.') ?? '';
    return numberIn(amount) === null ? [] : [{ amount, currency: (parts?.['currency'] ?? '').toUpperCase() }];
  });
  const [only] = amounts;
  if (only === undefined || amounts.length !== typed.split('\n').length) return undefined;
  return amounts.length === 1 ? only : amounts;
}

function readExpected(entry: Entry, faults: Record<string, string>): Readonly<Record<string, string>> {
  const expected: Record<string, string> = {};
  for (let row = 0; row < rowsIn(entry, 'expected'); row += 1) {
    const at = `expected.${String(row)}`;
    const [rule, status] = [textIn(entry, `${at}.rule`), textIn(entry, `${at}.status`)];
    if (rule === '' && status === '') continue;
    if (rule === '') faults[`${at}.rule`] = words('amend.fault.rule');
    else if (status === '') faults[`${at}.status`] = words('amend.fault.status');
    else if (Object.hasOwn(expected, rule)) faults[`${at}.rule`] = words('amend.fault.ruleTwice');
    else expected[rule] = status;
  }
  return expected;
}

/** The fields of an example piece as it stands. */
export function writeTrial({ title, on, answers, declined, expected }: Trial): Entry {
  return {
    title,
    on,
    ...Object.fromEntries(Object.entries(answers).map(([id, value]) => [answerName(id), writeAnswer(value)])),
    ...Object.fromEntries(declined.map((id) => [answerName(id), UNKNOWN])),
    ...Object.fromEntries(
      Object.entries(expected).flatMap(([rule, status], row) => [
        [`expected.${String(row)}.rule`, rule],
        [`expected.${String(row)}.status`, status],
      ]),
    ),
  };
}

function writeAnswer(value: Json): string | readonly string[] {
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'string' || typeof value === 'number') return String(value);
  if (!isList(value)) return writeMoney(value);
  if (value.length === 0) return 'none';
  return value.every((one) => typeof one === 'string') ? value.map(String) : value.map(writeMoney).join('\n');
}

function writeMoney(value: Json): string {
  if (value === null || typeof value !== 'object' || isList(value)) return '';
  const { amount, currency } = value;
  return `${typeof amount === 'string' ? amount : ''} ${typeof currency === 'string' ? currency : ''}`.trim();
}

const isList = (value: Json): value is readonly Json[] => Array.isArray(value);
