import 'server-only';
import { lockAccount, turnSecondFactorOff } from '@/db/accounts';
import { deleteRecoveryCodes } from '@/db/recovery-codes';
import { deleteSessionsOf } from '@/db/sessions';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { mailFactorChange } from './mail-factor-change';
import type { KeyInput } from './schema';

/** Turns the second step off: the secret and the recovery codes are deleted, and every other session ends. */
export async function turnOffSecondFactor(
  ctx: ActorCtx,
  { key }: KeyInput,
  session: Buffer,
): Promise<Result<null, AccessRefusal | ChangeRefusal>> {
  const own = askSignedIn(ctx, 'account.set-second-factor');
  if (!own.ok) return own;
  const { id } = own.value;
  return change(ctx, { key, who: id, act: 'accounts.second-factor-off', input: null }, async (trx) => {
    const account = await lockAccount(trx, id);
    if (account === null || account.secondFactorOnAt === null) return ok(null);
    await turnSecondFactorOff(trx, id);
    await deleteRecoveryCodes(trx, id);
    await deleteSessionsOf(trx, id, session);
    await mailFactorChange(trx, ctx, account, 'off');
    return ok(null);
  });
}
