import { expect, test } from 'vitest';
import { regionLine } from '@/lib/regions/domain/line';
import { substanceLimits } from '@/lib/regions/domain/substance-limits';
import { tellLayer } from '@/lib/regions/domain/told-sheet';
import { isInForce } from '@/lib/regions/domain/rule';
import { aDate, seedSheets } from '@/tests/builders/seed-sheets';

const ON = aDate('2026-12-01');
const memberships = new Map([...seedSheets.values()].map(({ code, memberships: edges }) => [code, edges] as const));
const lines = [...seedSheets.values()]
  .filter(({ kind }) => kind !== 'base')
  .map(({ code }) => {
    const line = regionLine(memberships, code, ON);
    const layers = line.layers.flatMap((layer) => {
      const sheet = seedSheets.get(layer);
      return sheet === undefined ? [] : [tellLayer({ sheet, number: 1, inUseFrom: new Date(0) }, ON)];
    });
    return { line, layers };
  });

test('REG-24 every limit in force on a substance stands once, under the place whose sheet holds it', () => {
  for (const symbol of ['Pb', 'Cd']) {
    const shown = substanceLimits(lines, symbol, ON).places.flatMap(({ rows }) => rows.map(({ rule }) => rule.id));
    const held = [...seedSheets.values()]
      .filter(({ kind }) => kind !== 'base')
      .flatMap(({ rules }) => rules)
      .filter((rule) => rule.payload.topic === 'limit' && rule.payload.substance === symbol && isInForce(rule, ON))
      .map(({ id }) => id);
    expect([...shown].sort()).toEqual([...held].sort());
    expect(new Set(shown).size).toBe(shown.length);
  }
});

test('REG-24 a place has limits of its own, takes them over from above, or is named as one where none was found', () => {
  for (const symbol of ['Pb', 'Cd', 'Co', 'U']) {
    const { places, above, notFound } = substanceLimits(lines, symbol, ON);
    const codes = [...places, ...above, ...notFound].map(({ code }) => code);
    expect([...codes].sort()).toEqual(lines.map(({ layers }) => layers.at(-1)?.code).sort());
  }
  const lead = substanceLimits(lines, 'Pb', ON);
  expect(lead.places.map(({ code }) => code)).toContain('eu');
  expect(lead.above.find(({ code }) => code === 'dk')?.layers).toEqual([seedSheets.get('eu')?.name]);
  expect(substanceLimits(lines, 'U', ON).places).toEqual([]);
});
