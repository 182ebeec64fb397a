import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Evidence, Rule, Source, Term } from './rule';
import type { Trial } from './trial';

/** Whom to ask: an authority of a place, or a body that accredits labs there. */
export type Contact = {
  readonly name: string;
  readonly url: string | null;
  readonly role: string;
  readonly evidence: Evidence;
};

/** Part of a place's line while it holds. `except` names inherited rules that are not active in that line, with the reason. */
export type Membership = {
  readonly parent: string;
  readonly from: CalendarDate | null;
  readonly to: CalendarDate | null;
  readonly except: readonly { readonly rule: string; readonly why: string }[];
};

export type RegionKind = 'bloc' | 'country' | 'part' | 'standard' | 'base';

/** The whole of what Footring holds on one place: the document of an edition. */
export type Sheet = {
  readonly code: string;
  readonly name: string;
  readonly kind: RegionKind;
  /** Languages of the place, BCP 47. */
  readonly languages: readonly string[];
  readonly memberships: readonly Membership[];
  /** Introduction in Markdown, and what is coming. */
  readonly text: string;
  /** Ids of the researched facts that the text, the gaps, or the contacts carry. */
  readonly textFacts: readonly string[];
  readonly authorities: readonly Contact[];
  readonly accreditation: readonly Contact[];
  readonly gaps: readonly string[];
  readonly sources: readonly Source[];
  readonly terms: readonly Term[];
  readonly rules: readonly Rule[];
  /** Example pieces with their expected lines; ids are unique within a sheet. */
  readonly trials: readonly Trial[];
  /** Researched facts that no rule, term or text carries, each with the reason. */
  readonly leftOut: readonly { readonly fact: string; readonly why: string }[];
};
