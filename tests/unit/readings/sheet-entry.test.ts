import { describe, expect, test } from 'vitest';
import { readSheetEntry } from '@/lib/readings/domain/sheet-entry';
import { shownFaults } from '@/lib/readings/domain/sheet-faults';
import type { SheetFields } from '@/lib/readings/domain/sheet-id';
import { START_FIELDS } from '@/lib/readings/domain/start-fields';
import { rowCount } from '@/lib/readings/domain/typed-rows';

const row = (list: string, number: number, cells: Record<string, string>): SheetFields =>
  Object.fromEntries(Object.entries(cells).map(([column, text]) => [`${list}.${column}.${String(number)}`, [text]]));
const LEAD = row('readings', 1, { specimen: 'A', part: 'vessel', substance: 'Pb', value: '0,31', unit: 'mg/L' });
const GOOD: SheetFields = { region: ['eu', 'us'], use: ['food'], ...LEAD };
const faultsOf = (fields: SheetFields) => readSheetEntry(fields).faults.map(({ field, why }) => [field, why]);

describe('ENTRY-4 a form of readings is read whole, and what is empty is not known', () => {
  test('typed and pasted rows stand together, further pieces apart', () => {
    const entry = readSheetEntry({
      ...GOOD,
      'readings.pasted': ['B;Pb;< 0,01;mg/L'],
      ...row('further', 1, { specimen: 'C', substance: 'Pb', value: '0.4', unit: 'ug/mL' }),
    });
    expect(entry.faults).toEqual([]);
    expect(entry.rows.readings).toMatchObject([
      { specimen: 'A', value: '0.31', below: false },
      { specimen: 'B', value: '0.01', below: true },
    ]);
    expect(entry.rows.further).toMatchObject([{ specimen: 'C', unit: 'ug/mL' }]);
    expect(entry.answers).toEqual({ use: 'food' });
    expect([entry.conditions, entry.extracts, entry.on]).toEqual([{}, [], null]);
  });

  test('"I don\'t know yet" and an empty field both leave the question open', () => {
    expect(readSheetEntry({ ...GOOD, 'holds-liquid': ['unknown'], 'depth-mm': [''], 'capacity-ml.unknown': ['on'] }).answers).toEqual({
      use: 'food',
    });
  });

  test('what the page starts with is no reading yet', () => {
    expect(faultsOf({ ...START_FIELDS, region: ['eu'] })).toEqual([['readings.value.1', 'no-readings']]);
  });

  test('volumes, areas and how the lab tested', () => {
    const entry = readSheetEntry({
      ...GOOD,
      'volume-vessel': ['320'],
      'area-lid': ['12,5'],
      temperature: ['22'],
      hours: ['24'],
      dark: ['no'],
    });
    expect(entry.extracts).toEqual([
      { part: 'vessel', volumeMl: 320, areaCm2: null },
      { part: 'lid', volumeMl: null, areaCm2: 12.5 },
    ]);
    expect(entry.conditions).toEqual({ temperatureC: 22, hours: 24, dark: false });
  });
});

describe('ENTRY-5 what cannot be read is named where it stands', () => {
  test.each([
    ['no place', { ...GOOD, region: [] }, ['region', 'none-chosen']],
    ['no such day', { ...GOOD, on: ['2026-02-30'] }, ['on', 'bad-day']],
    ['a depth in words', { ...GOOD, 'depth-mm': ['deep'] }, ['depth-mm', 'not-a-number']],
    ['a depth and "not known"', { ...GOOD, 'depth-mm': ['62'], 'depth-mm.unknown': ['on'] }, ['depth-mm', 'both-said']],
    ['thousands or decimals', { ...GOOD, 'readings.value.1': ['1.234'] }, ['readings.value.1', 'thousands-unclear']],
    ['no unit', { ...GOOD, 'readings.unit.1': [''] }, ['readings.unit.1', 'no-unit']],
    ['below detection without a figure', { ...GOOD, ...row('readings', 2, { specimen: 'A', substance: 'Cd', unit: 'mg/L', below: 'yes' }) }, ['readings.value.2', 'no-value']], // prettier-ignore
    ['the same figure twice', { ...GOOD, ...row('readings', 2, { specimen: 'A', substance: 'Pb', value: '1', unit: 'mg/L' }) }, ['readings.specimen.2', 'twice']], // prettier-ignore
    ['pasted what is typed', { ...GOOD, 'readings.pasted': ['A;lead;1;mg/L'] }, ['readings.pasted', 'twice']],
    ['a pasted remark', { ...GOOD, 'further.pasted': ['see page 2'] }, ['further.pasted', 'columns']],
    ['a volume in words', { ...GOOD, 'volume-rim': ['some'] }, ['volume-rim', 'not-a-number']],
    ['half a point', { ...GOOD, 'profile.radius.2': ['40'] }, ['profile.height.2', 'half-point']],
    ['measures of no profile', { ...GOOD, 'profile.use': ['on'] }, ['profile.radius.1', 'no-profile']],
  ] as const)('%s', (_, fields, fault) => {
    expect(faultsOf(fields)).toEqual([fault]);
  });

  test('who asks for a drawing, a preview or more rows is told of that alone', () => {
    const { faults } = readSheetEntry({ 'profile.radius.2': ['40'], 'readings.pasted': ['see page 2'] });
    expect(shownFaults(faults, '').map(({ why }) => why)).toEqual(['none-chosen', 'half-point', 'columns']);
    expect(shownFaults(faults, 'draw').map(({ why }) => why)).toEqual(['half-point']);
    expect(shownFaults(faults, 'preview').map(({ why }) => why)).toEqual(['columns']);
    expect(shownFaults(faults, 'more-readings')).toEqual([]);
  });

  test('more rows are six more, up to a bound, whatever the count in the form says', () => {
    expect(rowCount({}, 'readings')).toBe(6);
    expect(rowCount({ act: ['more-readings'], 'readings.rows': ['6'] }, 'readings')).toBe(12);
    expect(rowCount({ act: ['more-further'], 'readings.rows': ['12'] }, 'readings')).toBe(12);
    expect(rowCount({ act: ['more-readings'], 'readings.rows': ['60'] }, 'readings')).toBe(60);
    expect(rowCount({ 'readings.rows': ['1e9'] }, 'readings')).toBe(6);
  });
});

describe('ENTRY-7 measures of a profile are shown before they are used', () => {
  // A cylinder: radius 40 mm, 100 mm deep; it holds 160π mL. By the formula of the cylinder.
  const cylinder: SheetFields = {
    'profile.radius.1': ['0'],
    'profile.height.1': ['10'],
    'profile.radius.2': ['40'],
    'profile.height.2': ['10'],
    'profile.radius.3': ['40'],
    'profile.height.3': ['110'],
  };

  test('drawn, they answer nothing', () => {
    const entry = readSheetEntry({ ...GOOD, ...cylinder, 'depth-mm': ['62'] });
    expect(entry.profile.measured).toEqual({ 'depth-mm': 100, 'capacity-ml': Number((160 * Math.PI).toFixed(6)) });
    expect(entry.answers).toEqual({ use: 'food', 'depth-mm': 62 });
  });

  test('used, they take the place of what was typed', () => {
    const entry = readSheetEntry({ ...GOOD, ...cylinder, 'depth-mm': ['62'], 'profile.use': ['on'] });
    expect(entry.answers).toMatchObject({ 'depth-mm': 100, 'capacity-ml': Number((160 * Math.PI).toFixed(6)) });
  });

  test('where it overflows below its rim, the depth stays as it was typed', () => {
    const entry = readSheetEntry({ ...GOOD, ...cylinder, 'profile.spill': ['5'], 'profile.use': ['on'] });
    expect(entry.answers).toEqual({ use: 'food', 'capacity-ml': Number((152 * Math.PI).toFixed(6)) });
  });

  test('a line that is no vessel says which point to mend', () => {
    const back = { ...cylinder, 'profile.radius.5': ['30'], 'profile.height.5': ['60'] };
    const { faults } = readSheetEntry({ ...GOOD, ...back });
    expect(faults).toEqual([{ field: 'profile.radius.3', place: 'profile', why: 'rim-not-highest', row: 3 }]);
  });
});
