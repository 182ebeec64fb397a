import 'server-only';
import { lockAccount, stopLeaving } from '@/db/accounts';
import { writeDayBook } from '@/db/day-book';
import { enqueueMail } from '@/db/outbox';
import { rankOf } from '@/lib/access/domain/actor';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { writeMail } from '@/lib/server/mail-text';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { namesPerson } from './domain/public-reason';
import { holdStewards } from './hold-stewards';
import type { ClosingInput } from './steward-schema';

export type ReopenRefusal = AccessRefusal | ChangeRefusal | { readonly kind: 'not-found' | 'not-closed' | 'too-high' | 'names-person' };

/** Lets a person back in whose account was closed, in the role they had. They sign in anew, and get a mail with the reason. */
export async function reopenAccount(ctx: ActorCtx, input: ClosingInput): Promise<Result<null, ReopenRefusal>> {
  const own = askSignedIn(ctx, 'account.close');
  if (!own.ok) return own;
  const { key, id, reason } = input;
  const asked = { key, who: own.value.id, act: 'accounts.reopen', input: { id, reason } };
  return change(ctx, asked, async (trx): Promise<Result<null, ReopenRefusal>> => {
    if ((await holdStewards(trx, own.value, 'account.close')) === null) return err({ kind: 'not-allowed' });
    const account = await lockAccount(trx, id);
    if (account === null || account.email === null) return err({ kind: 'not-found' });
    if (account.state !== 'closed') return err({ kind: 'not-closed' });
    if (rankOf(account.role) > rankOf(own.value.role)) return err({ kind: 'too-high' });
    if (namesPerson(reason, account.name)) return err({ kind: 'names-person' });
    await stopLeaving(trx, id, account.confirmedAt === null ? 'unconfirmed' : 'open');
    const mail = writeMail('account-reopened', { name: account.name, link: `${ctx.site}/sign-in`, reason });
    await enqueueMail(trx, { accountId: id, address: account.email, mail, kind: 'account-reopened', at: ctx.now });
    const subject = { kind: 'account', id };
    await writeDayBook(trx, { actorId: own.value.id, did: 'account.reopen', subject, reason, details: {}, at: ctx.now });
    return ok(null);
  });
}
