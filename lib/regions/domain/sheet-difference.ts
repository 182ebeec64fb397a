import { fieldDifferences, type Field, type FieldDifference } from './field-difference';
import type { Rule } from './rule';
import type { Sheet } from './sheet';
import { contactFields, headFields, membershipFields, ruleFields, sourceFields, termFields, trialFields } from './sheet-fields';

export type { FieldDifference, FieldName, FieldValue } from './field-difference';

/** The parts of a sheet in the order their changes are told. */
export const DIFFERENCE_LISTS = [
  'sheet',
  'rules',
  'terms',
  'memberships',
  'authorities',
  'accreditation',
  'trials',
  'sources',
  'leftOut',
] as const;
export type DifferenceList = (typeof DIFFERENCE_LISTS)[number];

/** Something in a sheet that is otherwise. `id` is its key within its list; `title` is what it is called now. */
export type ItemDifference = {
  readonly list: DifferenceList;
  readonly id: string;
  readonly title: string;
  readonly change: 'added' | 'withdrawn' | 'changed' | 'moved';
  /** It also stands in another place among its neighbours than before. */
  readonly moved: boolean;
  /** Only what differs; for something added or withdrawn every field. */
  readonly fields: readonly FieldDifference[];
};

/**
 * All that differs between two versions of one sheet, in words a reader meets. Order counts only where a reader sees it, among
 * rules, terms, memberships and contacts: there what stands elsewhere with the same content is told as moved.
 */
export function sheetDifference(before: Sheet, after: Sheet): readonly ItemDifference[] {
  const [was, is] = [itemsOf(before), itemsOf(after)];
  return DIFFERENCE_LISTS.flatMap((list) => listDifference(list, was[list], is[list]));
}

/** One thing of a list, as fields. */
type Item = { readonly id: string; readonly title: string; readonly fields: readonly Field[] };

const ORDERED: readonly DifferenceList[] = ['rules', 'terms', 'memberships', 'authorities', 'accreditation'];

function listDifference(list: DifferenceList, before: readonly Item[], after: readonly Item[]): readonly ItemDifference[] {
  const earlier = new Map(before.map((item) => [item.id, item]));
  const later = new Map(after.map((item) => [item.id, item]));
  const moved = ORDERED.includes(list) ? movedIn([...earlier.keys()], [...later.keys()]) : new Set<string>();
  const present = after.flatMap((item) => {
    const fields = fieldDifferences(earlier.get(item.id)?.fields ?? [], item.fields);
    const isMoved = moved.has(item.id);
    const change = !earlier.has(item.id) ? 'added' : fields.length > 0 ? 'changed' : 'moved';
    return change === 'moved' && !isMoved ? [] : [{ list, id: item.id, title: item.title, change, moved: isMoved, fields } as const];
  });
  const gone = before.filter(({ id }) => !later.has(id));
  return [
    ...present,
    ...gone.map(({ id, title, fields }) => ({
      list,
      id,
      title,
      change: 'withdrawn' as const,
      moved: false,
      fields: fieldDifferences(fields, []),
    })),
  ];
}

function itemsOf(sheet: Sheet): Readonly<Record<DifferenceList, readonly Item[]>> {
  const { sources } = sheet;
  return {
    sheet: [{ id: sheet.code, title: sheet.name, fields: headFields(sheet) }],
    rules: keyed(inRank(sheet.rules), ({ id, title }) => [id, title]).map(([key, rule]) => ({ ...key, fields: ruleFields(rule, sources) })),
    terms: keyed(sheet.terms, ({ id, name }) => [id, name]).map(([key, term]) => ({ ...key, fields: termFields(term, sources) })),
    memberships: keyed(sheet.memberships, ({ parent }) => [parent, parent]).map(([key, edge]) => ({
      ...key,
      fields: membershipFields(edge),
    })),
    authorities: keyed(sheet.authorities, ({ name }) => [name, name]).map(([key, one]) => ({ ...key, fields: contactFields(one) })),
    accreditation: keyed(sheet.accreditation, ({ name }) => [name, name]).map(([key, one]) => ({ ...key, fields: contactFields(one) })),
    trials: keyed(sheet.trials, ({ id, title }) => [id, title]).map(([key, trial]) => ({ ...key, fields: trialFields(trial) })),
    sources: keyed(sources, ({ id, title }) => [id, title]).map(([key, source]) => ({ ...key, fields: sourceFields(source) })),
    leftOut: keyed(sheet.leftOut, ({ fact }) => [fact, fact]).map(([key, { why }]) => ({ ...key, fields: [{ field: 'why', words: why }] })),
  };
}

type Key = Pick<Item, 'id' | 'title'>;

/** Things by their names; of several with one name the second is the second one in both versions. */
function keyed<T>(items: readonly T[], nameOf: (item: T) => readonly [id: string, title: string]): readonly (readonly [Key, T])[] {
  const seen = new Map<string, number>();
  return items.map((item) => {
    const [name, title] = nameOf(item);
    const count = (seen.get(name) ?? 0) + 1;
    seen.set(name, count);
    return [{ id: count === 1 ? name : `${name} ${String(count)}`, title }, item] as const;
  });
}

/** The order a reader meets, not that of the document. */
const inRank = (rules: readonly Rule[]): readonly Rule[] => rules.toSorted((a, b) => a.order - b.order || (a.id < b.id ? -1 : 1));

/** What stands in another order, told of as few things as possible: all but a longest run that kept its order. */
function movedIn(before: readonly string[], after: readonly string[]): ReadonlySet<string> {
  const placeOf = new Map(before.map((id, place) => [id, place]));
  const common = after.flatMap((id) => {
    const place = placeOf.get(id);
    return place === undefined ? [] : [{ id, place }];
  });
  // Longest run that ends at each item, and the item before it.
  const best: { readonly length: number; readonly from: number }[] = [];
  common.forEach(({ place }, at) => {
    const from = best.reduce(
      (found, { length }, other) => ((common[other]?.place ?? 0) < place && length > (best[found]?.length ?? 0) ? other : found),
      -1,
    );
    best[at] = { length: (best[from]?.length ?? 0) + 1, from };
  });
  const kept = new Set<string>();
  let at = best.reduce((found, { length }, other) => (length > (best[found]?.length ?? 0) ? other : found), -1);
  for (let item = common[at]; item !== undefined; item = common[at]) {
    kept.add(item.id);
    at = best[at]?.from ?? -1;
  }
  return new Set(common.map(({ id }) => id).filter((id) => !kept.has(id)));
}
