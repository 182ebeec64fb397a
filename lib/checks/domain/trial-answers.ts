import type { Millionths } from '@/lib/kernel/quantity';
import { cellOfAmount, type Cuts, type QuestionCells } from './cells';
import { cellsOfPlace } from './region-cells';

/** One way to answer a question, as masks for the variables of each line's own cells. */
export type Trial = (cut: QuestionCells) => readonly number[];

/** Answers tried to one question at most. */
const MOST_TRIALS = 256;

/**
 * Answers to one question that between them fall into every cell of every line, as long as there are no more than can be
 * tried. Options that no rule still looks at are left out: `looksAt` names those variables of the question that matter.
 */
export function trialsOf(cuts: readonly QuestionCells[], looksAt: ReadonlySet<number>): readonly Trial[] {
  const [first] = cuts;
  if (first === undefined) return [];
  switch (first.kind) {
    case 'yesno':
      return [1, 2].map((mask) => () => [mask]);
    case 'choice':
      return first.options.map((_, option) => () => [1 << option]);
    case 'several':
      return subsetsOf(first.options.length, looksAt).map((chosen) => () => first.options.map((_, at) => (chosen.has(at) ? 2 : 1)));
    case 'amount':
      return amountsBetween(cuts.flatMap((cut) => (cut.kind === 'amount' ? cut.cuts : []))).map(
        (amount) => (cut) => (cut.kind === 'amount' ? [1 << cellOfAmount(cut.cuts, amount)] : []),
      );
    case 'money':
      return moneyTrials(cuts);
    case 'region':
      return placesIn(cuts).map((code) => (cut) => (cut.kind === 'region' ? [cellsOfPlace(cut, code)] : []));
  }
}

function subsetsOf(options: number, looksAt: ReadonlySet<number>): readonly ReadonlySet<number>[] {
  const matter = Array.from({ length: options }, (_, at) => at).filter((at) => looksAt.has(at));
  return matter
    .reduce<readonly (readonly number[])[]>((sets, at) => [...sets, ...sets.map((set) => [...set, at])].slice(0, MOST_TRIALS), [[]])
    .map((set) => new Set(set));
}

/** Each border, an amount just over it, and one just under the lowest. No amount is below zero. */
function amountsBetween(cuts: Cuts): readonly Millionths[] {
  const sorted = [...new Set(cuts)].sort((a, b) => (a < b ? -1 : 1));
  const [lowest = 0n] = sorted;
  return [lowest - 1n, ...sorted.flatMap((cut) => [cut, cut + 1n])].filter((amount) => amount >= 0n);
}

type Sums = ReadonlyMap<string, Millionths>;

function moneyTrials(cuts: readonly QuestionCells[]): readonly Trial[] {
  const own = cuts.flatMap((cut) => (cut.kind === 'money' ? cut : []));
  const currencies = [...new Set(own.flatMap((cut) => cut.currencies))].sort();
  const amountsIn = (currency: string): readonly Millionths[] =>
    amountsBetween(own.flatMap((cut) => cut.cuts[cut.currencies.indexOf(currency)] ?? []));
  const sums = currencies.reduce<readonly Sums[]>(
    (all, currency) => all.flatMap((one) => amountsIn(currency).map((at) => new Map([...one, [currency, at]]))).slice(0, MOST_TRIALS),
    [new Map()],
  );
  return sums.map(
    (sum) => (cut) =>
      cut.kind === 'money' ? cut.currencies.map((currency, at) => 1 << cellOfAmount(cut.cuts[at] ?? [], sum.get(currency) ?? 0n)) : [],
  );
}

/** A code that no place has stands for every place that is not listed. */
const ELSEWHERE = 'elsewhere';

const placesIn = (cuts: readonly QuestionCells[]): readonly string[] =>
  [...new Set([ELSEWHERE, ...cuts.flatMap((cut) => (cut.kind === 'region' ? [...cut.placed.keys()] : []))])].sort();
