import 'server-only';
import { findSecrets, lockAccount, spendStep } from '@/db/accounts';
import { spendRecoveryCode } from '@/db/recovery-codes';
import { deleteSession, insertSession } from '@/db/sessions';
import { inTransaction, type Trx } from '@/db/transaction';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { giveBack, take, type TooMany } from '@/lib/server/limits';
import { hashRecoveryCode, stepsFromNow, unsealFactorSecret } from '@/lib/server/second-factor';
import { newSession, type CurrentSession } from '@/lib/server/session';
import type { Account } from './domain/account';
import { usableStep } from './domain/one-time-step';
import { CODE_LENGTH, readRecoveryCode } from './domain/recovery-code';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { mailFactorChange } from './mail-factor-change';
import type { CodeInput } from './schema';

export type CodeRefusal = { readonly kind: 'wrong-code' } | TooMany | AccessRefusal;

/**
 * Takes a code of the authenticator, or a recovery code, each once, and opens a new session in the place of the one that waited.
 * Tries are counted by account, wherever they come from.
 */
export async function giveSecondFactor(
  ctx: ActorCtx,
  { code }: CodeInput,
  session: CurrentSession,
  agent: string,
): Promise<Result<{ readonly sid: string }, CodeRefusal>> {
  const own = askSignedIn(ctx, 'account.give-second-factor');
  if (!own.ok) return own;
  const { id } = own.value;
  const taken = await take('sign-in-account', `second factor ${id}`, ctx);
  if (!taken.ok) return taken;
  const opened = newSession({ accountId: id, now: ctx.now, agent, secondFactorAt: ctx.now, freshAt: session.freshAt });
  const given = await inTransaction(ctx.db, async (trx): Promise<Result<{ readonly sid: string }, CodeRefusal>> => {
    const account = await lockAccount(trx, id);
    if (account === null || !(await spend(trx, ctx, account, code))) return err({ kind: 'wrong-code' });
    if ((await deleteSession(trx, session.id)) === 0) return err({ kind: 'sign-in' });
    await insertSession(trx, opened.row);
    return ok({ sid: opened.sid });
  });
  if (given.ok) await giveBack('sign-in-account', `second factor ${id}`, ctx);
  return given;
}

async function spend(trx: Trx, ctx: ActorCtx, account: Account, code: string): Promise<boolean> {
  if (account.secondFactorOnAt === null) return false;
  if (readRecoveryCode(code).length === CODE_LENGTH) return spendRecovery(trx, ctx, account, code);
  const secrets = await findSecrets(trx, account.id);
  const secret = secrets?.secondFactorSecret ? unsealFactorSecret(account.id, secrets.secondFactorSecret) : null;
  if (secrets === null || secret === null) return false;
  const step = usableStep(ctx.now, stepsFromNow(secret, code, ctx.now), secrets.secondFactorLastStep);
  return step !== null && spendStep(trx, account.id, step);
}

async function spendRecovery(trx: Trx, ctx: ActorCtx, account: Account, code: string): Promise<boolean> {
  if (!(await spendRecoveryCode(trx, account.id, hashRecoveryCode(account.id, code), ctx.now))) return false;
  await mailFactorChange(trx, ctx, account, 'code-used');
  return true;
}
