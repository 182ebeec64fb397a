import { canonicalJson, type Json } from '@/lib/kernel/canonical-json';
import { words } from '@/lib/kernel/words';
import type { OwnAmendment } from './amendment-view';
import type { Sheet } from './sheet';
import { ITEM_LISTS, itemOf, keyIn, WHOLE_ITEMS, type ItemKey, type ItemList, type SheetItem } from './sheet-items';

export type ChangedItem = OwnAmendment['changed'][number];

/** Keys of all members of a list. Contacts go by their place, from 1 on. */
export function keysIn(sheet: Sheet, list: ItemList): readonly ItemKey[] {
  switch (list) {
    case 'rules':
    case 'terms':
    case 'sources':
    case 'trials':
      return sheet[list].map(({ id }) => keyIn(list, id));
    case 'memberships':
      return sheet.memberships.map(({ parent }) => keyIn(list, parent));
    case 'authorities':
    case 'accreditation':
      return sheet[list].map((_, place) => keyIn(list, String(place + 1)));
  }
}

/** What differs between the base and what is proposed, item by item, in the order of the lists. */
export function changedItems(base: Sheet | null, proposed: Sheet): readonly ChangedItem[] {
  const inLists = ITEM_LISTS.flatMap((list) => [...new Set([...keysIn(proposed, list), ...(base === null ? [] : keysIn(base, list))])]);
  return [...WHOLE_ITEMS, ...inLists].flatMap((item) => {
    const [was, is] = [base === null ? null : itemOf(base, item), itemOf(proposed, item)];
    const shown = is ?? was;
    if (shown === null || textOf(was) === textOf(is)) return [];
    const change = was === null ? 'added' : is === null ? 'withdrawn' : 'changed';
    return [{ item, title: titleOf(shown), change }];
  });
}

const textOf = (item: SheetItem | null): string => canonicalJson(item === null ? null : valueOf(item));
const valueOf = ({ value }: SheetItem): Json => value;

/** What an item is called. */
export function titleOf(item: SheetItem): string {
  switch (item.list) {
    case 'rules':
    case 'sources':
    case 'trials':
      return item.value.title;
    case 'terms':
    case 'authorities':
    case 'accreditation':
      return item.value.name;
    case 'memberships':
      return item.value.parent.toUpperCase();
    case 'place':
      return words('editions.field.name');
    case 'text':
      return words('editions.field.text');
    case 'gaps':
      return words('editions.field.gaps');
  }
}

/** Items that both change. */
export function touchedByBoth(mine: readonly ChangedItem[], theirs: readonly ChangedItem[]): readonly ItemKey[] {
  const own = new Set(mine.map(({ item }) => item));
  return theirs.map(({ item }) => item).filter((item) => own.has(item));
}
