import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Sheet } from './sheet';

/** A rule that is to be read afresh. */
export type DueRule = {
  readonly region: string;
  readonly place: string;
  readonly id: string;
  readonly title: string;
  readonly lookAgainBy: CalendarDate;
  /** Days until it is due; negative when that is over. */
  readonly daysLeft: number;
};

const DAY_MS = 24 * 60 * 60_000;

const daysBetween = (from: CalendarDate, to: CalendarDate): number => Math.round((Date.parse(to) - Date.parse(from)) / DAY_MS);

/** Rules of these sheets that are due within so many days or are past it, the longest overdue first. A rule that ended is not read again. */
export function dueRules(sheets: readonly Sheet[], today: CalendarDate, withinDays: number): readonly DueRule[] {
  return sheets
    .flatMap(({ code, name, rules }) =>
      rules
        .filter(({ to }) => to === null || to > today)
        .map(({ id, title, lookAgainBy }) => ({
          region: code,
          place: name,
          id,
          title,
          lookAgainBy,
          daysLeft: daysBetween(today, lookAgainBy),
        })),
    )
    .filter(({ daysLeft }) => daysLeft <= withinDays)
    .sort((a, b) => a.daysLeft - b.daysLeft || (a.region === b.region ? order(a.id, b.id) : order(a.region, b.region)));
}

const order = (a: string, b: string): number => (a < b ? -1 : 1);
