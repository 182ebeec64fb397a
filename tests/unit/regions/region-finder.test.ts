import { describe, expect, test } from 'vitest';
import { LOCALE, MESSAGES } from '@/lib/kernel/words';
import type { ListedRegion } from '@/lib/regions/domain/listed-region';
import { likelyLanguage, namesOfPlace } from '@/lib/regions/domain/place-names';
import { nearestRegions, placesNamed, searchRegions } from '@/lib/regions/domain/region-search';
import { groupByPart, worldPartOf } from '@/lib/regions/domain/world-parts';
import { countryCodes } from '@/lib/server/world-map';
import { seedSheets } from '@/tests/builders/seed-sheets';

const SHEETS = [...seedSheets.values()].filter(({ kind }) => kind !== 'base');
const ALSO: Readonly<Record<string, string>> = MESSAGES.regions.alsoCalled;
const regions = SHEETS.map(({ code, name, kind }): ListedRegion => ({ code, name, kind, line: [code], edition: 1, limits: 'none' }));
const names = Object.fromEntries(
  SHEETS.map(({ code, languages }) => [code, namesOfPlace(code, { languages, also: ALSO[code] === undefined ? [] : [ALSO[code]] })]),
);
const found = (asked: string): readonly string[] => searchRegions(regions, asked, names).map(({ code }) => code);

describe('REG-42 the finder', () => {
  test('finds every country by its name in each language its sheet names', () => {
    const missed = SHEETS.filter(({ code }) => /^[a-z]{2}$/.test(code)).flatMap(({ code, languages }) =>
      languages
        .map((language) => new Intl.DisplayNames([language], { type: 'region' }).of(code.toUpperCase()) ?? '')
        .filter((name) => !found(name.normalize('NFKD').replace(/\p{M}/gu, '').toUpperCase()).includes(code)),
    );
    expect(missed).toEqual([]);
  });

  test.each([
    ['Deutschland', 'de'],
    ['日本', 'jp'],
    ['대한민국', 'kr'],
    ['ελλάδα', 'gr'],
    ['Europæiske', 'eu'],
    ['Holland', 'nl'],
    ['America', 'us'],
    ['England', 'gb-eng'],
    ['uk', 'gb'],
    ['UAE', 'ae'],
    ['turkiye', 'tr'],
  ])('%s leads to %s', (asked, code) => {
    expect(found(asked)).toContain(code);
  });

  test('forgives a slip in any of the names', () => {
    const near = (asked: string): string | undefined => nearestRegions(regions, asked, names)[0]?.code;
    expect(['Deutchland', 'Kalifornein', 'Svergie', 'Danmrk'].map(near)).toEqual(['de', 'us-ca', 'se', 'dk']);
  });
});

describe('REG-43 a country without a sheet', () => {
  const without = [
    { code: 'eg', name: 'Egypt' },
    { code: 'ke', name: 'Kenya' },
    { code: 'gn', name: 'Guinea' },
    { code: 'gw', name: 'Guinea-Bissau' },
  ];
  const theirs = Object.fromEntries(without.map(({ code }) => [code, namesOfPlace(code, { languages: [likelyLanguage(code)], also: [] })]));
  const named = (asked: string): readonly string[] => placesNamed(without, asked, theirs).map(({ code }) => code);

  test('is recognised by its English name, the beginning of it, its code and its own name', () => {
    expect([named('egypt'), named('Keny'), named('KE'), named('مصر')]).toEqual([['eg'], ['ke'], ['ke'], ['eg']]);
    expect(named('guinea')).toEqual(['gn', 'gw']);
  });

  test('is not guessed from a letter or from nothing', () => {
    expect([named(''), named('e'), named('Denmark')]).toEqual([[], [], []]);
  });
});

describe('REG-49 parts of the world', () => {
  test('every country and every place with a sheet lies in one; only standards lie in none', () => {
    expect(countryCodes.filter((code) => worldPartOf(code) === 'standards')).toEqual([]);
    expect(SHEETS.filter(({ code, kind }) => (worldPartOf(code) === 'standards') !== (kind === 'standard'))).toEqual([]);
  });

  test('no place is lost by grouping; blocs come first, and parts follow their country', () => {
    const groups = groupByPart(regions, new Intl.Collator(LOCALE));
    expect(groups.flatMap((group) => group.regions)).toHaveLength(regions.length);
    const codesIn = (part: string): readonly string[] => groups.find((group) => group.part === part)?.regions.map(({ code }) => code) ?? [];
    expect(codesIn('europe')[0]).toBe('eu');
    expect(codesIn('north-america').slice(0, 3)).toEqual(['ca', 'us', 'us-ca']);
    const europe = codesIn('europe');
    expect(europe.slice(europe.indexOf('gb'), europe.indexOf('gb') + 2)).toEqual(['gb', 'gb-eng']);
  });
});
