import 'server-only';
import { deleteSessionsOf } from '@/db/sessions';
import { inTransaction } from '@/db/transaction';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { askSignedIn } from '@/lib/server/ask-signed-in';

/** Ends every session of one's own but the one that asks. */
export async function endOtherSessions(ctx: ActorCtx, here: Buffer): Promise<Result<null, AccessRefusal>> {
  const own = askSignedIn(ctx, 'account.end-session');
  if (!own.ok) return own;
  const { id } = own.value;
  return inTransaction(ctx.db, async (trx): Promise<Result<null, AccessRefusal>> => {
    await deleteSessionsOf(trx, id, here);
    return ok(null);
  });
}
