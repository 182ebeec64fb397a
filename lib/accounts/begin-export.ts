import 'server-only';
import { enqueueJob } from '@/db/jobs';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { EXPORT_JOB } from './domain/export';
import type { KeyInput } from './schema';

/** Asks for an archive of all that is one's own. A worker makes it; its job's id is where to look. */
export async function beginExport(
  ctx: ActorCtx,
  { key }: KeyInput,
): Promise<Result<{ readonly id: string }, AccessRefusal | ChangeRefusal>> {
  const own = askSignedIn(ctx, 'account.export');
  if (!own.ok) return own;
  const { id: accountId } = own.value;
  return change(ctx, { key, who: accountId, act: 'accounts.export', input: null }, async (trx) => {
    const id = await enqueueJob(trx, { kind: EXPORT_JOB, input: { accountId, archive: key }, accountId, at: ctx.now });
    return ok({ id });
  });
}
