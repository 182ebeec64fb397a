import 'server-only';
import { insertAccount, lockAccountByEmail, replaceUnconfirmed } from '@/db/accounts';
import { enqueueMail } from '@/db/outbox';
import { deleteSessionsOf } from '@/db/sessions';
import type { Trx } from '@/db/transaction';
import { ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { take, type TooMany } from '@/lib/server/limits';
import { writeMail } from '@/lib/server/mail-text';
import { newId } from '@/lib/server/new-id';
import type { Account } from './domain/account';
import { mailToken } from './mailed-token';
import { hashNewPassword, type PasswordRefusal } from './new-password';
import { accountId, type SignUpInput } from './schema';

export type SignUpRefusal = PasswordRefusal | TooMany | ChangeRefusal;

/**
 * Begins an account and mails the link that confirms its address. Whoever asks is answered the same when the address has an
 * account: then its owner gets a mail that says so. An account never confirmed belongs to the newest sign-up.
 */
export async function signUp(ctx: ActorCtx, { key, email, name, password }: SignUpInput): Promise<Result<null, SignUpRefusal>> {
  const taken = await take('sign-up', ctx.from, ctx);
  if (!taken.ok) return taken;
  const hash = await hashNewPassword(password, [name, email]);
  if (!hash.ok) return hash;
  const mayMail = (await take('link-mail', email, ctx)).ok;

  return change(ctx, { key, who: 'guest', act: 'accounts.sign-up', input: { email, name } }, async (trx) => {
    const there = await lockAccountByEmail(trx, email);
    if (there !== null && there.state !== 'unconfirmed') {
      if (mayMail) await tellOwner(trx, ctx, there, email);
      return ok(null);
    }
    const id = there?.id ?? accountId.parse(newId(ctx.now));
    if (there === null)
      await insertAccount(trx, { id, email, name, passwordHash: hash.value, role: 'maker', state: 'unconfirmed', at: ctx.now });
    else await takeOver(trx, there, name, hash.value);
    if (mayMail) await mailToken(trx, 'confirm', { id, name, email }, ctx);
    return ok(null);
  });
}

async function takeOver(trx: Trx, there: Account, name: string, hash: string): Promise<void> {
  await replaceUnconfirmed(trx, there.id, name, hash);
  await deleteSessionsOf(trx, there.id);
}

async function tellOwner(trx: Trx, ctx: ActorCtx, { id, name, state }: Account, address: string): Promise<void> {
  if (state === 'closed') return;
  const mail = writeMail('someone-tried-to-sign-up', { name, link: `${ctx.site}/sign-in`, resetLink: `${ctx.site}/reset` });
  await enqueueMail(trx, { accountId: id, address, mail, kind: 'someone-tried-to-sign-up', at: ctx.now });
}
