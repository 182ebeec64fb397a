import type { Cuts, QuestionCells } from './cells';
import { lowestBit } from './diagram';
import type { RegionCells } from './region-cells';

/** An end of a range; `included` says whether the amount itself still belongs to it. */
export type RangeEnd = { readonly amount: number; readonly included: boolean };
export type Range = { readonly from: RangeEnd | null; readonly to: RangeEnd | null };

/** Some cells of one question as a reader can be told them. Options of a `several` that are not named may be either way. */
export type Cells =
  | { readonly kind: 'yesno'; readonly is: boolean }
  | { readonly kind: 'choice'; readonly options: readonly string[] }
  | { readonly kind: 'several'; readonly including: readonly string[]; readonly leavingOut: readonly string[] }
  | { readonly kind: 'amount'; readonly unit: string; readonly range: Range }
  | { readonly kind: 'money'; readonly amounts: readonly { readonly currency: string; readonly range: Range }[] }
  /** Null: a place that no rule names. */
  | { readonly kind: 'region'; readonly within: string | null };

/** Cells of one variable of a question; `offset` counts from the question's first variable. */
export type Picked = { readonly offset: number; readonly mask: number };

/** Tells which cells were picked. */
export function cellsOf(cut: QuestionCells, picked: readonly Picked[]): Cells {
  const [first = { offset: 0, mask: 1 }] = picked;
  switch (cut.kind) {
    case 'yesno':
      return { kind: 'yesno', is: first.mask === 2 };
    case 'choice':
      return { kind: 'choice', options: cut.options.filter((_, option) => (first.mask >> option) & 1) };
    case 'several': {
      const named = (mask: number): readonly string[] =>
        picked.flatMap((one) => (one.mask === mask ? (cut.options[one.offset] ?? []) : []));
      return { kind: 'several', including: named(2), leavingOut: named(1) };
    }
    case 'amount':
      return { kind: 'amount', unit: cut.unit, range: rangeOf(cut.cuts, first.mask) };
    case 'money':
      return {
        kind: 'money',
        amounts: picked.map(({ offset, mask }) => ({
          currency: cut.currencies[offset] ?? '',
          range: rangeOf(cut.cuts[offset] ?? [], mask),
        })),
      };
    case 'region':
      return { kind: 'region', within: placeIn(cut, first.mask) };
  }
}

/** The first run of neighbouring cells. Even cells lie between two cuts, odd ones are a cut. */
function rangeOf(cuts: Cuts, mask: number): Range {
  const first = lowestBit(mask);
  let last = first;
  while ((mask >> (last + 1)) & 1) last += 1;
  const end = (cell: number, cut: number): RangeEnd | null => {
    const amount = cuts[cut];
    return amount === undefined ? null : { amount: Number(amount) / 1_000_000, included: cell % 2 === 1 };
  };
  return { from: end(first, Math.ceil(first / 2) - 1), to: end(last, last >> 1) };
}

/** The widest named place that lies wholly in the cells; by code where two are as wide. */
function placeIn({ within }: RegionCells, mask: number): string | null {
  const inside = [...within].filter(([, cells]) => cells !== 0 && (cells & ~mask) === 0);
  const [widest] = inside.sort(([a, x], [b, y]) => countOf(y) - countOf(x) || (a < b ? -1 : 1));
  return widest?.[0] ?? null;
}

function countOf(mask: number): number {
  let count = 0;
  for (let bits = mask; bits !== 0; bits &= bits - 1) count += 1;
  return count;
}
