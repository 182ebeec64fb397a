import 'server-only';
import { listOverdue, lockAccount } from '@/db/accounts';
import { writeDayBook } from '@/db/day-book';
import { forgetPerson } from '@/db/forgotten-accounts';
import { inTransaction } from '@/db/transaction';
import type { AccountId } from '@/lib/access/domain/actor';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';

const AT_ONCE = 20;

/** Forgets those whose 14 days are over, some at a time. Answers with how many were forgotten. */
export async function forgetLeavers(ctx: Ctx): Promise<number> {
  let gone = 0;
  for (const id of await listOverdue(ctx.db, ctx.now, AT_ONCE)) {
    if ((await forgetOne(ctx, id)).ok) gone += 1;
  }
  return gone;
}

/** Asked anew under the lock: the person may have come back, or another worker been here. */
function forgetOne(ctx: Ctx, id: AccountId): Promise<Result<null, { readonly kind: 'stays' }>> {
  return inTransaction(ctx.db, async (trx): Promise<Result<null, { readonly kind: 'stays' }>> => {
    const account = await lockAccount(trx, id);
    const isOver = account?.state === 'leaving' && account.leavingAt !== null && account.leavingAt <= ctx.now;
    if (!isOver) return err({ kind: 'stays' });
    await forgetPerson(trx, id);
    await writeDayBook(trx, {
      actorId: null,
      did: 'account.forget',
      subject: { kind: 'account', id },
      reason: null,
      details: {},
      at: ctx.now,
    });
    return ok(null);
  });
}
