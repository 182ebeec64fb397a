import 'server-only';
import { lockAccount } from '@/db/accounts';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { take } from '@/lib/server/limits';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { mailToken } from './mailed-token';
import type { KeyInput } from './schema';

/** Mails a new link to confirm the address, for somebody signed in whose address is not confirmed yet. */
export async function mailConfirmationAgain(ctx: ActorCtx, { key }: KeyInput): Promise<Result<null, AccessRefusal | ChangeRefusal>> {
  const own = askSignedIn(ctx, 'account.confirm-again');
  if (!own.ok) return own;
  const { id } = own.value;
  const mayMail = (await take('link-mail', id, ctx)).ok;
  return change(ctx, { key, who: id, act: 'accounts.confirm-again', input: null }, async (trx) => {
    const account = await lockAccount(trx, id);
    if (mayMail && account?.state === 'unconfirmed' && account.email !== null) {
      await mailToken(trx, 'confirm', { ...account, email: account.email }, ctx);
    }
    return ok(null);
  });
}
