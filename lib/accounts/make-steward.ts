import 'server-only';
import { insertAccount, lockAccountByEmail, setRole } from '@/db/accounts';
import { writeDayBook } from '@/db/day-book';
import { deleteSessionsOf } from '@/db/sessions';
import { inTransaction, type Trx } from '@/db/transaction';
import type { AccountId } from '@/lib/access/domain/actor';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { newId } from '@/lib/server/new-id';
import type { AccountState } from './domain/account';
import type { EmailAddress } from './domain/email-address';
import { mailToken } from './mailed-token';
import { accountId } from './schema';

export type StewardMade = { readonly what: 'made' | 'was-one' | 'begun' };

/**
 * For whoever runs the machine: makes an account a steward, or begins one and mails the link that sets its password. Nobody is asked
 * for permission: whoever can start this can read the database.
 */
export function makeSteward(
  ctx: Ctx & { readonly site: string },
  { email }: { readonly email: EmailAddress },
): Promise<Result<StewardMade, { readonly kind: 'closed' }>> {
  return inTransaction(ctx.db, async (trx): Promise<Result<StewardMade, { readonly kind: 'closed' }>> => {
    const there = await lockAccountByEmail(trx, email);
    if (there?.role === 'steward') return ok({ what: 'was-one' });
    if (there !== null && !STAYING.includes(there.state)) return err({ kind: 'closed' });
    const id = there === null ? await begin(trx, ctx, email) : await raise(trx, there.id);
    const details = { to: 'steward', by: 'command' };
    await writeDayBook(trx, { actorId: null, did: 'role.grant', subject: { kind: 'account', id }, reason: null, details, at: ctx.now });
    return ok({ what: there === null ? 'begun' : 'made' });
  });
}

const STAYING: readonly AccountState[] = ['open', 'unconfirmed'];

async function raise(trx: Trx, id: AccountId): Promise<AccountId> {
  await setRole(trx, id, 'steward');
  await deleteSessionsOf(trx, id);
  return id;
}

async function begin(trx: Trx, ctx: Ctx & { readonly site: string }, email: EmailAddress): Promise<AccountId> {
  const id = accountId.parse(newId(ctx.now));
  const [name = email] = email.split('@');
  await insertAccount(trx, { id, email, name, passwordHash: null, role: 'steward', state: 'unconfirmed', at: ctx.now });
  await mailToken(trx, 'reset', { id, name, email }, ctx);
  return id;
}
