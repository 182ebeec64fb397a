import 'server-only';
import { deleteTokensOf } from '@/db/account-tokens';
import { closeAccount as closeRow, lockAccount } from '@/db/accounts';
import { writeDayBook } from '@/db/day-book';
import { enqueueMail } from '@/db/outbox';
import { withdrawRoleRequestsOf } from '@/db/role-requests';
import { deleteSessionsOf } from '@/db/sessions';
import type { Trx } from '@/db/transaction';
import type { AccountId } from '@/lib/access/domain/actor';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { writeMail } from '@/lib/server/mail-text';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { namesPerson } from './domain/public-reason';
import { judgeClosing, type ClosingRefusal } from './domain/role-change';
import { holdStewards } from './hold-stewards';
import type { ClosingInput } from './steward-schema';

export type CloseRefusal = AccessRefusal | ChangeRefusal | ClosingRefusal | { readonly kind: 'names-person' };

/** Shuts a person out: their sessions and mailed links end, and they get a mail with the reason. Nothing of theirs is deleted. */
export async function closeAccount(ctx: ActorCtx, input: ClosingInput): Promise<Result<null, CloseRefusal>> {
  const own = askSignedIn(ctx, 'account.close');
  if (!own.ok) return own;
  const { key, id, reason } = input;
  const asked = { key, who: own.value.id, act: 'accounts.close', input: { id, reason } };
  return change(ctx, asked, async (trx): Promise<Result<null, CloseRefusal>> => {
    const stewards = await holdStewards(trx, own.value, 'account.close');
    if (stewards === null) return err({ kind: 'not-allowed' });
    const account = await lockAccount(trx, id);
    if (account === null || account.email === null) return err({ kind: 'not-found' });
    const judged = judgeClosing(own.value, account, stewards);
    if (!judged.ok) return judged;
    if (namesPerson(reason, account.name)) return err({ kind: 'names-person' });
    await shutOut(trx, id, ctx.now);
    const mail = writeMail('account-closed', { name: account.name, link: `${ctx.site}/contact`, reason });
    await enqueueMail(trx, { accountId: id, address: account.email, mail, kind: 'account-closed', at: ctx.now });
    const subject = { kind: 'account', id };
    await writeDayBook(trx, { actorId: own.value.id, did: 'account.close', subject, reason, details: {}, at: ctx.now });
    return ok(null);
  });
}

async function shutOut(trx: Trx, id: AccountId, at: Date): Promise<void> {
  await closeRow(trx, id);
  await deleteSessionsOf(trx, id);
  await deleteTokensOf(trx, id);
  await withdrawRoleRequestsOf(trx, id, at);
}
