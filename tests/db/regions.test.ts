import knex, { type Knex } from 'knex';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { publishEdition } from '@/db/editions';
import { connectionTo, knexSettings } from '@/db/knex-settings';
import { inTransaction } from '@/db/transaction';
import { parseSheetFile } from '@/content/seed/sheet-file';
import { buildChecklist } from '@/lib/checks/build-checklist';
import { ok } from '@/lib/kernel/result';
import { listEditions } from '@/lib/regions/list-editions';
import { readRegionSheet } from '@/lib/regions/read-region-sheet';
import { readRule } from '@/lib/regions/read-rule';
import type { Sheet } from '@/lib/regions/domain/sheet';
import type { Ctx } from '@/lib/server/ctx';
import { aDate, seedSheets } from '../builders/seed-sheets';
import { foundSheets } from './founding';

const ctx = (now = new Date()): Ctx => ({ db, now });
let owner: Knex;

beforeAll(async () => {
  owner = knex({ ...knexSettings({ most: 1 }), connection: connectionTo(process.env['DATABASE_OWNER_URL'] ?? '') });
  await foundSheets();
});
afterAll(() => owner.destroy());

const editionsOf = async (code: string) => {
  const editions = await listEditions(ctx(), code);
  return editions.ok ? editions.value : [];
};

const jp = (): Sheet => {
  const sheet = seedSheets.get('jp');
  if (sheet === undefined) throw new Error('no sheet of Japan');
  return sheet;
};

test('REG-19 a seed put in again changes nothing, and an edition of its own follows when it reads otherwise', async () => {
  await foundSheets();
  expect(await editionsOf('dk')).toHaveLength(1);
  await owner('editions')
    .where({ region: 'us', number: 1 })
    .update({ hash: 'f'.repeat(64) });
  await foundSheets();
  expect((await editionsOf('us')).map(({ number, summary }) => [number, summary])).toEqual([
    [1, 'Founding sheet'],
    [2, 'Founding sheet, read again'],
  ]);
});

test('REG-19 a sheet that people amended is left alone by later seeds', async () => {
  const at = new Date();
  await inTransaction(owner, async (trx) => {
    await publishEdition(trx, 2, { sheet: { ...jp(), text: 'Amended.' }, origin: 'amendment', summary: 'Amended', at });
    return ok(null);
  });
  await foundSheets();
  expect((await editionsOf('jp')).map(({ summary }) => summary)).toEqual(['Founding sheet', 'Amended']);
});

test('REG-20 a day is read in the edition in use at its end, and a day before the first edition in the first one', async () => {
  const before = await readRegionSheet(ctx(), { code: 'jp', on: aDate('2001-01-01') });
  const today = await readRegionSheet(ctx(), { code: 'jp' });
  expect(before).toMatchObject({ ok: true, value: { edition: 1, on: '2001-01-01' } });
  expect(today).toMatchObject({ ok: true, value: { edition: 2, text: 'Amended.' } });
  const checklist = await buildChecklist(ctx(), { regions: ['jp'], on: aDate('2001-01-01'), answers: {}, declined: [], keep: false });
  expect(checklist).toMatchObject({ ok: true, value: { regions: [{ editions: { jp: 1 } }] } });
});

test('REG-20 a rule that an edition dropped is still read, as withdrawn', async () => {
  await inTransaction(owner, async (trx) => {
    const sheet = { ...jp(), rules: jp().rules.filter(({ id }) => id !== 'jp-origin') };
    await publishEdition(trx, 3, { sheet, origin: 'amendment', summary: 'Without a rule', at: new Date() });
    return ok(null);
  });
  expect(await readRule(ctx(), 'jp-origin')).toMatchObject({ ok: true, value: { withdrawn: true, edition: 2 } });
  expect(await readRule(ctx(), 'jp-test')).toMatchObject({ ok: true, value: { withdrawn: false, edition: 3 } });
  expect(await readRule(ctx(), 'jp-none')).toEqual({ ok: false, error: { kind: 'not-found' } });
});

test('REG-21 a seed file with faults is refused with file, rule and field', () => {
  const rule = { ...jp().rules[0], strength: 'must', standing: 'guidance', colour: 'red' };
  const refused = parseSheetFile('jp.json', JSON.stringify({ ...jp(), rules: [rule] }));
  expect(refused.ok ? [] : refused.error).toEqual(
    expect.arrayContaining([expect.stringMatching(/^jp\.json: rule "jp-[a-z-]+", field rules\/0/)]),
  );
  expect(parseSheetFile('zz.json', '{')).toMatchObject({ ok: false, error: [expect.stringMatching(/^zz\.json: this is not JSON/)] });
});

test('REG-22 the application can neither change nor remove an edition, nor change any table', async () => {
  await expect(db('editions').where({ region: 'dk' }).update({ summary: 'x' })).rejects.toMatchObject({ errno: 1142 });
  await expect(db('editions').where({ region: 'dk' }).del()).rejects.toMatchObject({ errno: 1142 });
  await expect(db.raw('DROP TABLE checks')).rejects.toMatchObject({ errno: 1142 });
  await expect(db.raw('CREATE TABLE extra (id INT PRIMARY KEY)')).rejects.toMatchObject({ errno: 1142 });
});

test('REG-23 Denmark is read without the European layer before it joined', async () => {
  const lineOn = async (on: string) => {
    const sheet = await readRegionSheet(ctx(), { code: 'dk', on: aDate(on) });
    return sheet.ok ? sheet.value.line : null;
  };
  // Treaty of accession: Denmark joined on 1 January 1973.
  expect(await lineOn('1972-12-31')).toEqual(['dk']);
  expect(await lineOn('1973-01-01')).toEqual(['eu', 'dk']);
});

test('REG-22 every table has a primary key and compares codes, tokens and ids by their bytes', async () => {
  const tables: unknown[] = await owner('information_schema.tables').whereRaw('table_schema = database()').pluck('table_name');
  const keyed: unknown[] = await owner('information_schema.table_constraints')
    .whereRaw("table_schema = database() AND constraint_type = 'PRIMARY KEY'")
    .pluck('table_name');
  expect(tables.filter((table) => !keyed.includes(table))).toEqual(['knex_migrations_lock'].filter((table) => !keyed.includes(table)));
  const folded: unknown[] = await owner('information_schema.columns')
    .whereRaw(
      "table_schema = database() AND table_name NOT LIKE 'knex%' AND column_name IN ('id', 'code', 'region', 'hash', 'rule', 'parent') AND collation_name NOT LIKE '%_bin'",
    )
    .pluck('column_name');
  expect(folded).toEqual([]);
});
