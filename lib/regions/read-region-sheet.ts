import 'server-only';
import { listEditionsInUse } from '@/db/editions';
import { listMemberships, listRegions } from '@/db/regions';
import { calendarDateOf, type CalendarDate } from '@/lib/kernel/calendar-date';
import { cautionFor } from '@/lib/server/caution';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { endOf } from '@/lib/server/load-lines';
import { readEdition } from '@/lib/server/sheets';
import { regionLine } from './domain/line';
import { tellLayer, type RegionSheet } from './domain/told-sheet';

export type { RegionSheet, SheetLayer, ToldTerm } from './domain/told-sheet';

/** The region sheet of a place as of a day, today when none is given. */
export async function readRegionSheet(
  ctx: Ctx,
  input: { readonly code: string; readonly on?: CalendarDate | undefined },
): Promise<Result<RegionSheet, { kind: 'not-found' }>> {
  const on = input.on ?? calendarDateOf(ctx.now);
  const [memberships, regions] = await Promise.all([listMemberships(ctx.db), listRegions(ctx.db)]);
  const own = regions.find(({ code, edition }) => code === input.code && edition !== null);
  if (own === undefined) return err({ kind: 'not-found' });
  const line = regionLine(memberships, own.code, on);
  const base = regions.filter(({ kind }) => kind === 'base').map(({ code }) => code);
  const order = [...new Set([...base, ...line.layers])];
  const heads = await listEditionsInUse(ctx.db, order, endOf(on));
  const editions = await Promise.all(heads.map(({ region, number }) => readEdition(ctx.db, region, number)));
  const layers = order.flatMap((code) => editions.flatMap((edition) => (edition?.region === code ? [tellLayer(edition, on)] : [])));
  const sheet = layers.find(({ code }) => code === own.code);
  if (sheet === undefined) return err({ kind: 'not-found' });
  const above = layers.filter((layer) => layer !== sheet);
  const caution = cautionFor({
    sources: [sheet, ...above].flatMap(({ rules }) => rules.flatMap(({ sources }) => sources)),
    authorities: [[...sheet.authorities, ...above.toReversed().flatMap(({ authorities }) => authorities)]],
    on,
  });
  return ok({ ...sheet, on, line: line.layers, notInherited: line.except, above, caution });
}
