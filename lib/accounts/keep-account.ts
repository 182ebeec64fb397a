import 'server-only';
import { lockAccount, stopLeaving } from '@/db/accounts';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import type { KeyInput } from './schema';

/** Takes the wish to leave back, at any time within the 14 days. */
export async function keepAccount(ctx: ActorCtx, { key }: KeyInput): Promise<Result<null, AccessRefusal | ChangeRefusal>> {
  const own = askSignedIn(ctx, 'account.stay');
  if (!own.ok) return own;
  const { id } = own.value;
  return change(ctx, { key, who: id, act: 'accounts.stay', input: null }, async (trx): Promise<Result<null, AccessRefusal>> => {
    const account = await lockAccount(trx, id);
    if (account === null) return err({ kind: 'sign-in' });
    if (account.state === 'leaving') await stopLeaving(trx, id, account.confirmedAt === null ? 'unconfirmed' : 'open');
    return ok(null);
  });
}
