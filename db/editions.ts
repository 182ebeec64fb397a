import type { Knex } from 'knex';
import { canonicalJson } from '@/lib/kernel/canonical-json';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { fingerprint } from './fingerprint';
import { editionHeadRow, editionRow, sheetLockRow, type Edition, type EditionHead } from './rows/edition-row';
import { insertProjection } from './sheet-projection';
import type { Trx } from './transaction';

const HEAD = ['region', 'number', 'hash', 'origin', 'summary', 'in_use_from'] as const;

/** Every edition of a sheet, the first one first. */
export async function listEditions(db: Knex, region: string): Promise<readonly EditionHead[]> {
  const rows: unknown[] = await db('editions')
    .where({ region })
    .orderBy('number')
    .limit(10_000)
    .select(...HEAD);
  return rows.map((row) => editionHeadRow.parse(row));
}

/** For each of these regions that has a sheet: the edition in use just before that instant, or its first one when it is younger. */
export async function listEditionsInUse(db: Knex, regions: readonly string[], before: Date): Promise<readonly EditionHead[]> {
  const rows: unknown[] = await db('editions')
    .whereIn('region', regions)
    .orderBy('number')
    .limit(100_000)
    .select(...HEAD);
  const found = new Map<string, EditionHead>();
  for (const row of rows) {
    const edition = editionHeadRow.parse(row);
    if (!found.has(edition.region) || edition.inUseFrom < before) found.set(edition.region, edition);
  }
  return [...found.values()];
}

/** The edition with its document, or null. */
export async function findEdition(db: Knex, region: string, number: number): Promise<Edition | null> {
  const row: unknown = await db('editions')
    .where({ region, number })
    .select(...HEAD, 'document')
    .first();
  return row === undefined ? null : editionRow.parse(row);
}

export type NewEdition = {
  readonly sheet: Sheet;
  readonly origin: 'seed' | 'amendment' | 'withdrawal';
  readonly summary: string;
  readonly at: Date;
};

/** Locks the sheet's row, so that editions are numbered one after the other. Null when the region has no sheet yet. */
export async function lockSheet(trx: Trx, region: string): Promise<number | null> {
  const row: unknown = await trx('sheets').where({ region }).select('region', 'edition_number').forUpdate().first();
  return row === undefined ? null : sheetLockRow.parse(row).edition_number;
}

/** Which edition of each sheet is in use. */
export type WorldEditions = ReadonlyMap<string, number>;

/**
 * Locks every sheet there is, in the order of their codes, so that nothing else comes into use meanwhile: a proposal is judged with
 * the sheets above and below it. Before any plain read of the transaction, which would freeze what it sees.
 */
export async function lockWorld(trx: Trx): Promise<WorldEditions> {
  const rows: unknown[] = await trx('sheets').orderBy('region').select('region', 'edition_number').forUpdate();
  return new Map(rows.map((row) => sheetLockRow.parse(row)).map(({ region, edition_number }) => [region, edition_number]));
}

/** The number of the edition in use; null for a place without a sheet. */
export async function findNumberInUse(db: Knex, region: string): Promise<number | null> {
  const row: unknown = await db('sheets').where({ region }).select('region', 'edition_number').first();
  return row === undefined ? null : sheetLockRow.parse(row).edition_number;
}

/** The number of the edition in use of every sheet. */
export async function listNumbersInUse(db: Knex): Promise<WorldEditions> {
  const rows: unknown[] = await db('sheets').orderBy('region').limit(10_000).select('region', 'edition_number');
  return new Map(rows.map((row) => sheetLockRow.parse(row)).map(({ region, edition_number }) => [region, edition_number]));
}

/** Codes of the sheets whose edition in use came of people: a seed leaves them alone. */
export async function listAmended(db: Knex): Promise<ReadonlySet<string>> {
  const rows: unknown[] = await db('sheets as s')
    .join('editions as e', (on) => void on.on('e.region', 's.region').andOn('e.number', 's.edition_number'))
    .whereNot('e.origin', 'seed')
    .limit(10_000)
    .select('s.region', 's.edition_number');
  return new Set(rows.map((row) => sheetLockRow.parse(row).region));
}

/** Puts a new edition in use: its document, the rows drawn from it, and the sheet's number. The caller holds the lock. */
export async function publishEdition(trx: Trx, number: number, { sheet, origin, summary, at }: NewEdition): Promise<string> {
  const document = canonicalJson(sheet);
  const hash = fingerprint(document);
  if (number === 1) await trx('sheets').insert({ region: sheet.code, edition_number: 1 });
  await trx('editions').insert({ region: sheet.code, number, hash, origin, summary, in_use_from: at, document });
  await insertProjection(trx, number, sheet);
  if (number > 1) await trx('sheets').where({ region: sheet.code }).update({ edition_number: number });
  return hash;
}

/** The code of some region that has a sheet; null before the first seed. */
export async function findAnySheet(db: Knex): Promise<string | null> {
  const row: unknown = await db('sheets').select('region', 'edition_number').timeout(2_000).first();
  return row === undefined ? null : sheetLockRow.parse(row).region;
}
