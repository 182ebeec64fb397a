import 'server-only';
import { lockCheck, updateCheck } from '@/db/checks';
import { inTransaction } from '@/db/transaction';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import type { BeginRefusal } from './begin-check';
import { keptSince } from './check-age';
import type { CheckId } from './domain/ids';
import { loadLines } from '@/lib/server/load-lines';
import type { BeginInput } from './schema';

/** Changes the places of sale and the day of a check; every answer stays. */
export async function changePlaces(
  ctx: Ctx,
  input: BeginInput,
): Promise<Result<{ readonly id: CheckId }, BeginRefusal | { kind: 'not-found' }>> {
  if (input.regions.length === 0) return err({ kind: 'no-region' });
  const lines = await loadLines(ctx.db, input.regions, input.saleOn ?? calendarDateOf(ctx.now));
  if (!lines.ok) return lines;
  return inTransaction(ctx.db, async (trx) => {
    const check = await lockCheck(trx, input.key, keptSince(ctx.now));
    if (check === null) return err({ kind: 'not-found' });
    await updateCheck(trx, { ...check, regions: input.regions, saleOn: input.saleOn }, ctx.now);
    return ok({ id: check.id });
  });
}
