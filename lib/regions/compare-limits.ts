import 'server-only';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import type { Ctx } from '@/lib/server/ctx';
import { compareLimits as compare, type LimitComparison } from './domain/limit-comparison';
import { limitsOfLine } from './domain/substance-limits';
import type { RegionKind } from './domain/sheet';
import { listPlaceLines } from './list-place-lines';

/** Columns a table can hold and still be read. */
export const MOST_PLACES = 8;

export type Comparable = { readonly code: string; readonly name: string; readonly kind: RegionKind; readonly line: readonly string[] };
export type ComparedLimits = {
  /** Places in whose line we know a limit on some substance: those worth choosing. */
  readonly comparable: readonly Comparable[];
  /** Null while no place is chosen. */
  readonly comparison: LimitComparison | null;
  /** Places that were chosen and did not fit. */
  readonly tooMany: number;
};

/** Holds the limits of some places on one substance side by side, as they are read today. Unknown places are left out. */
export async function compareLimits(
  ctx: Ctx,
  input: { readonly regions: readonly string[]; readonly symbol: string },
): Promise<ComparedLimits> {
  const today = calendarDateOf(ctx.now);
  const lines = await listPlaceLines(ctx);
  const comparable = lines
    .filter((line) => limitsOfLine(line, today).length > 0)
    .flatMap(({ line, layers }) => layers.slice(-1).map(({ code, name, kind }) => ({ code, name, kind, line: line.layers })));
  const chosen = lines.filter(({ layers }) => input.regions.includes(layers.at(-1)?.code ?? ''));
  return {
    comparable,
    comparison: chosen.length === 0 ? null : compare(chosen.slice(0, MOST_PLACES), input.symbol, today),
    tooMany: Math.max(0, chosen.length - MOST_PLACES),
  };
}
