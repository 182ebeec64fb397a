import 'server-only';
import { updateAmendment } from '@/db/amendments';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import type { AmendmentInput } from './amendment-schema';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { lockFor, type ActRefusal } from './lock-for';

/** Its author takes back what waits for a moderator, to go on with it. Approvals it had count no more. */
export async function takeBackAmendment(
  ctx: ActorCtx,
  { key, id }: AmendmentInput,
): Promise<Result<null, AccessRefusal | ChangeRefusal | ActRefusal>> {
  const own = askSignedIn(ctx, 'amendment.write');
  if (!own.ok) return own;
  const asked = { key, who: own.value.id, act: 'regions.take-back-amendment', input: { id } };
  return change(ctx, asked, async (trx): Promise<Result<null, ActRefusal>> => {
    const locked = await lockFor(trx, { id, who: own.value.id, act: 'take-back' });
    if (!locked.ok) return locked;
    const { amendment, next } = locked.value;
    await updateAmendment(trx, id, amendment.version, { state: next, at: ctx.now });
    return ok(null);
  });
}
