import 'server-only';
import { listEditionsInUse } from '@/db/editions';
import { listMemberships, listRegions } from '@/db/regions';
import type { SampleGround } from '@/lib/checks/domain/sample-pots';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import type { Ctx } from '@/lib/server/ctx';
import { readEdition } from '@/lib/server/sheets';
import type { FormGround } from './domain/form-ground';
import { regionLine } from './domain/line';
import type { Sheet } from './domain/sheet';

/** What the forms of a proposed sheet choose from: its line with the sheets above it as they are in use today, and all places. */
export async function readFormGround(ctx: Ctx, sheet: Sheet): Promise<FormGround & { readonly sample: SampleGround }> {
  const on = calendarDateOf(ctx.now);
  const [stored, regions] = await Promise.all([listMemberships(ctx.db), listRegions(ctx.db)]);
  const memberships = new Map([...stored, [sheet.code, sheet.memberships] as const]);
  const base = regions.filter(({ kind, edition }) => kind === 'base' && edition !== null).map(({ code }) => code);
  const above = [...new Set([...base, ...regionLine(memberships, sheet.code, on).layers])].filter((code) => code !== sheet.code);
  const heads = await listEditionsInUse(ctx.db, above, ctx.now);
  const editions = await Promise.all(heads.map(({ region, number }) => readEdition(ctx.db, region, number)));
  const sheets = [...above.flatMap((code) => editions.flatMap((edition) => (edition?.region === code ? [edition.sheet] : []))), sheet];
  return {
    rules: sheets.flatMap(({ code, rules }) => rules.map(({ id, title, says }) => ({ id, title, says, region: code }))),
    terms: sheets.flatMap(({ code, terms }) => terms.map(({ id, name, category }) => ({ id, name, category, region: code }))),
    places: regions.filter(({ kind }) => kind !== 'base').map(({ code, name, edition }) => ({ code, name, hasSheet: edition !== null })),
    sample: {
      layers: sheets.map(({ code, terms }) => ({ region: code, terms })),
      region: sheet.code,
      on,
      places: [...memberships.keys()].flatMap((code) => {
        const line = regionLine(memberships, code, on).layers;
        return line.length > 1 ? [{ code, line }] : [];
      }),
    },
  };
}
