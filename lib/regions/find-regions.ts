import 'server-only';
import { MESSAGES } from '@/lib/kernel/words';
import type { Ctx } from '@/lib/server/ctx';
import { readEdition } from '@/lib/server/sheets';
import { countryCodes } from '@/lib/server/world-map';
import { placeWords } from './domain/condition-words';
import type { ListedRegion } from './domain/listed-region';
import { likelyLanguage, namesOfPlace } from './domain/place-names';
import { nearestRegions, placesNamed, searchRegions, type OtherNames } from './domain/region-search';
import { listRegions } from './list-regions';

export type Country = { readonly code: string; readonly name: string };

export type FoundRegions = {
  /** Every place with a sheet. */
  readonly all: readonly ListedRegion[];
  readonly found: readonly ListedRegion[];
  /** Places whose name is a slip or two away, when nothing was found. */
  readonly nearest: readonly ListedRegion[];
  /** Countries without a sheet that go by the name asked for, or nearly so. */
  readonly without: readonly Country[];
};

/** Finds places by a reader's words: by name in any of a place's languages, by code, or by what else people call it. */
export async function findRegions(ctx: Ctx, asked: string): Promise<FoundRegions> {
  const all = await listRegions(ctx);
  if (asked === '') return { all, found: all, nearest: [], without: [] };
  const names = await namesOfAll(ctx, all);
  const found = searchRegions(all, asked, names);
  const without = countriesWithout(all);
  const theirs = Object.fromEntries(without.map(({ code }) => [code, namesOfPlace(code, { languages: [likelyLanguage(code)], also: [] })]));
  const named = placesNamed(without, asked, theirs);
  const nearest = found.length > 0 || named.length > 0 ? [] : nearestRegions(all, asked, names);
  const near = found.length > 0 || nearest.length > 0 ? [] : nearestRegions(without, asked, theirs);
  return { all, found, nearest, without: named.length > 0 ? named.slice(0, 5) : near };
}

/** Names by which each place with a sheet is found, besides the one it has on its sheet. */
async function namesOfAll(ctx: Ctx, all: readonly ListedRegion[]): Promise<OtherNames> {
  const kept: Readonly<Record<string, string>> = MESSAGES.regions.alsoCalled;
  const editions = await Promise.all(all.map(({ code, edition }) => readEdition(ctx.db, code, edition)));
  const named = editions.flatMap((edition) => {
    if (edition === null) return [];
    const { code, languages } = edition.sheet;
    const also = kept[code];
    return [[code, namesOfPlace(code, { languages, also: also === undefined ? [] : [also] })] as const];
  });
  return Object.fromEntries(named);
}

/** Countries of the world that have no sheet of their own. */
function countriesWithout(all: readonly ListedRegion[]): readonly Country[] {
  const known = new Set(all.map(({ code }) => code));
  return countryCodes.filter((code) => !known.has(code)).map((code) => ({ code, name: placeWords(code) }));
}
