import { feature } from 'topojson-client';
import type { GeometryCollection, Topology } from 'topojson-specification';
import { describe, expect, test } from 'vitest';
import atlas from 'world-atlas/countries-110m.json';
import { coverageOf, countCoverage } from '@/lib/regions/domain/coverage';
import type { ListedRegion } from '@/lib/regions/domain/listed-region';
import { countryCodes, MAP_SIZE, worldMap } from '@/lib/server/world-map';

const aPlace = (code: string, limits: ListedRegion['limits']): ListedRegion => ({
  code,
  name: code.toUpperCase(),
  kind: 'country',
  line: [code],
  edition: 1,
  limits,
});

describe('REG-41 each country stands in exactly one state of coverage', () => {
  const regions = [aPlace('dk', 'read'), aPlace('in', 'to-confirm'), aPlace('cl', 'none')];

  test('what its line knows of limits decides; without a sheet it is said to have none', () => {
    const states = new Map(coverageOf(['dk', 'in', 'cl', 'fj'], regions).map(({ code, state }) => [code, state]));
    expect(Object.fromEntries(states)).toEqual({ dk: 'read', in: 'to-confirm', cl: 'no-limits', fj: 'no-sheet' });
  });

  test('every country of ISO 3166-1 is counted once', () => {
    const { read, ...others } = countCoverage(coverageOf(countryCodes, regions));
    expect(read).toBe(1);
    expect(read + others['to-confirm'] + others['no-limits'] + others['no-sheet']).toBe(249);
  });
});

// Names in the atlas are Natural Earth's; the codes are ISO 3166-1's (Debian package iso-codes). Both are outside sources for each other.
test('REG-41 the outlines carry the codes of the countries they are named after', () => {
  const topology = atlas as unknown as Topology<{ countries: GeometryCollection<{ name: string }> }>;
  const named = new Map(feature(topology, topology.objects.countries).features.map(({ id, properties }) => [String(id), properties.name]));
  const english = new Intl.DisplayNames(['en'], { type: 'region' });
  const wellKnown = { '208': 'dk', '578': 'no', '392': 'jp', '124': 'ca', '036': 'au', '710': 'za', '792': 'tr', '410': 'kr' };
  for (const [number, code] of Object.entries(wellKnown)) {
    const name = english.of(code.toUpperCase()) ?? '';
    expect([name, name.replace('Türkiye', 'Turkey')], number).toContain(named.get(number));
  }
  expect(worldMap().filter(({ code }) => code === null)).toHaveLength(3); // Northern Cyprus, Somaliland and Kosovo have no code there
});

/** Every point of a path of absolute moves and relative lines. */
function pointsOf(path: string): readonly (readonly [number, number])[] {
  let at: readonly [number, number] = [0, 0];
  return [...path.matchAll(/([Ml])([^MlZ]+)/g)].map(([, step, figures = '']) => {
    const [x = NaN, y = NaN] = (figures.match(/-?(?:\d+\.?\d*|\.\d+)/g) ?? []).map(Number);
    at = step === 'M' ? [x, y] : [at[0] + x, at[1] + y];
    return at;
  });
}

test('REG-41 outlines drawn in steps stay within the map and lie where their countries do', () => {
  const points = new Map(worldMap().map(({ code, path }) => [code, pointsOf(path)]));
  const { width, height } = MAP_SIZE;
  const outside = [...points].filter(([, all]) => !all.every(([x, y]) => x >= -1 && x <= width + 1 && y >= -1 && y <= height + 1));
  expect(outside.map(([code]) => code)).toEqual([]);
  // Worked out by hand from the formulas of the Equal Earth projection for a point near the middle of each country.
  const known = { dk: [376, 38], jp: [609, 79], au: [616, 241], br: [251, 202] } as const;
  for (const [code, [x, y]] of Object.entries(known)) {
    const all = points.get(code) ?? [];
    const mean = (axis: 0 | 1): number => all.reduce((sum, point) => sum + point[axis], 0) / all.length;
    expect([code, Math.abs(mean(0) - x) < 12, Math.abs(mean(1) - y) < 12]).toEqual([code, true, true]);
  }
});
