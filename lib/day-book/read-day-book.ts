import 'server-only';
import { listNamed } from '@/db/account-search';
import { listDayBook, type DayBookFilter } from '@/db/day-book';
import { listRegions } from '@/db/regions';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Ctx } from '@/lib/server/ctx';
import { ACTS } from './domain/kinds';
import { peopleOf, tellLine, type ToldLine } from './domain/told-line';
import type { DayBookQuery } from './schema';

const AT_A_TIME = 50;
const DAY_MS = 86_400_000;

export type DayBookPage = {
  readonly lines: readonly ToldLine[];
  /** The number before which the next page begins; null on the last one. */
  readonly next: number | null;
  /** Places with a sheet, by which one can choose lines and to which they lead. */
  readonly places: readonly { readonly code: string; readonly name: string }[];
};

/** The day book for everybody, the newest line first. `from` and `until` are days, both included. */
export async function readDayBook(ctx: Ctx, query: DayBookQuery): Promise<DayBookPage> {
  const [found, regions] = await Promise.all([listDayBook(ctx.db, filterOf(query)), listRegions(ctx.db)]);
  const entries = found.slice(0, AT_A_TIME);
  const people = await listNamed(ctx.db, [...new Set(entries.flatMap(peopleOf))]);
  const byId = new Map(people.map((person) => [person.id, person]));
  return {
    lines: entries.map((entry) => tellLine(entry, byId)),
    places: regions.filter(({ edition }) => edition !== null).map(({ code, name }) => ({ code, name })),
    next: found.length > AT_A_TIME ? (entries.at(-1)?.number ?? null) : null,
  };
}

function filterOf({ kind, region, from, until, before }: DayBookQuery): DayBookFilter {
  return {
    limit: AT_A_TIME + 1,
    ...(kind === undefined ? {} : { did: ACTS[kind] }),
    ...(region === undefined ? {} : { region }),
    ...(from === undefined ? {} : { from: new Date(startOf(from)) }),
    ...(until === undefined ? {} : { until: new Date(startOf(until) + DAY_MS) }),
    ...(before === undefined ? {} : { before }),
  };
}

const startOf = (day: CalendarDate): number => Date.parse(`${day}T00:00:00Z`);
