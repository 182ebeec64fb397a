import 'server-only';
import { endRoleRequest, lockRoleRequest } from '@/db/role-requests';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import type { RequestInput } from './schema';

export type WithdrawRefusal = AccessRefusal | ChangeRefusal | { readonly kind: 'not-found' } | { readonly kind: 'answered' };

/** Takes one's own request back while nobody has answered it. Another's is not there. */
export async function withdrawRoleRequest(ctx: ActorCtx, { key, id }: RequestInput): Promise<Result<null, WithdrawRefusal>> {
  const own = askSignedIn(ctx, 'role.withdraw');
  if (!own.ok) return own;
  const { id: accountId } = own.value;
  const asked = { key, who: accountId, act: 'accounts.withdraw-role-request', input: { id } };
  return change(ctx, asked, async (trx): Promise<Result<null, WithdrawRefusal>> => {
    const request = await lockRoleRequest(trx, id);
    if (request === null || request.accountId !== accountId) return err({ kind: 'not-found' });
    const ended = await endRoleRequest(trx, id, { state: 'withdrawn', answer: null, answeredBy: null, at: ctx.now });
    return ended ? ok(null) : err({ kind: 'answered' });
  });
}
