import 'server-only';
import { countRegionWishes } from '@/db/region-wishes';
import { listRegions } from '@/db/regions';
import type { Ctx } from '@/lib/server/ctx';
import { countryCodes } from '@/lib/server/world-map';
import { placeWords } from './domain/condition-words';

export type WishedCountry = { readonly code: string; readonly name: string; readonly count: number };

const MOST = 300;

/** Every country without a sheet, with how often it was asked for; the most wanted first, the rest by code. Those that got a sheet are left out. */
export async function listWishes(ctx: Ctx): Promise<readonly WishedCountry[]> {
  const [regions, counted] = await Promise.all([listRegions(ctx.db), countRegionWishes(ctx.db, MOST)]);
  const covered = new Set(regions.filter(({ edition }) => edition !== null).map(({ code }) => code));
  const counts = new Map(counted.map(({ region, count }) => [region, count]));
  return countryCodes
    .filter((code) => !covered.has(code))
    .map((code) => ({ code, name: placeWords(code), count: counts.get(code) ?? 0 }))
    .sort((a, b) => b.count - a.count || (a.code < b.code ? -1 : 1));
}
