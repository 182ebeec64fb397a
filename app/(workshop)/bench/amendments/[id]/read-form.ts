import type { Query } from '@/app/(account)/form-words';
import { one } from '@/app/(account)/form-words';
import { formOf } from '@/lib/regions/blank-form';
import type { OwnAmendment } from '@/lib/regions/domain/amendment-view';
import { sameEntry, type Entry } from '@/lib/regions/domain/entry';
import { faultsAt, fitItem } from '@/lib/regions/domain/fitted-item';
import type { ItemKey } from '@/lib/regions/domain/sheet-items';
import { readItem } from '@/lib/regions/item-form';
import { sheetDocument } from '@/lib/regions/schema';
import { findKept } from '@/lib/server/kept-form';
import { writable } from '../keep-typed';

/** What the page of one item shows. */
export type ReadForm = {
  readonly values: Entry;
  /** Of the entry that stands; 0 while there is none. */
  readonly version: number;
  readonly faults: Readonly<Record<string, string>>;
  /** Something was typed and not saved. */
  readonly isUnsaved: boolean;
  /** What another tab kept, where what is shown was typed beside it. */
  readonly theirs: Entry | null;
};

/** The form of an item: what waits to be looked at again, else what was kept, else the item as it stands; null for no such item. */
export async function readForm(draft: OwnAmendment, item: ItemKey, query: Query): Promise<ReadForm | null> {
  const look = await lookedAt(query);
  const { entry, version, saved } = standingOf(draft, item);
  const standing = entry ?? saved;
  const values = look ?? standing;
  if (values === null) return null;
  return {
    values,
    version,
    faults: one(query, 'mend') === undefined ? {} : faultsIn(draft, item, values),
    isUnsaved: entry !== null && differs(entry, saved),
    theirs: look === null ? null : otherThan(look, standing),
  };
}

const lookedAt = async (query: Query): Promise<Entry | null> => (await findKept(one(query, 'look')))?.values ?? null;

type Standing = { readonly entry: Entry | null; readonly version: number; readonly saved: Entry | null };

/** What was kept of an item and what was saved. */
function standingOf({ entries, document }: OwnAmendment, item: ItemKey): Standing {
  const found = entries.find((one) => one.item === item);
  return { entry: found?.values ?? null, version: found?.version ?? 0, saved: formOf(document, item) };
}

const differs = (values: Entry, from: Entry | null): boolean => from === null || !sameEntry(values, from);
const otherThan = (values: Entry, standing: Entry | null): Entry | null =>
  standing !== null && differs(values, standing) ? standing : null;

/** What keeps it from being saved, by field. */
export function faultsIn({ document, base }: OwnAmendment, item: ItemKey, values: Entry): Readonly<Record<string, string>> {
  const read = readItem(item, writable(values), document);
  if (!read.ok) return read.error;
  const fitted = fitItem(document, item, { item: read.value, base });
  if (!fitted.ok) return fitted.error;
  const parsed = sheetDocument.safeParse(fitted.value.sheet);
  return parsed.success ? {} : faultsAt(fitted.value, parsed.error.issues);
}
