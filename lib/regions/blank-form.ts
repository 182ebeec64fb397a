import type { EntryValues } from './amendment-schema';
import { itemOf, type ItemKey, type ItemList } from './domain/sheet-items';
import type { Sheet } from './domain/sheet';
import { writeItem } from './item-form';
import { nextOrder } from './rule-form';

/** The form of an item that is not there yet. */
export function blankItem(list: ItemList, sheet: Sheet): EntryValues {
  const line = { 'when.join': 'all', 'when.0.question': '' };
  const cited = { 'sources.0.source': sheet.sources[0]?.id ?? '', 'sources.0.standing': '', 'sources.0.evidence': '' };
  switch (list) {
    case 'rules':
      return { title: '', says: '', strength: '', kind: 'adds', ...line, order: String(nextOrder(sheet)), 'payload.topic': '', ...cited };
    case 'terms':
      return { name: '', says: '', ...line, ...cited };
    case 'trials':
      return { title: '', on: '', 'answers.use': 'food', 'expected.0.rule': '', 'expected.0.status': '' };
    case 'authorities':
    case 'accreditation':
      return { evidence: 'read' };
    case 'sources':
    case 'memberships':
      return {};
  }
}

/** The fields of an item as it stands in a sheet; null where it is not there. */
export function formOf(sheet: Sheet, key: ItemKey): EntryValues | null {
  const item = itemOf(sheet, key);
  return item === null ? null : writeItem(item);
}
