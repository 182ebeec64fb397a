import 'server-only';
import { findNumberInUse } from '@/db/editions';
import { listWithdrawals } from '@/db/edition-withdrawals';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { compareEditions } from './compare-editions';
import type { ComparedEditions } from './domain/compared-editions';

/** What withdrawing the edition in use would bring back. */
export type Withdrawal = {
  /** The edition in use. */
  readonly number: number;
  /** The edition whose document would come back, and what that changes; null where there is none before it. */
  readonly back: { readonly number: number; readonly comparison: ComparedEditions } | null;
};

/** What would come back if the edition in use of a sheet were withdrawn: the last one before it that was not withdrawn itself. */
export async function readWithdrawal(
  ctx: ActorCtx,
  { region }: { readonly region: string },
): Promise<Result<Withdrawal, AccessRefusal | { readonly kind: 'not-found' }>> {
  const own = askSignedIn(ctx, 'edition.withdraw');
  if (!own.ok) return own;
  const number = await findNumberInUse(ctx.db, region);
  if (number === null) return err({ kind: 'not-found' });
  const withdrawn = new Set((await listWithdrawals(ctx.db, region)).map((one) => one.number));
  const earlier = Array.from({ length: number - 1 }, (_, index) => number - 1 - index).find((one) => !withdrawn.has(one));
  const compared = earlier === undefined ? null : await compareEditions(ctx, { code: region, from: number, to: earlier });
  const back = earlier === undefined || compared?.ok !== true ? null : { number: earlier, comparison: compared.value };
  return ok({ number, back });
}
