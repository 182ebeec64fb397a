import type { Millionths } from '@/lib/kernel/quantity';
import type { Cuts, QuestionCells } from './cells';
import { lowestBit } from './diagram';
import type { AnswerValue } from './knowledge';
import { cellsOfPlace, type RegionCells } from './region-cells';

/** What one variable of a question adds to an answer: yes or no, an option, a number, an amount of money, a place. */
export type Piece = boolean | string | number;

/** A real answer that falls into exactly these cells of a variable. */
export type CellValue = { readonly mask: number; readonly piece: Piece };

/** Amounts that can only be whole. */
const COUNTED: readonly string[] = ['pieces', 'people'];
const ONE = 1_000_000n;
/** Round numbers are tried from the coarsest to the finest: in steps of a million, half of it, a tenth of it, and so on. */
const STEPS = Array.from({ length: 13 }, (_, place) => 10n ** BigInt(12 - place)).flatMap((step) => (step > 1n ? [step, step / 2n] : step));
const WHOLE = STEPS.filter((step) => step % ONE === 0n);

/** Real answers for one variable of a question, cell by cell. A cell into which no answer falls has none. */
export function cellValues(cut: QuestionCells, offset: number): readonly CellValue[] {
  switch (cut.kind) {
    case 'yesno':
    case 'several':
      return [
        { mask: 1, piece: false },
        { mask: 2, piece: true },
      ];
    case 'choice':
      return cut.options.map((piece, option) => ({ mask: 1 << option, piece }));
    case 'amount':
      return amounts(cut.cuts, COUNTED.includes(cut.unit)).map(({ mask, amount }) => ({ mask, piece: Number(decimalOf(amount)) }));
    case 'money':
      return amounts(cut.cuts[offset] ?? [], false).map(({ mask, amount }) => ({ mask, piece: decimalOf(amount) }));
    case 'region':
      return places(cut);
  }
}

/** The whole answer to a question out of what its variables add; options that nothing was said of are left out. */
export function answerFrom(cut: QuestionCells, pieces: ReadonlyMap<number, Piece>): AnswerValue | null {
  if (cut.kind === 'several') return cut.options.filter((_, offset) => pieces.get(offset) === true);
  if (cut.kind !== 'money') return pieces.get(0) ?? null;
  return cut.currencies.flatMap((currency, offset) => {
    const amount = pieces.get(offset);
    return typeof amount === 'string' ? [{ amount, currency }] : [];
  });
}

type CellAmount = { readonly mask: number; readonly amount: Millionths };

/** Each cut itself, and between two cuts a round number. No amount is below zero. */
function amounts(cuts: Cuts, isCounted: boolean): readonly CellAmount[] {
  const isReal = (amount: Millionths): boolean => amount >= 0n && (!isCounted || amount % ONE === 0n);
  return Array.from({ length: 2 * cuts.length + 1 }, (_, cell) => cell).flatMap((cell) => {
    const [from, to] = [cuts[(cell >> 1) - 1], cuts[cell >> 1]];
    const amount = cell % 2 === 1 ? to : between(from, to);
    return amount !== undefined && isReal(amount) ? [{ mask: 1 << cell, amount }] : [];
  });
}

/** A round number in the open interval, not far from its start, whole where there is one; none where no six decimals lie in it. */
function between(from: Millionths | undefined, to: Millionths | undefined): Millionths | undefined {
  if (from === undefined || from < 0n) return under(to ?? 10n * ONE, from === undefined);
  const near = 2n * from + 10n * ONE;
  return roundest(STEPS, from, to === undefined || to > near ? near : to);
}

/** Zero itself is taken before a part of one. */
function under(to: Millionths, withZero: boolean): Millionths | undefined {
  if (to <= 0n) return undefined;
  return roundest(WHOLE, 0n, to) ?? (withZero ? 0n : roundest(STEPS, 0n, to));
}

const roundest = (steps: readonly bigint[], from: Millionths, to: Millionths): Millionths | undefined =>
  steps.map((step) => (from / step + 1n) * step).find((amount) => amount < to);

/** Exact, without trailing zeros. */
function decimalOf(amount: Millionths): string {
  const rest = String(amount % ONE)
    .padStart(6, '0')
    .replace(/0+$/, '');
  return rest === '' ? String(amount / ONE) : `${String(amount / ONE)}.${rest}`;
}

/** Places that may stand for all that no rule names. */
const UNNAMED = ['ch', 'us', 'jp', 'br', 'za', 'nz', 'in', 'ke', 'zz', 'xx'] as const;

/** A place for each cell; a country before a part of one. A bloc leaves several cells possible and stands for none. */
function places(cells: RegionCells): readonly CellValue[] {
  const elsewhere = UNNAMED.find((code) => cellsOfPlace(cells, code) === cells.elsewhere);
  const known = [...cells.placed]
    .filter(([, mask]) => (mask & (mask - 1)) === 0)
    .sort(([a], [b]) => a.length - b.length || (a < b ? -1 : 1))
    .map(([piece, mask]) => ({ mask, piece }));
  const all = elsewhere === undefined ? known : [...known, { mask: cells.elsewhere, piece: elsewhere }];
  return Array.from({ length: cells.cells }, (_, cell) => cell).flatMap((cell) => all.find(({ mask }) => lowestBit(mask) === cell) ?? []);
}
