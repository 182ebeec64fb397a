import 'server-only';
import { listEditionsInUse } from '@/db/editions';
import { listMemberships, listRegions } from '@/db/regions';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import type { Ctx } from '@/lib/server/ctx';
import { readEdition } from '@/lib/server/sheets';
import { regionLine } from './domain/line';
import type { PlaceLine } from './domain/substance-limits';
import { tellLayer } from './domain/told-sheet';

/** Every place with a sheet as it is read today, by code: the sheets of its line, general to local. The base layer is no place. */
export async function listPlaceLines(ctx: Ctx): Promise<readonly PlaceLine[]> {
  const today = calendarDateOf(ctx.now);
  const [regions, memberships] = await Promise.all([listRegions(ctx.db), listMemberships(ctx.db)]);
  const withSheet = regions.filter(({ edition }) => edition !== null);
  const heads = await listEditionsInUse(
    ctx.db,
    withSheet.map(({ code }) => code),
    ctx.now,
  );
  const editions = await Promise.all(heads.map(({ region, number }) => readEdition(ctx.db, region, number)));
  const layers = new Map(editions.flatMap((edition) => (edition === null ? [] : [[edition.region, tellLayer(edition, today)] as const])));
  return withSheet
    .filter(({ kind }) => kind !== 'base')
    .map(({ code }) => {
      const line = regionLine(memberships, code, today);
      return { line, layers: line.layers.flatMap((layer) => layers.get(layer) ?? []) };
    });
}
