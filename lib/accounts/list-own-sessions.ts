import 'server-only';
import { listSessions } from '@/db/sessions';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { handleOf } from '@/lib/server/token';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { earlier, IDLE_MS } from './domain/session-age';
import type { ListedSession } from './domain/session';

const MOST = 100;

/** Where somebody is signed in, the latest seen first. `here` is the session that asks. */
export async function listOwnSessions(ctx: ActorCtx, here: Buffer): Promise<Result<readonly ListedSession[], AccessRefusal>> {
  const own = askSignedIn(ctx, 'account.read-sessions');
  if (!own.ok) return own;
  const lines = await listSessions(ctx.db, { accountId: own.value.id, now: ctx.now, idleSince: earlier(ctx.now, IDLE_MS) }, MOST);
  return ok(lines.map(({ id, ...line }) => ({ ...line, handle: handleOf(id), here: id.equals(here) })));
}
