import { beforeAll, beforeEach, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { judgeReadings } from '@/lib/readings/judge-readings';
import { keepEntry } from '@/lib/readings/keep-entry';
import { readEntry } from '@/lib/readings/read-entry';
import { sheetId, sheetInput } from '@/lib/readings/sheet-schema';
import { listSubstanceLimits } from '@/lib/regions/list-substance-limits';
import type { Ctx } from '@/lib/server/ctx';
import { foundSheets } from './founding';

const at = (now: string): Ctx => ({ db, now: new Date(now) });
const today = at('2026-12-01T10:00:00Z');
const ID = sheetId.parse('RRRRRRRRRRRRRRRRRRRRRR');

const FIELDS = {
  region: ['eu', 'dk'],
  use: ['food'],
  form: ['mug'],
  'holds-liquid': ['yes'],
  'depth-mm': ['95'],
  'capacity-ml': ['350'],
  'cooked-in': ['no'],
  'packaging-or-storage': ['no'],
  'readings.pasted': ['A;Pb;0,31;mg/L\nA;Cd;< 0,01;mg/L'],
};
const keep = (fields: Record<string, string[]>, ctx: Ctx = today) => keepEntry(ctx, sheetInput.parse({ id: ID, fields }));

async function read(ctx: Ctx = today) {
  const found = await readEntry(ctx, ID);
  if (!found.ok) throw new Error('The sheet is gone');
  return found.value;
}

beforeAll(foundSheets);
beforeEach(async () => {
  await db('reading_sheets').del();
});

test('ENTRY-8 an entry is kept as it was typed, and the same form sent again takes its place', async () => {
  await keep({ ...FIELDS, 'depth-mm': ['deep'] });
  const refused = await read();
  expect(refused.fields['depth-mm']).toEqual(['deep']);
  expect([refused.input, refused.faults.map(({ field }) => field)]).toEqual([null, ['depth-mm']]);
  await keep(FIELDS);
  expect((await read()).faults).toEqual([]);
  expect(await db('reading_sheets').count({ count: '*' })).toEqual([{ count: 1 }]);
});

test('ENTRY-8 an entry that can be read is held against the limits of every place chosen', async () => {
  await keep(FIELDS);
  const { input } = await read();
  if (input === null) throw new Error('The entry was not understood');
  const judged = await judgeReadings(today, input);
  if (!judged.ok) throw new Error('A place has no sheet');
  expect(judged.value.regions.map(({ code }) => code)).toEqual(['eu', 'dk']);
  const lead = judged.value.regions[0]?.verdicts.find(({ substance, strength }) => substance === 'Pb' && strength === 'must');
  expect(lead).toMatchObject({ part: 'vessel', compared: { value: '0.31', unit: 'mg/L' } });
});

test('ENTRY-9 what the API would refuse is refused here too, beside the field it stands in', async () => {
  await keep({ ...FIELDS, 'volume-vessel': ['0'], hours: ['9999999999'] });
  const { input, faults } = await read();
  expect(input).toBeNull();
  expect(faults.map(({ field, why }) => [field, why])).toEqual([
    ['volume-vessel', 'refused'],
    ['hours', 'refused'],
  ]);
});

test('ENTRY-10 an entry is gone 30 days after it was sent, and goes from the table when another is kept', async () => {
  await keep(FIELDS);
  expect((await readEntry(at('2026-12-31T09:59:00Z'), ID)).ok).toBe(true);
  expect(await readEntry(at('2026-12-31T10:01:00Z'), ID)).toEqual({ ok: false, error: { kind: 'not-found' } });
  const other = sheetInput.parse({ id: 'SSSSSSSSSSSSSSSSSSSSSS', fields: FIELDS });
  await keepEntry(at('2027-01-02T10:00:00Z'), other);
  expect(await db('reading_sheets').select('id')).toEqual([{ id: other.id }]);
});

test('REG-24 the page of a substance is drawn from the editions in use', async () => {
  const { places, above } = await listSubstanceLimits(today, 'Pb');
  expect(places.map(({ code }) => code)).toContain('eu');
  expect(above.map(({ code }) => code)).toContain('dk');
});
