import 'server-only';
import { lockCheck, updateCheck } from '@/db/checks';
import { inTransaction } from '@/db/transaction';
import { canonicalJson } from '@/lib/kernel/canonical-json';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { keptSince } from './check-age';
import type { CheckId } from './domain/ids';

/** Notes what the checklist is drawn from now, so that the next one can say what changed since. Showing it again changes nothing. */
export async function showChecklist(
  ctx: Ctx,
  input: { readonly id: CheckId },
): Promise<Result<{ readonly id: CheckId }, { kind: 'not-found' }>> {
  return inTransaction(ctx.db, async (trx) => {
    const check = await lockCheck(trx, input.id, keptSince(ctx.now));
    if (check === null) return err({ kind: 'not-found' });
    const now = { answers: check.answers, declined: check.declined };
    const last = check.shown?.now ?? null;
    if (last === null || canonicalJson(last) !== canonicalJson(now))
      await updateCheck(trx, { ...check, shown: { now, before: last } }, ctx.now);
    return ok({ id: input.id });
  });
}
