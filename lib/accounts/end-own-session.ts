import 'server-only';
import { deleteOwnSession, listSessions } from '@/db/sessions';
import { inTransaction } from '@/db/transaction';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { handleOf } from '@/lib/server/token';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { earlier, IDLE_MS } from './domain/session-age';
import type { SessionInput } from './schema';

const MOST = 100;

/** Ends one of one's own sessions. One that is over already, or was never there, is over. */
export async function endOwnSession(ctx: ActorCtx, { handle }: SessionInput): Promise<Result<null, AccessRefusal>> {
  const own = askSignedIn(ctx, 'account.end-session');
  if (!own.ok) return own;
  const { id: accountId } = own.value;
  const lines = await listSessions(ctx.db, { accountId, now: ctx.now, idleSince: earlier(ctx.now, IDLE_MS) }, MOST);
  const meant = lines.find(({ id }) => handleOf(id) === handle);
  if (meant === undefined) return ok(null);
  return inTransaction(ctx.db, async (trx): Promise<Result<null, AccessRefusal>> => {
    await deleteOwnSession(trx, accountId, meant.id);
    return ok(null);
  });
}
