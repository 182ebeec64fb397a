import { describe, expect, test } from 'vitest';
import { regionLine } from '@/lib/regions/domain/line';
import { compareLimits, rowsNamed, type LimitComparison } from '@/lib/regions/domain/limit-comparison';
import type { LimitPayload } from '@/lib/regions/domain/rule';
import { sharedAmount } from '@/lib/regions/domain/shared-unit';
import { limitsOfLine } from '@/lib/regions/domain/substance-limits';
import { tellLayer } from '@/lib/regions/domain/told-sheet';
import { aDate, seedSheets } from '@/tests/builders/seed-sheets';

const ON = aDate('2026-12-01');
const memberships = new Map([...seedSheets.values()].map(({ code, memberships: edges }) => [code, edges] as const));
const lineOf = (code: string) => {
  const line = regionLine(memberships, code, ON);
  const layers = line.layers.flatMap((layer) => {
    const sheet = seedSheets.get(layer);
    return sheet === undefined ? [] : [tellLayer({ sheet, number: 1, inUseFrom: new Date(0) }, ON)];
  });
  return { line, layers };
};
const PLACES = [...seedSheets.values()].filter(({ kind }) => kind !== 'base').map(({ code }) => lineOf(code));

const shown = ({ rows }: LimitComparison, code: string): readonly string[] =>
  rows.flatMap(({ cells }) => (cells[code] ?? []).map(({ row }) => row.rule.id));
const cell = ({ rows }: LimitComparison, id: string, code: string): readonly string[] =>
  (rows.find((row) => row.id === id)?.cells[code] ?? []).map(({ row: { limit } }) => `${String(limit.amount.value)} ${limit.amount.unit}`);

describe('REG-46 limits side by side', () => {
  test.each(['Pb', 'Cd'])('every limit on %s of every line stands in its place’s column, once a row', (symbol) => {
    const comparison = compareLimits(PLACES, symbol, ON);
    for (const { line, layers } of PLACES) {
      const code = layers.at(-1)?.code ?? '';
      const held = limitsOfLine({ line, layers }, ON).filter(({ limit }) => limit.substance === symbol);
      expect([code, [...new Set(shown(comparison, code))].sort()]).toEqual([code, held.map(({ rule }) => rule.id).sort()]);
      for (const { id, cells } of comparison.rows) {
        const ids = (cells[code] ?? []).map(({ row }) => row.rule.id);
        expect([id, code, new Set(ids).size]).toEqual([id, code, ids.length]);
      }
    }
  });

  test('kinds of ware that places draw alike share a row, and what is inherited stands in the column of the heir', () => {
    const comparison = compareLimits(['dk', 'jp', 'us'].map(lineOf), 'Pb', ON);
    expect(comparison.places.map(({ code }) => code)).toEqual(['dk', 'jp', 'us']);
    expect(cell(comparison, 'flat', 'dk')).toEqual(['0.8 mg/dm2']);
    expect(cell(comparison, 'flat', 'jp')).toHaveLength(1);
    expect(cell(comparison, 'pitcher', 'dk')).toEqual([]);
    expect(cell(comparison, 'pitcher', 'us')).toHaveLength(1);
  });

  test('rows are asked for by our words or a place’s own', () => {
    const { rows } = compareLimits(['eu', 'jp'].map(lineOf), 'Pb', ON);
    const ids = (asked: string): readonly string[] => rowsNamed(rows, asked, ({ id }) => id).map(({ id }) => id);
    expect(ids('flat')).toEqual(['flat']);
    expect(ids('shallow')).toEqual(['flat', 'cooking']);
    expect(ids('')).toHaveLength(rows.length);
    expect(ids('teapot')).toEqual([]);
  });
});

describe('REG-46 a figure in another unit', () => {
  const shared = (per: LimitPayload['per'], value: number, unit: string) =>
    sharedAmount({ per, amount: { value, unit, evidence: 'read' } });

  test('stands only where it is exactly the same', () => {
    expect(shared('L', 0.5, 'ug/mL')).toEqual({ value: '0.5', unit: 'mg/L' });
    expect(shared('L', 20, 'ug/L')).toEqual({ value: '0.02', unit: 'mg/L' });
    expect(shared('dm2', 1.7, 'ug/cm2')).toEqual({ value: '0.17', unit: 'mg/dm2' });
    expect(shared('article', 500, 'ug/article')).toEqual({ value: '0.5', unit: 'mg/article' });
    expect(shared('kg', 0.06, 'percent')).toEqual({ value: '600', unit: 'mg/kg' });
    expect(shared('kg', 90, 'ppm')).toEqual({ value: '90', unit: 'mg/kg' });
  });

  test('is left away in the unit we compare in, and where the density of the liquid would be needed', () => {
    expect(shared('L', 0.8, 'mg/L')).toBeNull();
    expect(shared('L', 7, 'ppm')).toBeNull();
  });
});
