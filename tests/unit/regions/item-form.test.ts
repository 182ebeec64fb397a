import { expect, test } from 'vitest';
import { ITEM_LISTS, itemOf, keyIn, WHOLE_ITEMS, type ItemKey } from '@/lib/regions/domain/sheet-items';
import { readItem, writeItem } from '@/lib/regions/item-form';
import { seedSheets } from '../../builders/seed-sheets';

const keysOf = (code: string): readonly ItemKey[] => {
  const sheet = seedSheets.get(code);
  if (sheet === undefined) return [];
  const members = ITEM_LISTS.flatMap((list) => {
    if (list === 'memberships') return sheet.memberships.map(({ parent }) => keyIn(list, parent));
    if (list === 'authorities' || list === 'accreditation') return sheet[list].map((_, at) => keyIn(list, String(at + 1)));
    return sheet[list].map(({ id }) => keyIn(list, id));
  });
  return [...WHOLE_ITEMS, ...members];
};

test.each([...seedSheets.keys()])('REG-100 every form of the sheet %s, sent unchanged, is the item it was drawn from', (code) => {
  const sheet = seedSheets.get(code);
  if (sheet === undefined) throw new Error(code);
  for (const key of keysOf(code)) {
    const item = itemOf(sheet, key);
    if (item === null) throw new Error(key);
    expect([key, readItem(key, writeItem(item), sheet)]).toEqual([key, { ok: true, value: item }]);
  }
});
