import 'server-only';
import { listEditionsSince } from '@/db/edition-news';
import { listMemberships } from '@/db/regions';
import { addMonths, calendarDateOf } from '@/lib/kernel/calendar-date';
import type { Ctx } from '@/lib/server/ctx';
import { changesOf, MONTHS_BACK, type Changes } from './domain/changes';
import { regionLine } from './domain/line';
import { listSheetsInUse } from './list-sheets-in-use';

export type ListedChanges = Changes & {
  /** Places one can narrow the list to. */
  readonly places: readonly { readonly code: string; readonly name: string }[];
  /** The place it was narrowed to. What changes in a layer above changes there too. */
  readonly narrowed: { readonly code: string; readonly name: string } | null;
};

const MOST_EDITIONS = 2000;

/** What changed in the sheets and what is coming, over all places or in the line of one. An unknown place narrows nothing. */
export async function listChanges(ctx: Ctx, input: { readonly region: string | null }): Promise<ListedChanges> {
  const on = calendarDateOf(ctx.now);
  const since = new Date(`${addMonths(on, -MONTHS_BACK)}T00:00:00Z`);
  const [editions, all, memberships] = await Promise.all([
    listEditionsSince(ctx.db, since, MOST_EDITIONS),
    listSheetsInUse(ctx),
    listMemberships(ctx.db),
  ]);
  const places = all.filter(({ sheet }) => sheet.kind !== 'base').map(({ sheet: { code, name } }) => ({ code, name }));
  const narrowed = places.find(({ code }) => code === input.region) ?? null;
  const line = narrowed === null ? null : new Set(regionLine(memberships, narrowed.code, on).layers);
  const sheets = all.map(({ sheet }) => sheet).filter(({ code }) => line === null || line.has(code));
  return { ...changesOf({ sheets, editions, on }), places, narrowed };
}
