import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { RegionLine } from './line';
import { isInForce, type Term } from './rule';
import type { Contact, RegionKind, Sheet } from './sheet';
import { tellRule, tellSources, type ToldRule, type ToldSource } from './told-rule';

export type ToldTerm = Omit<Term, 'sources'> & { readonly sources: readonly ToldSource[] };

/** One sheet as read on a day. */
export type SheetLayer = {
  readonly code: string;
  readonly name: string;
  readonly kind: RegionKind;
  readonly edition: number;
  readonly inUseFrom: Date;
  readonly languages: readonly string[];
  readonly text: string;
  readonly rules: readonly ToldRule[];
  /** Rules that begin after that day. */
  readonly coming: readonly ToldRule[];
  readonly terms: readonly ToldTerm[];
  readonly authorities: readonly Contact[];
  readonly accreditation: readonly Contact[];
  readonly gaps: readonly string[];
};

/** A place's own sheet and, general to local, the layers above it, the base layer first. */
export type RegionSheet = SheetLayer & {
  readonly on: CalendarDate;
  readonly line: readonly string[];
  readonly notInherited: RegionLine['except'];
  readonly above: readonly SheetLayer[];
  readonly caution: string;
};

/** An edition of a sheet as a reader meets it on that day: its rules in their order, those in force apart from those to come. */
export function tellLayer(
  { sheet, number, inUseFrom }: { readonly sheet: Sheet; readonly number: number; readonly inUseFrom: Date },
  on: CalendarDate,
): SheetLayer {
  const rules = sheet.rules.map((rule) => tellRule(rule, sheet.sources)).sort((a, b) => a.order - b.order || (a.id < b.id ? -1 : 1));
  return {
    code: sheet.code,
    name: sheet.name,
    kind: sheet.kind,
    edition: number,
    inUseFrom,
    languages: sheet.languages,
    text: sheet.text,
    rules: rules.filter((rule) => isInForce(rule, on)),
    coming: rules.filter(({ from }) => from !== null && from > on),
    terms: sheet.terms
      .filter((term) => isInForce(term, on))
      .map((term) => ({ ...term, sources: tellSources(term.sources, sheet.sources) })),
    authorities: sheet.authorities,
    accreditation: sheet.accreditation,
    gaps: sheet.gaps,
  };
}
