import 'server-only';
import { findSecrets } from '@/db/accounts';
import { freshenSession } from '@/db/sessions';
import { inTransaction } from '@/db/transaction';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import type { TooMany } from '@/lib/server/limits';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { provePassword } from './prove-password';
import type { AgainInput } from './schema';

export type AgainRefusal = AccessRefusal | TooMany | { readonly kind: 'wrong' };

/** Notes in the session that the password was typed just now: for ten minutes delicate acts do not ask again. */
export async function signInAgain(ctx: ActorCtx, { password }: AgainInput, session: Buffer): Promise<Result<null, AgainRefusal>> {
  const own = askSignedIn(ctx, 'account.sign-in-again');
  if (!own.ok) return own;
  const secrets = await findSecrets(ctx.db, own.value.id);
  const proved = await provePassword(ctx, own.value.id, secrets?.passwordHash ?? null, password);
  if (!proved.ok) return proved;
  return inTransaction(ctx.db, async (trx): Promise<Result<null, AgainRefusal>> => {
    // What was changed since ended the session, and then there is no row to mark.
    const marked = await freshenSession(trx, session, ctx.now);
    return marked ? ok(null) : err({ kind: 'sign-in' });
  });
}
