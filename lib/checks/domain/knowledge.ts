import { millionths, type Money } from '@/lib/kernel/quantity';
import { cellOfAmount, type Cuts, type QuestionCells } from './cells';
import type { CompiledLine } from './line';
import { cellsOfPlace } from './region-cells';

export type AnswerValue = boolean | string | number | readonly string[] | Money | readonly Money[];
export type Answers = Readonly<Record<string, AnswerValue>>;

/** The cells still possible, as a mask for each variable of the line. Never empty. */
export type Knowledge = { readonly masks: Int32Array };

/** What the answers leave possible. An answer that is missing or of the wrong kind leaves everything possible. */
export function knowledgeOf(line: Pick<CompiledLine, 'questions' | 'cells' | 'variables'>, answers: Answers): Knowledge {
  const masks = line.variables.all.slice();
  for (const [place, cut] of line.cells.entries()) {
    const id = line.questions[place];
    if (cut === null || id === undefined || !Object.hasOwn(answers, id)) continue;
    for (const [offset, mask] of masksOf(answers[id], cut).entries()) {
      if (mask !== null) masks[cut.first + offset] = mask;
    }
  }
  return { masks };
}

/** A mask for each variable of the question, null where the answer says nothing. */
function masksOf(answer: unknown, cut: QuestionCells): readonly (number | null)[] {
  switch (cut.kind) {
    case 'yesno':
      return typeof answer === 'boolean' ? [answer ? 2 : 1] : [];
    case 'choice':
      return choice(answer, cut.options);
    case 'several':
      return several(answer, cut.options);
    case 'amount':
      return [maskOfAmount(answer, cut.unit, cut.cuts)];
    case 'money':
      return money(answer, cut);
    case 'region':
      return typeof answer === 'string' && CODE.test(answer) ? [cellsOfPlace(cut, answer)] : [];
  }
}

const CODE = /^[a-z][a-z0-9]*(-[a-z0-9]+)*$/;

function choice(answer: unknown, options: readonly string[]): readonly number[] {
  const at = typeof answer === 'string' ? options.indexOf(answer) : -1;
  return at === -1 ? [] : [1 << at];
}

function maskOfAmount(value: unknown, unit: string, cuts: Cuts): number | null {
  const amount = typeof value === 'number' || typeof value === 'string' ? millionths(value, unit) : null;
  return amount === null ? null : 1 << cellOfAmount(cuts, amount);
}

/** The list is complete: an option not in it is a no. `none` stands for the empty list and cannot stand beside others. */
function several(answer: unknown, options: readonly string[]): readonly (number | null)[] {
  if (!isList(answer)) return [];
  const chosen = answer.length === 1 && answer[0] === 'none' ? [] : answer;
  const known = chosen.every((option) => typeof option === 'string' && options.includes(option));
  return known ? options.map((option) => (chosen.includes(option) ? 2 : 1)) : [];
}

/** One answer a currency; a currency given twice, or no amount at all, makes the whole answer unusable. */
function money(answer: unknown, cut: Extract<QuestionCells, { readonly kind: 'money' }>): readonly (number | null)[] {
  const list = isList(answer) ? answer : [answer];
  const amounts = new Map<string, string>();
  for (const item of list) {
    if (!isMoney(item) || amounts.has(item.currency) || millionths(item.amount, item.currency) === null) return [];
    amounts.set(item.currency, item.amount);
  }
  return cut.currencies.map((currency, place) => {
    const amount = amounts.get(currency);
    return amount === undefined ? null : maskOfAmount(amount, currency, cut.cuts[place] ?? []);
  });
}

const isList = (value: unknown): value is readonly unknown[] => Array.isArray(value);

const isMoney = (value: unknown): value is Money =>
  typeof value === 'object' &&
  value !== null &&
  'amount' in value &&
  'currency' in value &&
  typeof value.amount === 'string' &&
  typeof value.currency === 'string';
