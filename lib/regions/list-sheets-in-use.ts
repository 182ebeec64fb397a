import 'server-only';
import { listEditionsInUse } from '@/db/editions';
import { listRegions } from '@/db/regions';
import type { Edition } from '@/db/rows/edition-row';
import type { Ctx } from '@/lib/server/ctx';
import { readEdition } from '@/lib/server/sheets';

/** Every sheet in the edition in use now, by code. Two queries; the documents come out of memory. */
export async function listSheetsInUse(ctx: Ctx): Promise<readonly Edition[]> {
  const regions = await listRegions(ctx.db);
  const codes = regions.filter(({ edition }) => edition !== null).map(({ code }) => code);
  const heads = await listEditionsInUse(ctx.db, codes, ctx.now);
  const numbers = new Map(heads.map(({ region, number }) => [region, number]));
  const editions = await Promise.all(codes.map((code) => readEdition(ctx.db, code, numbers.get(code) ?? 1)));
  return editions.flatMap((edition) => (edition === null ? [] : [edition]));
}
