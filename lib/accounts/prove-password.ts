import 'server-only';
import type { AccountId } from '@/lib/access/domain/actor';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { giveBack, take, type TooMany } from '@/lib/server/limits';
import { isPassword } from '@/lib/server/password';

/** Whether somebody signed in knows their own password: counted like tries to sign in, and given back when right. */
export async function provePassword(
  ctx: ActorCtx,
  id: AccountId,
  kept: string | null,
  password: string,
): Promise<Result<null, TooMany | { readonly kind: 'wrong' }>> {
  const taken = await take('sign-in-account', id, ctx);
  if (!taken.ok) return taken;
  if (!(await isPassword(kept, password))) return err({ kind: 'wrong' });
  await giveBack('sign-in-account', id, ctx);
  return ok(null);
}
