import 'server-only';
import { spendToken } from '@/db/account-tokens';
import { confirmAccount, lockAccount } from '@/db/accounts';
import { insertSession } from '@/db/sessions';
import { inTransaction } from '@/db/transaction';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { newSession } from '@/lib/server/session';
import { tokenHash } from '@/lib/server/token';
import { mayEnter } from './domain/account';
import { earlier, FRESH_MS } from './domain/session-age';
import type { TokenInput } from './schema';
import { thenOf, type SignedInNow } from './sign-in';

/**
 * Opens a session for a mailed link, once. It proves the address, so an account that waited for that is confirmed; it does not
 * prove the password, so delicate acts ask for that first.
 */
export async function spendSignInLink(
  ctx: ActorCtx,
  { token }: TokenInput,
  agent: string,
): Promise<Result<SignedInNow, { readonly kind: 'link-over' }>> {
  return inTransaction(ctx.db, async (trx): Promise<Result<SignedInNow, { readonly kind: 'link-over' }>> => {
    const spent = await spendToken(trx, tokenHash(token), 'link', ctx.now);
    const account = spent === null ? null : await lockAccount(trx, spent.accountId);
    if (account === null || !mayEnter(account.state)) return err({ kind: 'link-over' });
    await confirmAccount(trx, account.id, ctx.now);
    const session = newSession({ accountId: account.id, now: ctx.now, agent, freshAt: earlier(ctx.now, FRESH_MS) });
    await insertSession(trx, session.row);
    return ok({ sid: session.sid, then: thenOf(account) });
  });
}
