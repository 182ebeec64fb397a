import type { Knex } from 'knex';
import { homeRow, type Home } from './rows/rule-row';

/** Where a term stands: its sheet, the newest edition that holds it, and the edition the sheet has in use. Null for no such term. */
export async function findTermHome(db: Knex, id: string): Promise<Home | null> {
  const row: unknown = await db('terms as t')
    .join('sheets as s', 's.region', 't.region')
    .where('t.id', id)
    .orderBy('t.edition_number', 'desc')
    .select('t.region', 't.edition_number', 's.edition_number as in_use')
    .first();
  return row === undefined ? null : homeRow.parse(row);
}

/** Ids of every term in the editions in use, for the list of addresses. */
export async function listTermIds(db: Knex): Promise<readonly string[]> {
  const rows: unknown[] = await db('terms as t')
    .join('sheets as s', (join) => join.on('s.region', 't.region').andOn('s.edition_number', 't.edition_number'))
    .orderBy('t.id')
    .limit(50_000)
    .pluck('t.id');
  return rows.map(String);
}
