import 'server-only';
import { deleteOldChecks, insertCheck } from '@/db/checks';
import { inTransaction } from '@/db/transaction';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { keptSince } from './check-age';
import type { CheckId } from './domain/ids';
import type { Answers } from './domain/knowledge';
import { loadLines } from '@/lib/server/load-lines';
import type { BeginInput } from './schema';

export type BeginRefusal = { readonly kind: 'no-region' } | { readonly kind: 'unknown-region'; readonly code: string };

/** Old checks that go each time a new one begins, so that the table never holds more than a month's and no one waits long. */
const SWEEP = 200;

const filledIn = ({ fromNote }: BeginInput): Answers => (fromNote === null ? {} : { [fromNote.question.id]: fromNote.value });

/** Begins a check under the address in the form. The same form sent twice begins one check. */
export async function beginCheck(ctx: Ctx, input: BeginInput): Promise<Result<{ readonly id: CheckId }, BeginRefusal>> {
  if (input.regions.length === 0) return err({ kind: 'no-region' });
  const lines = await loadLines(ctx.db, input.regions, input.saleOn ?? calendarDateOf(ctx.now));
  if (!lines.ok) return lines;
  await deleteOldChecks(ctx.db, keptSince(ctx.now), SWEEP);
  return inTransaction(ctx.db, async (trx) => {
    await insertCheck(trx, { id: input.key, regions: input.regions, saleOn: input.saleOn, fromNote: filledIn(input), at: ctx.now });
    return ok({ id: input.key });
  });
}
