import 'server-only';
import { listEditionsInUse } from '@/db/editions';
import { listMemberships, listRegions as listRegionHeads } from '@/db/regions';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import type { Ctx } from '@/lib/server/ctx';
import { readEdition } from '@/lib/server/sheets';
import { regionLine } from './domain/line';
import type { LimitsKnown, ListedRegion } from './domain/listed-region';
import { isInForce } from './domain/rule';
import type { Sheet } from './domain/sheet';

export type { LimitsKnown, ListedRegion } from './domain/listed-region';

/** Every place that has a sheet, by code, as read today. The base layer lies below all of them and is not listed. */
export async function listRegions(ctx: Ctx): Promise<readonly ListedRegion[]> {
  const today = calendarDateOf(ctx.now);
  const [regions, memberships] = await Promise.all([listRegionHeads(ctx.db), listMemberships(ctx.db)]);
  const withSheet = regions.filter((region) => region.edition !== null && region.kind !== 'base');
  const heads = await listEditionsInUse(
    ctx.db,
    withSheet.map(({ code }) => code),
    ctx.now,
  );
  const editions = await Promise.all(heads.map(({ region, number }) => readEdition(ctx.db, region, number)));
  const sheets = new Map(editions.flatMap((edition) => (edition === null ? [] : [[edition.region, edition]])));
  return withSheet.flatMap(({ code, name, kind }) => {
    const line = regionLine(memberships, code, today).layers;
    const layers = line.flatMap((layer) => sheets.get(layer)?.sheet ?? []);
    const number = sheets.get(code)?.number;
    return number === undefined ? [] : [{ code, name, kind, line, edition: number, limits: limitsOf(layers, today) }];
  });
}

function limitsOf(layers: readonly Sheet[], today: ReturnType<typeof calendarDateOf>): LimitsKnown {
  const states = layers
    .flatMap(({ rules }) => rules)
    .filter((rule) => isInForce(rule, today) && rule.strength !== 'note')
    .flatMap(({ payload }) => (payload.topic === 'limit' ? [payload.amount.evidence] : []));
  if (states.includes('read')) return 'read';
  return states.length > 0 ? 'to-confirm' : 'none';
}
