import 'server-only';
import { lockAccountByEmail } from '@/db/accounts';
import { ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { take, type TooMany } from '@/lib/server/limits';
import { mayEnter } from './domain/account';
import { mailToken } from './mailed-token';
import type { MailInput } from './schema';

const LIMIT = { link: 'link-mail', reset: 'reset-mail' } as const;

/**
 * Mails a link to sign in, or to set a new password, to an address that has an account. The answer is the same for every address,
 * and when as many mails as may be have gone there within the hour.
 */
export async function mailLink(
  ctx: ActorCtx,
  kind: 'link' | 'reset',
  { key, email }: MailInput,
): Promise<Result<null, TooMany | ChangeRefusal>> {
  const taken = await take('sign-in-address', ctx.from, ctx);
  if (!taken.ok) return taken;
  const mayMail = (await take(LIMIT[kind], email, ctx)).ok;
  return change(ctx, { key, who: 'guest', act: `accounts.mail-${kind}`, input: { email } }, async (trx) => {
    const account = await lockAccountByEmail(trx, email);
    if (account !== null && mayMail && mayEnter(account.state)) await mailToken(trx, kind, { ...account, email }, ctx);
    return ok(null);
  });
}
