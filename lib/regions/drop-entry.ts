import 'server-only';
import { deleteEntry } from '@/db/amendment-entries';
import { updateAmendment } from '@/db/amendments';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import type { ItemInput } from './amendment-schema';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { lockFor, type ActRefusal } from './lock-for';

/** Throws away what was typed for an item and not saved. The item stays as it was saved last. */
export async function dropEntry(
  ctx: ActorCtx,
  { key, id, item }: ItemInput,
): Promise<Result<null, AccessRefusal | ChangeRefusal | ActRefusal>> {
  const own = askSignedIn(ctx, 'amendment.write');
  if (!own.ok) return own;
  const asked = { key, who: own.value.id, act: 'regions.drop-entry', input: { id, item } };
  return change(ctx, asked, async (trx): Promise<Result<null, ActRefusal>> => {
    const locked = await lockFor(trx, { id, who: own.value.id, act: 'save' });
    if (!locked.ok) return locked;
    const { amendment, next } = locked.value;
    // Counted on, so that the next entry of the item is told from this one.
    if (await deleteEntry(trx, { amendment: id, item })) await updateAmendment(trx, id, amendment.version, { state: next, at: ctx.now });
    return ok(null);
  });
}
