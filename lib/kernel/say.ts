import type { CalendarDate } from './calendar-date';
import { LOCALE } from './words';

const DAY = new Intl.DateTimeFormat(LOCALE, { dateStyle: 'long', timeZone: 'UTC' });
const INSTANT = new Intl.DateTimeFormat(LOCALE, { dateStyle: 'long', timeStyle: 'short', timeZone: 'UTC' });
const LIST = new Intl.ListFormat(LOCALE, { type: 'conjunction' });
const PHRASES = new Intl.ListFormat(LOCALE, { type: 'unit', style: 'short' });

/** "1 December 2026". A calendar date has no zone, so it reads the same everywhere. */
export function sayDate(date: CalendarDate): string {
  return DAY.format(new Date(`${date}T00:00:00Z`));
}

/** "1 December 2026 at 10:05 UTC". An instant is said in the one zone we know of. */
export function sayInstant(instant: Date): string {
  return `${INSTANT.format(instant)} UTC`;
}

/** "Bowl, 62 mm deep inside, inside unglazed": phrases that each stand by themselves. */
export function sayPhrases(phrases: readonly string[]): string {
  return PHRASES.format(phrases);
}

/** "a, b and c". */
export function sayList(items: readonly string[]): string {
  return LIST.format(items);
}
