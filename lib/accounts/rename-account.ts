import 'server-only';
import { lockAccount, renameAccount as rename } from '@/db/accounts';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import type { RenameInput } from './schema';

export type RenameRefusal = AccessRefusal | ChangeRefusal;

/** Changes the name that others see. */
export async function renameAccount(ctx: ActorCtx, { key, name }: RenameInput): Promise<Result<null, RenameRefusal>> {
  const own = askSignedIn(ctx, 'account.rename');
  if (!own.ok) return own;
  const { id } = own.value;
  return change(ctx, { key, who: id, act: 'accounts.rename', input: { name } }, async (trx): Promise<Result<null, RenameRefusal>> => {
    const account = await lockAccount(trx, id);
    if (account === null) return err({ kind: 'sign-in' });
    if (account.name !== name) await rename(trx, id, name);
    return ok(null);
  });
}
