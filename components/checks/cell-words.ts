import type { Cells, Range, RangeEnd } from '@/lib/checks/domain/cell-range';
import { findQuestion } from '@/lib/checks/domain/steps';
import { sayList } from '@/lib/kernel/say';
import { LOCALE, words } from '@/lib/kernel/words';
import { sayMoney, sayUnit } from '@/lib/regions/domain/figure-words';
import { optionWords, questionWords } from './question-words';

const OR = new Intl.ListFormat(LOCALE, { type: 'disjunction' });

/** An answer as a range of answers: "Inside depth: at most 25 mm". A yes or no is a sentence by itself. */
export function cellWords(id: string, cells: Cells, placeNames: ReadonlyMap<string, string>): string {
  if (cells.kind === 'yesno') return questionWords(id, cells.is ? 'yes' : 'no');
  return words('checks.cells.named', { question: questionWords(id, 'short'), answer: answerOf(id, cells, placeNames) });
}

function answerOf(id: string, cells: Exclude<Cells, { readonly kind: 'yesno' }>, placeNames: ReadonlyMap<string, string>): string {
  switch (cells.kind) {
    case 'choice':
      return choiceWords(id, cells.options);
    case 'several':
      return severalWords(id, cells);
    case 'amount':
      return rangeWords(cells.range, (amount) => sayUnit(amount, cells.unit));
    case 'money':
      return sayList(cells.amounts.map(({ currency, range }) => rangeWords(range, (amount) => sayMoney(String(amount), currency))));
    case 'region':
      return cells.within === null
        ? words('checks.cells.anywhere')
        : words('checks.cells.in', { place: placeNames.get(cells.within) ?? cells.within });
  }
}

/** More than half of the options are told by those left out. */
function choiceWords(id: string, options: readonly string[]): string {
  const question = findQuestion(id);
  const all = question?.kind === 'choice' ? question.options : options;
  const rest = all.filter((option) => !options.includes(option));
  const said = (list: readonly string[]): string => OR.format(list.map((option) => optionWords(id, option)));
  return rest.length > 0 && options.length > all.length / 2 ? words('checks.cells.butNot', { options: said(rest) }) : said(options);
}

function severalWords(id: string, { including, leavingOut }: Extract<Cells, { readonly kind: 'several' }>): string {
  const named = (options: readonly string[]): string => options.map((option) => optionWords(id, option)).join(', ');
  return [
    ...(including.length === 0 ? [] : [words('checks.cells.with', { options: named(including) })]),
    ...(leavingOut.length === 0 ? [] : [words('checks.cells.without', { options: named(leavingOut) })]),
  ].join('; ');
}

function rangeWords({ from, to }: Range, say: (amount: number) => string): string {
  if (from !== null && to !== null && from.amount === to.amount) return words('checks.cells.exactly', { amount: say(from.amount) });
  const least = endWords(from, ['ge', 'gt'], say);
  const most = endWords(to, ['le', 'lt'], say);
  if (least !== null && most !== null) return words('checks.cells.both', { from: least, to: most });
  return least ?? most ?? words('checks.cells.any');
}

type EndKind = 'ge' | 'gt' | 'le' | 'lt';

function endWords(end: RangeEnd | null, [closed, open]: readonly [EndKind, EndKind], say: (amount: number) => string): string | null {
  return end === null ? null : words(`checks.cells.${end.included ? closed : open}`, { amount: say(end.amount) });
}
