import 'server-only';
import { deleteTokensOf } from '@/db/account-tokens';
import { findAccount, findSecrets, lockAccount, setPasswordHash } from '@/db/accounts';
import { enqueueMail } from '@/db/outbox';
import { deleteSessionsOf, insertSession, type NewSession } from '@/db/sessions';
import type { Trx } from '@/db/transaction';
import type { AccountId } from '@/lib/access/domain/actor';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import type { TooMany } from '@/lib/server/limits';
import { writeMail } from '@/lib/server/mail-text';
import { newSession, type CurrentSession } from '@/lib/server/session';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { hashNewPassword, type PasswordRefusal } from './new-password';
import { provePassword } from './prove-password';
import type { PasswordInput } from './schema';

export type PasswordChangeRefusal = AccessRefusal | ChangeRefusal | PasswordRefusal | TooMany | { readonly kind: 'wrong' };

/** Changes the password of whoever knows the old one. Every session ends; this browser gets a new one. */
export async function changePassword(
  ctx: ActorCtx,
  { key, current, password }: PasswordInput,
  session: CurrentSession,
  agent: string,
): Promise<Result<{ readonly sid: string }, PasswordChangeRefusal>> {
  const own = askSignedIn(ctx, 'account.change-password');
  if (!own.ok) return own;
  const { id } = own.value;
  const before = await findAccount(ctx.db, id);
  const secrets = await findSecrets(ctx.db, id);
  if (before === null || secrets === null) return err({ kind: 'sign-in' });
  const proved = await provePassword(ctx, id, secrets.passwordHash, current);
  if (!proved.ok) return proved;
  const hash = await hashNewPassword(password, [before.name, before.email ?? before.name]);
  if (!hash.ok) return hash;
  const { secondFactorAt } = session;
  const opened = newSession({ accountId: id, now: ctx.now, agent, secondFactorAt, freshAt: ctx.now, key });
  const asked = { key, who: id, act: 'accounts.change-password', input: { length: password.length } };
  const changed = await change(ctx, asked, (trx) => put(trx, ctx, { id, version: before.version, hash: hash.value, row: opened.row }));
  return changed.ok ? ok({ sid: opened.sid }) : changed;
}

type NewPassword = { readonly id: AccountId; readonly version: number; readonly hash: string; readonly row: NewSession };

/** `wrong` also when the account changed since the password was looked at. */
async function put(trx: Trx, ctx: ActorCtx, { id, version, hash, row }: NewPassword): Promise<Result<null, { readonly kind: 'wrong' }>> {
  const account = await lockAccount(trx, id);
  if (account?.version !== version || account.email === null) return err({ kind: 'wrong' });
  await setPasswordHash(trx, id, hash);
  await deleteSessionsOf(trx, id);
  await deleteTokensOf(trx, id);
  await insertSession(trx, row);
  const mail = writeMail('password-changed', { name: account.name, link: `${ctx.site}/reset` });
  await enqueueMail(trx, { accountId: id, address: account.email, mail, kind: 'password-changed', at: ctx.now });
  return ok(null);
}
