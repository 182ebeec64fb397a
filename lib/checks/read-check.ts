import 'server-only';
import { findCheck } from '@/db/checks';
import { listRegions } from '@/db/regions';
import type { Check } from '@/db/rows/check-row';
import { calendarDateOf, type CalendarDate } from '@/lib/kernel/calendar-date';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { keptSince, keptUntil } from './check-age';
import type { LoadedLine } from './domain/checklist';
import type { CheckId } from './domain/ids';
import type { Place } from './domain/line';
import { nextOver, type NextQuestion } from './domain/next-over';
import { loadLines } from '@/lib/server/load-lines';

/** A check with the sheets it is read from and what is still to ask. */
export type OpenCheck = {
  readonly check: Check;
  readonly on: CalendarDate;
  readonly lines: readonly LoadedLine[];
  /** Every place that is part of another on that day. */
  readonly places: readonly Place[];
  readonly next: NextQuestion | null;
  readonly stillMatters: readonly string[];
  /** Names of every place, by code. */
  readonly names: ReadonlyMap<string, string>;
  readonly keptUntil: Date;
};

/** The check at that address. Not found when there is none, or when it was not touched for 30 days. */
export async function readCheck(ctx: Ctx, id: CheckId): Promise<Result<OpenCheck, { kind: 'not-found' }>> {
  const check = await findCheck(ctx.db, id, keptSince(ctx.now));
  if (check === null) return err({ kind: 'not-found' });
  const on = check.saleOn ?? calendarDateOf(ctx.now);
  const [loaded, regions] = await Promise.all([loadLines(ctx.db, check.regions, on), listRegions(ctx.db)]);
  if (!loaded.ok) throw new Error(`The sheet of "${loaded.error.code}" is gone, and check ${id} is read from it`);
  const { lines, places } = loaded.value;
  const names = new Map(regions.map(({ code, name }) => [code, name]));
  return ok({ check, on, lines, places, ...nextOver(lines, check.answers, check.declined), names, keptUntil: keptUntil(check.touchedAt) });
}
