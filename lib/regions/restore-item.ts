import 'server-only';
import { deleteEntry } from '@/db/amendment-entries';
import { updateAmendment } from '@/db/amendments';
import { findEdition } from '@/db/editions';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import type { ItemInput } from './amendment-schema';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { faultsAt, keysCiting, restoredItem, type Faults } from './domain/fitted-item';
import { itemOf, type ItemKey } from './domain/sheet-items';
import { lockFor, type ActRefusal } from './lock-for';
import { sheetDocument } from './schema';

/** `does-not-fit`: as it was it rests on something that is no longer in the proposed sheet. */
export type RestoreRefusal =
  | AccessRefusal
  | ChangeRefusal
  | ActRefusal
  | { readonly kind: 'still-cited'; readonly items: readonly ItemKey[] }
  | { readonly kind: 'does-not-fit'; readonly faults: Faults };

/** Puts one part of the proposed sheet back to what it is in the base; what was added goes, what was withdrawn comes back. */
export async function restoreItem(ctx: ActorCtx, { key, id, item }: ItemInput): Promise<Result<null, RestoreRefusal>> {
  const own = askSignedIn(ctx, 'amendment.write');
  if (!own.ok) return own;
  const asked = { key, who: own.value.id, act: 'regions.restore-item', input: { id, item } };
  return change(ctx, asked, async (trx): Promise<Result<null, RestoreRefusal>> => {
    const locked = await lockFor(trx, { id, who: own.value.id, act: 'save' });
    if (!locked.ok) return locked;
    const { amendment, document, next } = locked.value;
    const { region, baseNumber, version } = amendment;
    const base = baseNumber === null ? null : await findEdition(trx, region, baseNumber);
    const sheet = restoredItem(base?.sheet ?? null, document, item);
    const items = itemOf(sheet, item) === null ? keysCiting(sheet, item) : [];
    if (items.length > 0) return err({ kind: 'still-cited', items });
    const parsed = sheetDocument.safeParse(sheet);
    if (!parsed.success) return err({ kind: 'does-not-fit', faults: faultsAt({ sheet, key: item }, parsed.error.issues) });
    await updateAmendment(trx, id, version, { state: next, document: parsed.data, at: ctx.now });
    await deleteEntry(trx, { amendment: id, item });
    return ok(null);
  });
}
