import { textIn, type Entry } from '@/lib/regions/domain/entry';
import type { ItemList, WholeItem } from '@/lib/regions/domain/sheet-items';

const NAMED: Partial<Record<ItemList | WholeItem, string>> = {
  rules: 'title',
  terms: 'name',
  sources: 'title',
  trials: 'title',
  authorities: 'name',
  accreditation: 'name',
};

/** What an item is called on its own page; what it is, while it has no name. */
export function titleOf(list: ItemList | WholeItem, values: Entry, kind: string): string {
  const field = NAMED[list];
  const name = field === undefined ? '' : textIn(values, field);
  return name === '' ? kind : name;
}
