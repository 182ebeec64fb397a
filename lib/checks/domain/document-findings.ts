import type { Sheet } from '@/lib/regions/domain/sheet';
import { fault, type Finding, type FindingAt, type FindingList, type SheetCheck } from './finding';

/** What a schema finds wrong with a document: where, as members and places in lists, and in words. */
export type DocumentIssue = { readonly path: readonly PropertyKey[]; readonly message: string };

const LISTS: Readonly<Record<FindingList, keyof Sheet | null>> = {
  sheet: null,
  rules: 'rules',
  terms: 'terms',
  sources: 'sources',
  memberships: 'memberships',
  trials: 'trials',
  authorities: 'authorities',
  accreditation: 'accreditation',
  gaps: 'gaps',
  leftOut: 'leftOut',
};
const isList = (text: string): text is FindingList => Object.hasOwn(LISTS, text) && text !== 'sheet';

/** The faults of a document that is no sheet yet, each at the item and the field it belongs to. */
export function documentFindings(issues: readonly DocumentIssue[], document: unknown): readonly Finding[] {
  return issues.map(({ path, message }) => {
    const at = placeOf(path.map(String), document);
    return fault(checkOf(at), { at, kind: 'document', values: { message } });
  });
}

function placeOf(path: readonly string[], document: unknown): FindingAt {
  const [list = '', place, ...field] = path;
  if (!isList(list) || place === undefined) return { list: 'sheet', id: textAt(document, 'code'), field: path.join('/') };
  return { list, id: nameOf(memberOf(memberOf(document, list), place)) || place, field: field.join('/') };
}

/** By which an item of a list is known: its id, the place it is part of, its name, or the fact it leaves out. */
function nameOf(item: unknown): string {
  return ['id', 'parent', 'name', 'fact'].map((member) => textAt(item, member)).find((text) => text !== '') ?? '';
}

function textAt(value: unknown, member: string): string {
  const text = memberOf(value, member);
  return typeof text === 'string' ? text : '';
}

const memberOf = (value: unknown, member: string): unknown =>
  typeof value === 'object' && value !== null && Object.hasOwn(value, member) ? Reflect.get(value, member) : undefined;

/** The schema sees to the form of every check: dates to C6, what a claim rests on to C7, all else to C1. */
function checkOf({ list, field }: FindingAt): SheetCheck {
  if (list !== 'rules' && list !== 'terms') return 'C1';
  const [member = ''] = field.split('/');
  if (['from', 'to', 'lookAgainBy'].includes(member)) return 'C6';
  return ['sources', 'standing', 'strength'].includes(member) ? 'C7' : 'C1';
}
