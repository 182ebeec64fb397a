import 'server-only';
import { deleteTokensOf, findToken, spendToken } from '@/db/account-tokens';
import { confirmAccount, findAccount, lockAccount, setPasswordHash } from '@/db/accounts';
import { enqueueMail } from '@/db/outbox';
import { deleteSessionsOf } from '@/db/sessions';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { writeMail } from '@/lib/server/mail-text';
import { tokenHash } from '@/lib/server/token';
import { hashNewPassword, type PasswordRefusal } from './new-password';
import type { ResetInput } from './schema';

export type ResetRefusal = { readonly kind: 'link-over' } | PasswordRefusal | ChangeRefusal;

/** Sets a new password for a mailed link, once. It signs nobody in: every session ends, and every other link. */
export async function resetPassword(ctx: ActorCtx, { key, token, password }: ResetInput): Promise<Result<null, ResetRefusal>> {
  const hash = tokenHash(token);
  const meant = await findToken(ctx.db, hash, 'reset', ctx.now);
  const owner = meant === null ? null : await findAccount(ctx.db, meant.accountId);
  const made = await hashNewPassword(
    password,
    [owner?.name, owner?.email].flatMap((own) => own ?? []),
  );
  if (!made.ok) return made;
  const input = { token: hash.toString('hex') };
  return change(ctx, { key, who: 'guest', act: 'accounts.reset', input }, async (trx): Promise<Result<null, ResetRefusal>> => {
    const spent = await spendToken(trx, hash, 'reset', ctx.now);
    const account = spent === null ? null : await lockAccount(trx, spent.accountId);
    if (account === null || account.email === null) return err({ kind: 'link-over' });
    await setPasswordHash(trx, account.id, made.value);
    await confirmAccount(trx, account.id, ctx.now);
    await deleteSessionsOf(trx, account.id);
    await deleteTokensOf(trx, account.id);
    const mail = writeMail('password-changed', { name: account.name, link: `${ctx.site}/reset` });
    await enqueueMail(trx, { accountId: account.id, address: account.email, mail, kind: 'password-changed', at: ctx.now });
    return ok(null);
  });
}
