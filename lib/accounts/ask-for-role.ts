import 'server-only';
import { lockAccount } from '@/db/accounts';
import { listRegions } from '@/db/regions';
import { insertRoleRequest, listOwnRoleRequests } from '@/db/role-requests';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { newId } from '@/lib/server/new-id';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import type { RoleAskInput } from './schema';

export type RoleAskRefusal =
  AccessRefusal | ChangeRefusal | { readonly kind: 'unknown-region'; readonly code: string } | { readonly kind: 'waiting-already' };

/** A maker asks to become an editor. One request at a time waits for a steward. */
export async function askForRole(
  ctx: ActorCtx,
  { key, why, regions }: RoleAskInput,
): Promise<Result<{ readonly id: string }, RoleAskRefusal>> {
  const own = askSignedIn(ctx, 'role.ask');
  if (!own.ok) return own;
  const { id: accountId } = own.value;
  const known = new Set((await listRegions(ctx.db)).map(({ code }) => code));
  const unknown = regions.find((code) => !known.has(code));
  if (unknown !== undefined) return err({ kind: 'unknown-region', code: unknown });
  const asked = { key, who: accountId, act: 'accounts.ask-for-role', input: { why, regions } };
  return change(ctx, asked, async (trx): Promise<Result<{ readonly id: string }, RoleAskRefusal>> => {
    const account = await lockAccount(trx, accountId); // lines up two requests sent at once
    if (account?.role !== 'maker') return err({ kind: 'not-allowed' });
    const [last] = await listOwnRoleRequests(trx, accountId, 1);
    if (last?.state === 'waiting') return err({ kind: 'waiting-already' });
    const id = newId(ctx.now);
    await insertRoleRequest(trx, { id, accountId, why, regions, at: ctx.now });
    return ok({ id });
  });
}
