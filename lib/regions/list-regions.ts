import 'server-only';
import { listEditionsInUse } from '@/db/editions';
import { listMemberships, listRegions as listRegionHeads } from '@/db/regions';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import type { Ctx } from '@/lib/server/ctx';
import { readEdition } from '@/lib/server/sheets';
import { regionLine } from './domain/line';
import type { LimitsKnown, ListedRegion } from './domain/listed-region';
import { isInForce, type Rule } from './domain/rule';

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
    const { layers: line, except } = regionLine(memberships, code, today);
    const notTaken = new Set(except.map(({ rule }) => rule));
    const rules = line.flatMap((layer) => sheets.get(layer)?.sheet.rules ?? []).filter(({ id }) => !notTaken.has(id));
    const number = sheets.get(code)?.number;
    return number === undefined ? [] : [{ code, name, kind, line, edition: number, limits: limitsOf(rules, today) }];
  });
}

/** A figure from memory is never more than a note, and a place that has one is not without limits: it is to be confirmed. */
function limitsOf(rules: readonly Rule[], today: ReturnType<typeof calendarDateOf>): LimitsKnown {
  const limits = rules.flatMap((rule) =>
    rule.payload.topic === 'limit' && isInForce(rule, today) ? [{ strength: rule.strength, known: rule.payload.amount.evidence }] : [],
  );
  if (limits.some(({ strength, known }) => known === 'read' && strength !== 'note')) return 'read';
  return limits.some(({ known }) => known === 'memory') ? 'to-confirm' : 'none';
}
