import 'server-only';
import { findAccountByEmail, findSecrets, lockAccount } from '@/db/accounts';
import { insertSession } from '@/db/sessions';
import { inTransaction } from '@/db/transaction';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { giveBack, take, type TooMany } from '@/lib/server/limits';
import { isPassword } from '@/lib/server/password';
import { newSession } from '@/lib/server/session';
import { mayEnter, type Account } from './domain/account';
import type { SignInInput } from './schema';

/** A session to be given to the browser, and what is asked next. */
export type SignedInNow = { readonly sid: string; readonly then: 'in' | 'second-factor' | 'leaving' };

/** `wrong`: the address or the password. `closed` is said only to whoever knows the password. */
export type SignInRefusal = { readonly kind: 'wrong' } | { readonly kind: 'closed' } | TooMany;

/** What is asked of an account right after the first proof. */
export function thenOf(account: Account): SignedInNow['then'] {
  if (account.secondFactorOnAt !== null) return 'second-factor';
  return account.state === 'leaving' ? 'leaving' : 'in';
}

/**
 * Opens a session for address and password. Tries are counted before the password is looked at, by the account and the address
 * they come from, and given back when it was right. An address without an account takes as long as a wrong password.
 */
export async function signIn(ctx: ActorCtx, { email, password }: SignInInput, agent: string): Promise<Result<SignedInNow, SignInRefusal>> {
  const counted = await countTry(ctx, email);
  if (!counted.ok) return counted;
  const account = await findAccountByEmail(ctx.db, email);
  const secrets = account === null ? null : await findSecrets(ctx.db, account.id);
  const fits = await isPassword(secrets?.passwordHash ?? null, password);
  if (account === null || !fits) return err({ kind: 'wrong' });
  await giveBack('sign-in-address', ctx.from, ctx);
  await giveBack('sign-in-account', `${ctx.from} ${email}`, ctx);
  if (!mayEnter(account.state)) return err({ kind: 'closed' });
  return open(ctx, account, agent);
}

async function countTry(ctx: ActorCtx, email: string): Promise<Result<null, TooMany>> {
  const byAddress = await take('sign-in-address', ctx.from, ctx);
  return byAddress.ok ? take('sign-in-account', `${ctx.from} ${email}`, ctx) : byAddress;
}

function open(ctx: ActorCtx, account: Account, agent: string): Promise<Result<SignedInNow, SignInRefusal>> {
  const session = newSession({ accountId: account.id, now: ctx.now, agent, freshAt: ctx.now });
  return inTransaction(ctx.db, async (trx): Promise<Result<SignedInNow, SignInRefusal>> => {
    // The password may have been changed, or the account closed, while this one was looked at.
    const still = await lockAccount(trx, account.id);
    if (still === null || still.version !== account.version) return err({ kind: 'wrong' });
    await insertSession(trx, session.row);
    return ok({ sid: session.sid, then: thenOf(still) });
  });
}
