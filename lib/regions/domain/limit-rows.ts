import type { Condition } from './condition';
import type { LimitPayload } from './rule';
import type { SheetNames } from './sheet-names';
import type { RegionSheet } from './told-sheet';
import type { ToldRule } from './told-rule';

export type LimitRow = {
  readonly rule: ToldRule;
  readonly limit: Omit<LimitPayload, 'topic'>;
  /** The classes of ware its condition names; empty where it names none. */
  readonly categories: readonly { readonly id: string; readonly name: string; readonly region: string }[];
  /** Rules of the line that take its place or lift it while they apply. */
  readonly silencedBy: readonly ToldRule[];
};

/** Every limit a place's line holds on the day, the place's own first, by substance within each layer. */
export function limitRows(sheet: RegionSheet, names: SheetNames): readonly LimitRow[] {
  const left = new Set(sheet.notInherited.map(({ rule }) => rule));
  const rules = [sheet, ...sheet.above.toReversed()].flatMap((layer) => layer.rules).filter(({ id }) => !left.has(id));
  return rules.flatMap((rule) => {
    const { payload } = rule;
    if (!('decision' in payload)) return [];
    const silencedBy = rules.filter(({ targets }) => targets.includes(rule.id));
    return [{ rule, limit: payload, categories: categoriesIn(rule.when, names), silencedBy }];
  });
}

function categoriesIn(condition: Condition, names: SheetNames): LimitRow['categories'] {
  if (typeof condition === 'boolean') return [];
  if ('all' in condition) return condition.all.flatMap((part) => categoriesIn(part, names));
  if ('any' in condition) return condition.any.flatMap((part) => categoriesIn(part, names));
  if (!('term' in condition)) return [];
  const term = names.terms.get(condition.term);
  return term?.category === true ? [{ id: condition.term, name: term.name, region: term.region }] : [];
}
