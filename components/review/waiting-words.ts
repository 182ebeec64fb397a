import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { WaitingRow } from '@/lib/regions/domain/amendment-view';

/** A row of the sorting table in words, so that the browser needs none of its own to draw it again. */
export type ShownRow = {
  readonly id: string;
  readonly place: string;
  /** Read out for the link: the place's name alone stands on several. */
  readonly label: string;
  readonly summary: string;
  readonly waits: string;
  readonly sentAt: string;
  readonly size: string;
  /** Each a line: how many moderators, what to mind. */
  readonly minds: readonly string[];
  readonly state: string;
  readonly open: string;
};

/** What the table shows at one moment. `stamp` is another when any of it is. */
export type ShownTable = { readonly stamp: string; readonly count: string; readonly rows: readonly ShownRow[] };

const DAY_MS = 86_400_000;

/** Whole days from one day to another, both in UTC. */
export const daysBetween = (from: Date, to: Date): number =>
  Math.max(0, Math.round((Date.parse(calendarDateOf(to)) - Date.parse(calendarDateOf(from))) / DAY_MS));

export function shownRow(row: WaitingRow, now: Date): ShownRow {
  const { id, name, summary, state, sentAt, items, rules, needed, given, isOwn, isStale, openedBy } = row;
  const days = words('review.table.days', { days: daysBetween(sentAt, now) });
  return {
    id,
    place: name,
    label: words('review.table.read', { place: name }),
    summary,
    waits: words('review.table.sinceOn', { days, date: sayDate(calendarDateOf(sentAt)) }),
    sentAt: sentAt.toISOString(),
    size: rules === 0 ? words('review.table.items', { items }) : words('review.table.itemsRules', { items, rules }),
    minds: [
      ...(needed === 2 ? [words('review.table.two')] : []),
      ...(given === 1 ? [words('review.table.given')] : []),
      ...(isStale ? [words('review.table.stale')] : []),
      ...(isOwn ? [words('review.table.own')] : []),
    ],
    state: words(`review.state.${state}`),
    open: openedBy ?? words('review.table.nobody'),
  };
}

/** "3 amendments wait", or how many of them fit what was chosen. */
export const countWords = (count: number, isNarrowed: boolean): string =>
  words(isNarrowed ? 'review.table.countOf' : 'review.table.count', { count });
