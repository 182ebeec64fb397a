import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Json } from '@/lib/kernel/canonical-json';

/** What a checklist says of a rule. Written as the API writes it. */
export type TrialStatus = 'applies' | 'does-not-apply' | 'not-settled' | 'treat-as-applying' | 'sources-disagree';

/** An example piece with the lines its checklist must have, kept with a sheet to catch a change that nobody meant. */
export type Trial = {
  readonly id: string;
  /** The piece in a few words, such as "Mug, 95 mm deep, rim decorated". */
  readonly title: string;
  /** The day it is judged for. */
  readonly on: CalendarDate;
  /** By question id, written as the API takes them. */
  readonly answers: Readonly<Record<string, Json>>;
  /** Questions answered with "I don't know yet". */
  readonly declined: readonly string[];
  /** By rule id, of this sheet or of one above it: the expected status. Rules not named are not judged. */
  readonly expected: Readonly<Record<string, TrialStatus>>;
};
