import { words } from '@/lib/kernel/words';
import { err, ok, type Result } from '@/lib/kernel/result';
import { keysIn } from './changed-items';
import type { Sheet } from './sheet';
import { ITEM_LISTS, itemOf, keyIn, readItemKey, withItem, withoutItem, type ItemKey, type ItemList, type SheetItem } from './sheet-items';

/** What is wrong, by the name of the field; `form` for what belongs to none. */
export type Faults = Readonly<Record<string, string>>;

export type FittedItem = { readonly sheet: Sheet; readonly key: ItemKey };

/** Puts an item where its form stands. Its key may be another afterwards: a new thing gets the id that was typed. */
export function fitItem(
  sheet: Sheet,
  key: ItemKey,
  { item, base }: { readonly item: SheetItem; readonly base: Sheet | null },
): Result<FittedItem, Faults> {
  if (changesLayer(sheet, item)) return err({ kind: words('amend.fault.kind') });
  const next = keyOf(sheet, key, item);
  const fitted = { sheet: withItem(sheet, key, item), key: next };
  if (next === key) return ok(fitted);
  if (itemOf(sheet, next) !== null) return err({ id: words('amend.fault.idTaken') });
  const isKnown = base !== null && itemOf(base, key) !== null;
  return isKnown && isById(item) ? err({ id: words('amend.fault.idFixed') }) : ok(fitted);
}

/** The sheet of advice lies under every line: no place becomes one, nor that one a place. */
const changesLayer = (sheet: Sheet, item: SheetItem): boolean =>
  item.list === 'place' && (item.value.kind === 'base') !== (sheet.kind === 'base');

const isById = ({ list }: SheetItem): boolean => list === 'rules' || list === 'terms' || list === 'sources' || list === 'trials';

function keyOf(sheet: Sheet, key: ItemKey, item: SheetItem): ItemKey {
  switch (item.list) {
    case 'rules':
    case 'terms':
    case 'sources':
    case 'trials':
      return keyIn(item.list, item.value.id);
    case 'memberships':
      return keyIn(item.list, item.value.parent);
    case 'authorities':
    case 'accreditation':
      return itemOf(sheet, key) === null ? keyIn(item.list, String(sheet[item.list].length + 1)) : key;
    case 'place':
    case 'text':
    case 'gaps':
      return item.list;
  }
}

type Issue = { readonly path: readonly PropertyKey[]; readonly message: string };

/** What the schema of a sheet finds wrong with it, at the fields of the item that was put in. */
export function faultsAt({ sheet, key }: FittedItem, issues: readonly Issue[]): Faults {
  const faults = issues.map(({ path, message }): readonly [string, string] => {
    const [list, place, ...field] = path.map(String);
    const isHere = ITEM_LISTS.some((name) => name === list && keyAt(sheet, name, Number(place)) === key);
    if (isHere && field.length > 0) return [field.join('.'), message];
    return key === 'place' || key === list
      ? [String(list), message]
      : ['form', words('amend.fault.elsewhere', { place: path.join(' '), fault: message })];
  });
  return Object.fromEntries(faults.toReversed());
}

const keyAt = (sheet: Sheet, list: ItemList, place: number): ItemKey | undefined => keysIn(sheet, list)[place];

/** The sheet with one part back to what it is in the base: put back, mended back, or taken out again. */
export function restoredItem(base: Sheet | null, sheet: Sheet, key: ItemKey): Sheet {
  const was = base === null ? null : itemOf(base, key);
  if (was === null || base === null) return withoutItem(sheet, key);
  const isBack = itemOf(sheet, key) === null;
  const restored = withItem(sheet, key, was);
  return isBack ? inOldPlace(base, restored, key) : restored;
}

/** What was put back stands at the end of its list; it goes after what it followed in the base. */
function inOldPlace(base: Sheet, sheet: Sheet, key: ItemKey): Sheet {
  const list = ITEM_LISTS.find((name) => name === readItemKey(key)?.list);
  if (list === undefined || list === 'authorities' || list === 'accreditation') return sheet;
  const before = keysIn(base, list).slice(0, keysIn(base, list).indexOf(key));
  const here = keysIn(sheet, list).slice(0, -1);
  const place = Math.max(-1, ...before.map((other) => here.indexOf(other))) + 1;
  const members: readonly unknown[] = sheet[list];
  return { ...sheet, [list]: lastTo(members, place) };
}

function lastTo<T>(list: readonly T[], place: number): readonly T[] {
  return [...list.slice(0, place), ...list.slice(-1), ...list.slice(place, -1)];
}

/** Rules and terms that cite that source. */
export function keysCiting(sheet: Sheet, key: ItemKey): readonly ItemKey[] {
  const read = readItemKey(key);
  if (read?.list !== 'sources') return [];
  return (['rules', 'terms'] as const).flatMap((list) =>
    sheet[list].filter(({ sources }) => sources.some(({ source }) => source === read.id)).map(({ id }) => keyIn(list, id)),
  );
}
