import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Evidence, Standing, Strength } from './rule';

/** A thing said in the trade, with what the texts say of it. */
export type HeardClaim = {
  readonly id: string;
  /** The claim as one hears it; shown as a quote, never as our word. */
  readonly heard: string;
  readonly says: string;
  readonly doNow: string;
  /** Ids of the rules that what we say rests on. */
  readonly rules: readonly string[];
  /** Texts looked in where no rule carries what was found, or where nothing was. */
  readonly lookedIn: readonly { readonly title: string; readonly on: CalendarDate }[];
};

/** A rule named beside a claim, as the sheet in use has it. */
export type NamedRule = {
  readonly id: string;
  readonly title: string;
  readonly place: string;
  readonly strength: Strength;
  readonly standing: Standing;
  readonly evidence: Evidence;
  readonly source: string | null;
};

export type AnsweredClaim = Omit<HeardClaim, 'rules'> & { readonly rules: readonly NamedRule[] };
