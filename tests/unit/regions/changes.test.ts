import { describe, expect, test } from 'vitest';
import { changesOf, type Change, type Changes } from '@/lib/regions/domain/changes';
import { aSheet, isA, sheetRule, TODAY } from '../checks/sheets';
import { day } from '../checks/lines';
import { seedSheets } from '@/tests/builders/seed-sheets';

const none: Parameters<typeof changesOf>[0] = { sheets: [], editions: [], on: TODAY };
const flat = ({ coming, past }: Changes): readonly Change[] => [...coming, ...past].flatMap(({ changes }) => changes);
const said = (changes: readonly Change[]): readonly string[] =>
  changes.map((change) =>
    change.kind === 'edition'
      ? `${change.date} edition ${String(change.number)} ${change.places.map(({ code }) => code).join(' ')}`
      : `${change.date} ${change.kind} ${change.rules.map(({ id }) => id).join(' ')}`,
  );

describe('REG-44 changes by date', () => {
  test('a start stands on its day, an end on the last day it holds, both sides of today', () => {
    const sheet = aSheet([
      sheetRule('old', isA, { from: day('2025-03-01'), to: day('2027-01-01') }),
      sheetRule('new', isA, { from: day('2027-01-01') }),
      sheetRule('today', isA, { from: TODAY }),
    ]);
    const { coming, past } = changesOf({ ...none, sheets: [sheet] });
    expect(coming.map(({ month }) => month)).toEqual(['2026-12', '2027-01']);
    expect(said(coming.flatMap(({ changes }) => changes))).toEqual(['2026-12-31 ends old', '2027-01-01 begins new']);
    expect(said(past.flatMap(({ changes }) => changes))).toEqual([`${TODAY} begins today`, '2025-03-01 begins old']);
  });

  test('what began more than two years ago is left out, what is overdue never is', () => {
    const sheet = aSheet([
      sheetRule('ancient', isA, { from: day('2024-11-30'), lookAgainBy: day('2024-01-01') }),
      sheetRule('edge', isA, { from: day('2024-12-01') }),
      sheetRule('gone', isA, { to: day('2024-06-01'), lookAgainBy: day('2024-01-01') }),
      sheetRule('due-today', isA, { lookAgainBy: TODAY }),
    ]);
    expect(said(flat(changesOf({ ...none, sheets: [sheet] })))).toEqual(['2024-12-01 begins edge', '2024-01-01 look-again ancient']);
  });

  test('sheets published together are one line; editions of unknown sheets none', () => {
    const edition = (region: string, number: number, at: string) => ({
      region,
      number,
      summary: 'Founding sheet',
      inUseFrom: new Date(at),
    });
    const changes = changesOf({
      ...none,
      sheets: [aSheet([]), aSheet([], { code: 'rr', name: 'Rill' })],
      editions: [
        edition('qq', 2, '2026-11-20T08:00:00Z'),
        edition('qq', 1, '2026-11-01T23:00:00Z'),
        edition('rr', 1, '2026-11-01T08:00:00Z'),
        edition('zz', 1, '2026-11-01T08:00:00Z'),
      ],
    });
    expect(said(flat(changes))).toEqual(['2026-11-20 edition 2 qq', '2026-11-01 edition 1 qq rr']);
  });

  test('of the sheets as they are, each date of a rule stands once', () => {
    const sheets = [...seedSheets.values()];
    const shown = flat(changesOf({ ...none, sheets })).flatMap((change) =>
      change.kind === 'begins' ? change.rules.map(({ id }) => id) : [],
    );
    const held = sheets.flatMap(({ rules }) => rules).filter(({ from }) => from !== null && from >= '2024-12-01');
    expect(held.length).toBeGreaterThan(5);
    expect([...shown].sort()).toEqual(held.map(({ id }) => id).sort());
  });
});
