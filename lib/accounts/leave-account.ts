import 'server-only';
import { deleteTokensOf } from '@/db/account-tokens';
import { countHolders, lockAccount, startLeaving } from '@/db/accounts';
import { enqueueMail } from '@/db/outbox';
import { deleteSessionsOf } from '@/db/sessions';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { err, ok, type Result } from '@/lib/kernel/result';
import { sayDate } from '@/lib/kernel/say';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { writeMail } from '@/lib/server/mail-text';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { GRACE_MS, later } from './domain/session-age';
import type { KeyInput } from './schema';

export type LeaveRefusal = AccessRefusal | ChangeRefusal | { readonly kind: 'last-steward' };

/** Begins the 14 days after which a person is forgotten. Every session ends; signing in again leads to "Keep my account". */
export async function leaveAccount(ctx: ActorCtx, { key }: KeyInput): Promise<Result<null, LeaveRefusal>> {
  const own = askSignedIn(ctx, 'account.leave');
  if (!own.ok) return own;
  const { id, role } = own.value;
  return change(ctx, { key, who: id, act: 'accounts.leave', input: null }, async (trx): Promise<Result<null, LeaveRefusal>> => {
    if (role === 'steward' && (await countHolders(trx, 'steward')) <= 1) return err({ kind: 'last-steward' });
    const account = await lockAccount(trx, id);
    if (account === null || account.email === null) return err({ kind: 'sign-in' });
    if (account.state === 'leaving') return ok(null);
    const until = later(ctx.now, GRACE_MS);
    await startLeaving(trx, id, until);
    await deleteSessionsOf(trx, id);
    await deleteTokensOf(trx, id);
    const on = sayDate(calendarDateOf(until));
    const mail = writeMail('account-leaving', { name: account.name, link: `${ctx.site}/sign-in`, on });
    await enqueueMail(trx, { accountId: id, address: account.email, mail, kind: 'account-leaving', at: ctx.now });
    return ok(null);
  });
}
