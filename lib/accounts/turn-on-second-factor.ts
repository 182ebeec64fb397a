import 'server-only';
import { lockAccount, turnSecondFactorOn } from '@/db/accounts';
import { replaceRecoveryCodes } from '@/db/recovery-codes';
import { deleteSessionsOf, insertSession } from '@/db/sessions';
import { inTransaction } from '@/db/transaction';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { hashRecoveryCode, newRecoveryCodes, readFactorSecret, sealFactorSecret, stepsFromNow } from '@/lib/server/second-factor';
import { newSession, type CurrentSession } from '@/lib/server/session';
import { usableStep } from './domain/one-time-step';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { mailFactorChange } from './mail-factor-change';
import type { FactorInput } from './schema';

export type FactorOn = { readonly sid: string; readonly codes: readonly string[] };
export type FactorRefusal = { readonly kind: 'wrong-code' } | { readonly kind: 'already-on' } | AccessRefusal;

/**
 * Turns the second step on, once a code shows that the authenticator has the secret. Every other session ends; this browser gets a
 * new one, in which the step counts as given. The recovery codes are in the answer and nowhere else.
 */
export async function turnOnSecondFactor(
  ctx: ActorCtx,
  { secret: typed, code }: FactorInput,
  session: CurrentSession,
  agent: string,
): Promise<Result<FactorOn, FactorRefusal>> {
  const own = askSignedIn(ctx, 'account.set-second-factor');
  if (!own.ok) return own;
  const { id } = own.value;
  const secret = readFactorSecret(typed);
  const step = secret === null ? null : usableStep(ctx.now, stepsFromNow(secret, code, ctx.now), null);
  if (secret === null || step === null) return err({ kind: 'wrong-code' });
  const codes = newRecoveryCodes();
  const opened = newSession({ accountId: id, now: ctx.now, agent, secondFactorAt: ctx.now, freshAt: session.freshAt });
  return inTransaction(ctx.db, async (trx): Promise<Result<FactorOn, FactorRefusal>> => {
    const account = await lockAccount(trx, id);
    if (account === null) return err({ kind: 'sign-in' });
    if (account.secondFactorOnAt !== null) return err({ kind: 'already-on' });
    await turnSecondFactorOn(trx, id, { sealed: sealFactorSecret(id, secret), step, at: ctx.now });
    await replaceRecoveryCodes(
      trx,
      id,
      codes.map((one) => hashRecoveryCode(id, one)),
    );
    await deleteSessionsOf(trx, id);
    await insertSession(trx, opened.row);
    await mailFactorChange(trx, ctx, account, 'on');
    return ok({ sid: opened.sid, codes });
  });
}
