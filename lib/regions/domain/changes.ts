import { addMonths, calendarDateOf, type CalendarDate } from '@/lib/kernel/calendar-date';
import type { Rule } from './rule';
import { dayBefore } from './rule-dates';
import type { Sheet } from './sheet';

/** Months of the past that are told. What is coming is told however far ahead it lies, and an overdue look-again date for ever. */
export const MONTHS_BACK = 24;

type Place = { readonly code: string; readonly name: string };
type NamedRule = Pick<Rule, 'id' | 'title'>;

/** One thing that happened or will: rules of a place that share the day, or an edition that several places got at once. */
export type Change =
  | {
      readonly kind: 'edition';
      readonly date: CalendarDate;
      readonly number: number;
      readonly summary: string;
      readonly places: readonly Place[];
    }
  /** `ends`: the date is the last day on which they hold. `look-again`: the day by which somebody should have read them afresh. */
  | {
      readonly kind: 'begins' | 'ends' | 'look-again';
      readonly date: CalendarDate;
      readonly place: Place;
      readonly rules: readonly NamedRule[];
    };

export type NewEdition = { readonly region: string; readonly number: number; readonly summary: string; readonly inUseFrom: Date };
export type MonthOfChanges = { readonly month: string; readonly changes: readonly Change[] };
export type Changes = { readonly coming: readonly MonthOfChanges[]; readonly past: readonly MonthOfChanges[] };

type Source = {
  /** Sheets in use. */
  readonly sheets: readonly Sheet[];
  /** Editions of any of them, older ones too. */
  readonly editions: readonly NewEdition[];
  readonly on: CalendarDate;
};

/** What changed in these sheets and what is coming, by month: the soonest first ahead, the latest first behind. */
export function changesOf({ sheets, editions, on }: Source): Changes {
  const since = addMonths(on, -MONTHS_BACK);
  const ofRules = sheets.flatMap((sheet) => changesOfRules(sheet, on)).filter(({ kind, date }) => kind === 'look-again' || date >= since);
  const all = [...changesOfEditions(sheets, editions).filter(({ date }) => date >= since), ...ofRules];
  const coming = all.filter(({ date }) => date > on).sort((a, b) => (a.date < b.date ? -1 : 1));
  const past = all.filter(({ date }) => date <= on).sort((a, b) => (a.date > b.date ? -1 : 1));
  return { coming: byMonth(coming), past: byMonth(past) };
}

/** Editions of one day with the same number and summary are one line: sheets are often published together. */
function changesOfEditions(sheets: readonly Sheet[], editions: readonly NewEdition[]): readonly Change[] {
  const names = new Map(sheets.map(({ code, name }) => [code, name]));
  const groups = new Map<string, Extract<Change, { kind: 'edition' }>>();
  for (const { region, number, summary, inUseFrom } of editions) {
    const name = names.get(region);
    if (name === undefined) continue;
    const date = calendarDateOf(inUseFrom);
    const key = JSON.stringify([date, number, summary]);
    const places = groups.get(key)?.places ?? [];
    groups.set(key, { kind: 'edition', date, number, summary, places: [...places, { code: region, name }] });
  }
  return [...groups.values()];
}

function changesOfRules({ code, name, rules }: Sheet, on: CalendarDate): readonly Change[] {
  const place = { code, name };
  return [
    ...byDay(rules, ({ from }) => from).map((group) => ({ kind: 'begins' as const, place, ...group })),
    ...byDay(rules, ({ to }) => (to === null ? null : dayBefore(to))).map((group) => ({ kind: 'ends' as const, place, ...group })),
    ...byDay(rules, ({ lookAgainBy, to }) => (lookAgainBy < on && (to === null || to > on) ? lookAgainBy : null)).map((group) => ({
      kind: 'look-again' as const,
      place,
      ...group,
    })),
  ];
}

type Day = { readonly date: CalendarDate; readonly rules: readonly NamedRule[] };

function byDay(rules: readonly Rule[], dayOf: (rule: Rule) => CalendarDate | null): readonly Day[] {
  const days = new Map<CalendarDate, NamedRule[]>();
  for (const rule of rules) {
    const day = dayOf(rule);
    if (day !== null) days.set(day, [...(days.get(day) ?? []), { id: rule.id, title: rule.title }]);
  }
  return [...days].map(([date, found]) => ({ date, rules: found }));
}

/** The list has an order already; months follow it. */
function byMonth(changes: readonly Change[]): readonly MonthOfChanges[] {
  const months = new Map<string, Change[]>();
  for (const change of changes) {
    const month = change.date.slice(0, 7);
    months.set(month, [...(months.get(month) ?? []), change]);
  }
  return [...months].map(([month, found]) => ({ month, changes: found }));
}
