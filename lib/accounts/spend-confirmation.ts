import 'server-only';
import { deleteTokensOf, spendToken } from '@/db/account-tokens';
import { confirmAccount, lockAccount, lockAccountByEmail, setEmail } from '@/db/accounts';
import { enqueueMail } from '@/db/outbox';
import { deleteSessionsOf } from '@/db/sessions';
import type { Trx } from '@/db/transaction';
import type { AccountId } from '@/lib/access/domain/actor';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { writeMail } from '@/lib/server/mail-text';
import { tokenHash } from '@/lib/server/token';
import type { TokenInput } from './schema';

export type Confirmed = { readonly what: 'account' | 'address' };
export type ConfirmRefusal = { readonly kind: 'link-over' } | ChangeRefusal;

/**
 * Confirms the address of an account, or puts a new address in the place of the old one: then every session ends, and the old
 * address is told.
 */
export async function spendConfirmation(ctx: ActorCtx, { key, token }: TokenInput): Promise<Result<Confirmed, ConfirmRefusal>> {
  const hash = tokenHash(token);
  const input = { token: hash.toString('hex') };
  return change(ctx, { key, who: 'guest', act: 'accounts.confirm', input }, async (trx): Promise<Result<Confirmed, ConfirmRefusal>> => {
    const first = await spendToken(trx, hash, 'confirm', ctx.now);
    if (first !== null) {
      await confirmAccount(trx, first.accountId, ctx.now);
      return ok({ what: 'account' });
    }
    const moved = await spendToken(trx, hash, 'address', ctx.now);
    if (moved === null || moved.email === null) return err({ kind: 'link-over' });
    const there = await lockAccountByEmail(trx, moved.email);
    const account = await lockAccount(trx, moved.accountId);
    if (there !== null || account === null || account.email === null) return err({ kind: 'link-over' });
    await setEmail(trx, account.id, moved.email);
    await confirmAccount(trx, account.id, ctx.now);
    await deleteSessionsOf(trx, account.id);
    await deleteTokensOf(trx, account.id);
    await tellOldAddress(trx, ctx, { ...account, email: account.email });
    return ok({ what: 'address' });
  });
}

async function tellOldAddress(
  trx: Trx,
  ctx: ActorCtx,
  old: { readonly id: AccountId; readonly name: string; readonly email: string },
): Promise<void> {
  const mail = writeMail('address-changed', { name: old.name, link: `${ctx.site}/contact` });
  await enqueueMail(trx, { accountId: old.id, address: old.email, mail, kind: 'address-changed', at: ctx.now });
}
