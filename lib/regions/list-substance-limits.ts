import 'server-only';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import type { Ctx } from '@/lib/server/ctx';
import { substanceLimits, type SubstanceLimits } from './domain/substance-limits';
import { listPlaceLines } from './list-place-lines';

/** Where a substance is limited today, over every place that has a sheet, by name. */
export async function listSubstanceLimits(ctx: Ctx, symbol: string): Promise<SubstanceLimits> {
  return substanceLimits(await listPlaceLines(ctx), symbol, calendarDateOf(ctx.now));
}
