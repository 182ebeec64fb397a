import 'server-only';
import { deleteEntry, listEntries, moveEntry } from '@/db/amendment-entries';
import { updateAmendment } from '@/db/amendments';
import type { Trx } from '@/db/transaction';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import type { ItemInput } from './amendment-schema';
import type { AmendmentId } from './domain/amendment';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { keysCiting } from './domain/fitted-item';
import { itemOf, keyIn, readItemKey, withoutItem, type ItemKey } from './domain/sheet-items';
import { lockFor, type ActRefusal } from './lock-for';

/** `still-cited`: a source that these rules and terms rest on. `cannot-drop`: a sheet is never without it. */
export type DropRefusal =
  | AccessRefusal
  | ChangeRefusal
  | ActRefusal
  | { readonly kind: 'cannot-drop' }
  | { readonly kind: 'still-cited'; readonly items: readonly ItemKey[] };

/** Takes a member of a list out of the proposed sheet, with what was typed for it. One that is not there is out already. */
export async function dropItem(ctx: ActorCtx, { key, id, item }: ItemInput): Promise<Result<null, DropRefusal>> {
  const own = askSignedIn(ctx, 'amendment.write');
  if (!own.ok) return own;
  const asked = { key, who: own.value.id, act: 'regions.drop-item', input: { id, item } };
  return change(ctx, asked, async (trx): Promise<Result<null, DropRefusal>> => {
    const locked = await lockFor(trx, { id, who: own.value.id, act: 'save' });
    if (!locked.ok) return locked;
    const { amendment, document, next } = locked.value;
    if (readItemKey(item)?.id === '') return err({ kind: 'cannot-drop' });
    const items = keysCiting(document, item);
    if (items.length > 0) return err({ kind: 'still-cited', items });
    const isThere = itemOf(document, item) !== null;
    await updateAmendment(trx, id, amendment.version, { state: next, document: withoutItem(document, item), at: ctx.now });
    await deleteEntry(trx, { amendment: id, item });
    if (isThere) await moveUp(trx, id, item);
    return ok(null);
  });
}

/** Contacts go by their place: what was typed for those behind goes with them. */
async function moveUp(trx: Trx, amendment: AmendmentId, item: ItemKey): Promise<void> {
  const dropped = readItemKey(item);
  if (dropped === null || (dropped.list !== 'authorities' && dropped.list !== 'accreditation')) return;
  const { list } = dropped;
  const behind = (await listEntries(trx, amendment))
    .map((entry) => readItemKey(entry.item))
    .flatMap((at) => (at?.list === list && Number(at.id) > Number(dropped.id) ? [Number(at.id)] : []));
  for (const place of behind.sort((a, b) => a - b)) {
    await moveEntry(trx, { amendment, item: keyIn(list, String(place)) }, keyIn(list, String(place - 1)));
  }
}
