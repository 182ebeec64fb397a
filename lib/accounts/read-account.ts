import 'server-only';
import { findAccount } from '@/db/accounts';
import { listDayBook } from '@/db/day-book';
import { listOwnRoleRequests } from '@/db/role-requests';
import { listSessions } from '@/db/sessions';
import type { AccountId } from '@/lib/access/domain/actor';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import type { BoundEntry } from '@/lib/day-book/domain/entry';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import type { Account } from './domain/account';
import type { RoleRequest } from './domain/role-request';
import { earlier, IDLE_MS } from './domain/session-age';

/** An account as a steward sees it: nothing that opens it, and nothing of what the person does here. */
export type SeenAccount = {
  readonly account: Account & { readonly email: string };
  readonly isOwn: boolean;
  readonly sessions: number;
  readonly requests: readonly RoleRequest[];
  /** What the day book says of it, the newest first. */
  readonly lines: readonly BoundEntry[];
};

const SESSIONS = 100;
const SHOWN = 20;

/** One account for a steward. People who left are not there. */
export async function readAccount(
  ctx: ActorCtx,
  id: AccountId,
): Promise<Result<SeenAccount, AccessRefusal | { readonly kind: 'not-found' }>> {
  const own = askSignedIn(ctx, 'account.look-up');
  if (!own.ok) return own;
  const account = await findAccount(ctx.db, id);
  if (account === null || account.email === null) return err({ kind: 'not-found' });
  const live = await listSessions(ctx.db, { accountId: id, now: ctx.now, idleSince: earlier(ctx.now, IDLE_MS) }, SESSIONS);
  return ok({
    account: { ...account, email: account.email },
    isOwn: own.value.id === id,
    sessions: live.length,
    requests: await listOwnRoleRequests(ctx.db, id, SHOWN),
    lines: await listDayBook(ctx.db, { subject: { kind: 'account', id }, limit: SHOWN }),
  });
}
