import 'server-only';
import { deleteEntry, lockEntry, putEntry } from '@/db/amendment-entries';
import { findEdition } from '@/db/editions';
import { updateAmendment } from '@/db/amendments';
import type { Trx } from '@/db/transaction';
import { tidyName } from '@/lib/accounts/domain/person-name';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { canonicalJson } from '@/lib/kernel/canonical-json';
import { err, ok, type Result } from '@/lib/kernel/result';
import { words } from '@/lib/kernel/words';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import type { SaveItemInput } from './amendment-schema';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { followedBy, isAlike, nextVersion, type EntryMovedOn } from './domain/entry-versions';
import { faultsAt, fitItem, type Faults, type FittedItem } from './domain/fitted-item';
import type { ItemKey, SheetItem } from './domain/sheet-items';
import { readItem } from './item-form';
import { lockFor, type ActRefusal, type LockedAmendment } from './lock-for';
import { sheetDocument } from './schema';

/** Where an item was saved it may have another key: the id that was typed. What could not be read is kept as it was typed. */
export type SavedItem =
  { readonly saved: true; readonly item: ItemKey } | { readonly saved: false; readonly faults: Faults; readonly version: number };

export type SaveItemRefusal = AccessRefusal | ChangeRefusal | ActRefusal | EntryMovedOn;

/** Characters of a whole document. */
const LARGEST = 2_000_000;

/** Makes an item of what was typed and puts it into the proposed sheet; where it is none, keeps it and says what is wrong. */
export async function saveItem(ctx: ActorCtx, input: SaveItemInput): Promise<Result<SavedItem, SaveItemRefusal>> {
  const own = askSignedIn(ctx, 'amendment.write');
  if (!own.ok) return own;
  const { key, id, item, version, values } = input;
  const asked = { key, who: own.value.id, act: 'regions.save-item', input: { id, item, version, values } };
  return change(ctx, asked, async (trx): Promise<Result<SavedItem, SaveItemRefusal>> => {
    const locked = await lockFor(trx, { id, who: own.value.id, act: 'save' });
    if (!locked.ok) return locked;
    const entry = await lockEntry(trx, { amendment: id, item });
    const follows = entry !== null && isAlike(entry.values, values) ? ok(null) : followedBy(entry, version);
    if (!follows.ok) return follows;
    const { amendment } = locked.value;
    const fitted = await fit(trx, locked.value, input);
    if (!fitted.ok) {
      const next = nextVersion(entry, amendment.version);
      await putEntry(trx, id, { item, version: next, values, savedAt: ctx.now });
      return ok({ saved: false, faults: fitted.error, version: next });
    }
    await updateAmendment(trx, id, amendment.version, { state: locked.value.next, document: fitted.value.sheet, at: ctx.now });
    await deleteEntry(trx, { amendment: id, item });
    return ok({ saved: true, item: fitted.value.key });
  });
}

async function fit(trx: Trx, { amendment, document }: LockedAmendment, input: SaveItemInput): Promise<Result<FittedItem, Faults>> {
  const read = readItem(input.item, input.values, document);
  if (!read.ok) return read;
  const base = amendment.baseNumber === null ? null : await findEdition(trx, amendment.region, amendment.baseNumber);
  const fitted = fitItem(document, input.item, { item: tidied(read.value), base: base?.sheet ?? null });
  if (!fitted.ok) return fitted;
  const parsed = sheetDocument.safeParse(fitted.value.sheet);
  if (!parsed.success) return err(faultsAt(fitted.value, parsed.error.issues));
  if (canonicalJson(parsed.data).length > LARGEST) return err({ form: words('amend.fault.tooLarge') });
  return ok({ sheet: parsed.data, key: fitted.value.key });
}

/** A place's name stands in many pages: no mark in it may turn the direction of reading. */
const tidied = (item: SheetItem): SheetItem =>
  item.list === 'place' ? { ...item, value: { ...item.value, name: tidyName(item.value.name) } } : item;
