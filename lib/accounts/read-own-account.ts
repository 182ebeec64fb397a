import 'server-only';
import { findAccount, findSecrets } from '@/db/accounts';
import { countRecoveryCodes } from '@/db/recovery-codes';
import { listOwnRoleRequests } from '@/db/role-requests';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import type { Account } from './domain/account';
import type { RoleRequest } from './domain/role-request';

/** An account as its owner sees it. */
export type OwnAccount = {
  readonly account: Omit<Account, 'version'> & { readonly email: string };
  readonly hasPassword: boolean;
  readonly codesLeft: number;
  readonly requests: readonly RoleRequest[];
};

const REQUESTS = 10;

/** What somebody's own pages show of their account. */
export async function readOwnAccount(ctx: ActorCtx): Promise<Result<OwnAccount, AccessRefusal>> {
  const own = askSignedIn(ctx, 'account.read-own');
  if (!own.ok) return own;
  const { id } = own.value;
  const account = await findAccount(ctx.db, id);
  if (account === null || account.email === null) return err({ kind: 'sign-in' });
  const { version: _, ...open } = account;
  return ok({
    account: { ...open, email: account.email },
    hasPassword: typeof (await findSecrets(ctx.db, id))?.passwordHash === 'string',
    codesLeft: await countRecoveryCodes(ctx.db, id),
    requests: await listOwnRoleRequests(ctx.db, id, REQUESTS),
  });
}
