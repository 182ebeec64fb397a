import { words } from '@/lib/kernel/words';
import type { Sheet } from './sheet';
import { ITEM_LISTS, itemOf, keyIn, readItemKey, WHOLE_ITEMS, type ItemKey, type ItemList } from './sheet-items';

/** A part of a sheet in a list to choose from. */
export type ListedItem = { readonly item: ItemKey; readonly list: ItemList; readonly title: string };

/** Every member of a sheet's lists, as one looks for it. `names`: of places, by code. */
export function listedItems(sheet: Sheet, names: ReadonlyMap<string, string>): readonly ListedItem[] {
  return ITEM_LISTS.flatMap((list) =>
    membersOf(sheet, list, names).map(([id, title]): ListedItem => ({ item: keyIn(list, id), list, title })),
  );
}

function membersOf(sheet: Sheet, list: ItemList, names: ReadonlyMap<string, string>): readonly (readonly [id: string, title: string])[] {
  switch (list) {
    case 'rules':
    case 'sources':
    case 'trials':
      return sheet[list].map(({ id, title }) => [id, title]);
    case 'terms':
      return sheet.terms.map(({ id, name }) => [id, name]);
    case 'memberships':
      return sheet.memberships.map(({ parent }) => [parent, names.get(parent) ?? parent]);
    case 'authorities':
    case 'accreditation':
      return sheet[list].map(({ name }, place) => [String(place + 1), name]);
  }
}

/** What an item is called: by its own name where it has one, else by what it is. */
export function itemTitle(sheet: Sheet, item: ItemKey): string {
  const found = itemOf(sheet, item);
  if (found === null) return readItemKey(item)?.id ?? item;
  switch (found.list) {
    case 'rules':
    case 'sources':
    case 'trials':
      return found.value.title;
    case 'terms':
    case 'authorities':
    case 'accreditation':
      return found.value.name;
    case 'memberships':
      return found.value.parent;
    case 'place':
    case 'text':
    case 'gaps':
      return words(`amend.list.one.${found.list}`);
  }
}

/** Items that hold every word of what is looked for, in their title or id. */
export function foundItems(items: readonly ListedItem[], asked: string): readonly ListedItem[] {
  const wanted = asked
    .toLowerCase()
    .split(/\s+/)
    .filter((word) => word !== '');
  return items.filter(({ item, title }) => wanted.every((word) => `${title} ${item}`.toLowerCase().includes(word)));
}

export const wholeItems = (): readonly ItemKey[] => WHOLE_ITEMS;
