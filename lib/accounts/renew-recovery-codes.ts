import 'server-only';
import { lockAccount } from '@/db/accounts';
import { replaceRecoveryCodes } from '@/db/recovery-codes';
import { inTransaction } from '@/db/transaction';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { hashRecoveryCode, newRecoveryCodes } from '@/lib/server/second-factor';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { mailFactorChange } from './mail-factor-change';

type Renewed = Result<{ readonly codes: readonly string[] }, AccessRefusal>;

/** Ten new recovery codes in the place of the earlier ones. They are in the answer and nowhere else. */
export async function renewRecoveryCodes(ctx: ActorCtx): Promise<Renewed> {
  const own = askSignedIn(ctx, 'account.set-second-factor');
  if (!own.ok) return own;
  const { id } = own.value;
  const codes = newRecoveryCodes();
  return inTransaction(ctx.db, async (trx): Promise<Renewed> => {
    const account = await lockAccount(trx, id);
    if (account === null || account.secondFactorOnAt === null) return err({ kind: 'not-allowed' });
    await replaceRecoveryCodes(
      trx,
      id,
      codes.map((one) => hashRecoveryCode(id, one)),
    );
    await mailFactorChange(trx, ctx, account, 'codes');
    return ok({ codes });
  });
}
