/** A legal date without a zone, "2026-12-01". Compares as text. Made only by `parseCalendarDate` and `calendarDateOf`. */
export type CalendarDate = string & { readonly __brand: 'CalendarDate' };

const SHAPE = /^(\d{4})-(\d{2})-(\d{2})$/;

const isCalendarDate = (text: string): text is CalendarDate => {
  if (!SHAPE.test(text) || text < '1000-01-01') return false;
  const at = new Date(`${text}T00:00:00Z`);
  return !Number.isNaN(at.getTime()) && at.toISOString().slice(0, 10) === text;
};

/** The date, or null when the text is not a day of the calendar ("2026-02-30"). */
export function parseCalendarDate(text: string): CalendarDate | null {
  return isCalendarDate(text) ? text : null;
}

/** The day of an instant, in UTC. */
export function calendarDateOf(instant: Date): CalendarDate {
  const date = parseCalendarDate(instant.toISOString().slice(0, 10));
  if (date === null) throw new RangeError('An instant outside the years 1000 to 9999 has no calendar date');
  return date;
}

/** The same day `count` months later; the last day of the month where that day does not exist. */
export function addMonths(date: CalendarDate, count: number): CalendarDate {
  const [year = 0, month = 0, day = 0] = date.split('-').map(Number);
  const last = new Date(Date.UTC(year, month + count, 0)).getUTCDate();
  return calendarDateOf(new Date(Date.UTC(year, month - 1 + count, Math.min(day, last))));
}
