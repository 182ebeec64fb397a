import { wordsAt } from '@/lib/kernel/words';
import { words } from '@/lib/kernel/words';
import type { AnswerValue } from '@/lib/checks/domain/knowledge';
import type { Question } from '@/lib/checks/domain/questions';

export type QuestionPart = 'short' | 'title' | 'why' | 'help' | 'findOut' | 'yes' | 'no' | 'unit' | 'example';

/** One of the words of a question. Throws when the message file lacks it; a test asks for each. */
export function questionWords(id: string, part: QuestionPart): string {
  const text = wordsAt(`questions.${id}.${part}`);
  if (text === null) throw new Error(`content/messages/en/questions.json has no "${part}" for "${id}"`);
  return text;
}

export function optionWords(id: string, option: string): string {
  return wordsAt(`questions.${id}.options.${option}`) ?? option;
}

const NUMBER = new Intl.NumberFormat('en-GB', { maximumFractionDigits: 6 });
const UNITS: Readonly<Record<string, string>> = { mm: 'mm', mL: 'mL', C: '°C', percent: '%', pieces: 'pieces', kg: 'kg', people: 'people' };

/** The unit as written beside a number. */
export const unitShort = (unit: string): string => UNITS[unit] ?? unit;

/** An amount as read back to the maker; litres beside millilitres from one litre up, since the borders are drawn in litres. */
export function amountWords(value: number, unit: string): string {
  const plain = `${NUMBER.format(value)}\u00a0${unitShort(unit)}`;
  return unit === 'mL' && value >= 1000 ? `${plain} (${NUMBER.format(value / 1000)}\u00a0L)` : plain;
}

/** An answer in words. `names` gives the names of places. */
export function answerWords(question: Question, value: AnswerValue, names: ReadonlyMap<string, string>): string {
  switch (question.kind) {
    case 'yesno':
      return questionWords(question.id, value === true ? 'yes' : 'no');
    case 'choice':
      return typeof value === 'string' ? optionWords(question.id, value) : '';
    case 'several':
      return severalWords(question.id, value);
    case 'amount':
      return typeof value === 'number' ? amountWords(value, question.unit) : '';
    case 'money':
      return moneyWords(value);
    case 'region':
      return typeof value === 'string' ? (names.get(value) ?? value) : '';
  }
}

function severalWords(id: string, value: AnswerValue): string {
  const chosen = Array.isArray(value) ? value.filter((option) => option !== 'none') : [];
  if (chosen.length === 0) return words('checks.none');
  return chosen.map((option) => optionWords(id, String(option))).join(', ');
}

function moneyWords(value: AnswerValue): string {
  const list = typeof value === 'object' ? [value].flat() : [];
  return list
    .flatMap((item) => (typeof item === 'object' ? [`${item.currency}\u00a0${NUMBER.format(Number(item.amount))}`] : []))
    .join(', ');
}
