import 'server-only';
import { writeDayBook } from '@/db/day-book';
import { retryParkedJob } from '@/db/jobs';
import { retryParkedMail } from '@/db/outbox';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { change, type ChangeRefusal } from '@/lib/server/change';
import type { RetryInput } from './schema';

export type RetryRefusal = AccessRefusal | ChangeRefusal | { readonly kind: 'not-parked' };

/** Gives a mail or a job that was given up another eight tries, beginning now. */
export async function retryParked(ctx: ActorCtx, { key, what, id }: RetryInput): Promise<Result<null, RetryRefusal>> {
  const own = askSignedIn(ctx, 'outbox.retry');
  if (!own.ok) return own;
  const actorId = own.value.id;
  const asked = { key, who: actorId, act: 'notices.retry-parked', input: { what, id } };
  return change(ctx, asked, async (trx): Promise<Result<null, RetryRefusal>> => {
    const retried = what === 'mail' ? await retryParkedMail(trx, id) : await retryParkedJob(trx, id);
    if (!retried) return err({ kind: 'not-parked' });
    await writeDayBook(trx, { actorId, did: 'outbox.retry', subject: { kind: what, id }, reason: null, details: {}, at: ctx.now });
    return ok(null);
  });
}
