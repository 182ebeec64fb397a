import type { CompileFault } from '@/lib/checks/domain/line-input';
import type { RuleMeaning } from '@/lib/checks/domain/meaning';
import type { TrialComparison } from '@/lib/checks/domain/trial-comparison';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Result } from '@/lib/kernel/result';
import type { FieldDifference, ItemDifference } from './sheet-difference';
import type { SheetNames } from './sheet-names';

/** What the rules of one place's line mean by two versions; the fault where they cannot be compared. */
export type LineMeanings = Result<readonly RuleMeaning[], CompileFault>;

/** Names for all ids in a comparison: rules, terms and places, by both versions and the layers around them. */
export type ComparedNames = SheetNames & {
  readonly rules: ReadonlyMap<string, string>;
  /** Rules that are only proposed: they have no page yet. */
  readonly proposed?: ReadonlySet<string>;
};

/** An edition as far as its head tells of it. */
export type ComparedEdition = { readonly number: number; readonly summary: string; readonly inUseFrom: Date };

export type PlaceBelow = { readonly code: string; readonly name: string; readonly meanings: LineMeanings };

/** Two editions of one sheet side by side: what differs, and what it does to this place and to those that read from it. */
export type ComparedEditions = {
  readonly code: string;
  readonly name: string;
  readonly from: ComparedEdition;
  readonly to: ComparedEdition;
  /** The day for which meanings are compared. */
  readonly on: CalendarDate;
  readonly items: readonly ItemDifference[];
  readonly meanings: LineMeanings;
  /** Places whose line holds this one on that day, by code. */
  readonly below: readonly PlaceBelow[];
  readonly trials: TrialComparison;
  readonly names: ComparedNames;
};

/** The rules that a line judges otherwise; none where it could not be compared. */
export const changedMeanings = (meanings: LineMeanings): readonly RuleMeaning[] =>
  meanings.ok ? meanings.value.filter(({ kind }) => kind !== 'same') : [];

const BEARING: readonly FieldDifference['field'][] = ['when', 'kind', 'targets', 'alongside', 'dates'];

/** Whether a field of a rule decides when the rule applies. */
export const bearsOnWhen = ({ field }: FieldDifference): boolean => BEARING.includes(field);

/** Rules that mean something else although nobody touched what decides when they apply: through a word or another rule. */
export function changedUnedited(meanings: LineMeanings, items: readonly ItemDifference[]): readonly RuleMeaning[] {
  const edited = new Set(items.flatMap(({ list, id, fields }) => (list === 'rules' && fields.some(bearsOnWhen) ? id : [])));
  return changedMeanings(meanings).filter(({ rule }) => !edited.has(rule));
}
