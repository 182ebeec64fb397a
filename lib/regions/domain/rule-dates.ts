import { calendarDateOf, type CalendarDate } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';

const DAY_MS = 86_400_000;

/** The last day on which it still held. */
export const dayBefore = (date: CalendarDate): CalendarDate => calendarDateOf(new Date(Date.parse(date) - DAY_MS));

type Span = { readonly from: CalendarDate | null; readonly to: CalendarDate | null };

/** From when until when, in a sentence. `to` is the first day on which it no longer holds. */
export function sayDates({ from, to }: Span): string {
  if (from !== null && to !== null) return words('regions.dates.both', { from: sayDate(from), until: sayDate(dayBefore(to)) });
  if (from !== null) return words('regions.dates.from', { from: sayDate(from) });
  return to === null ? words('regions.dates.open') : words('regions.dates.until', { until: sayDate(dayBefore(to)) });
}

export type RuleLife = 'coming' | 'in-force' | 'ended';

/** Where a rule stands in its life on a day. */
export function lifeOn({ from, to }: Span, on: CalendarDate): RuleLife {
  if (from !== null && from > on) return 'coming';
  return to !== null && to <= on ? 'ended' : 'in-force';
}
