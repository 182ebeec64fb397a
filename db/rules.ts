import type { Knex } from 'knex';
import { homeRow, type Home } from './rows/rule-row';

/** Where a rule stands: its sheet, the newest edition that holds it, and the edition the sheet has in use. Null for no such rule. */
export async function findRuleHome(db: Knex, id: string): Promise<Home | null> {
  const row: unknown = await db('rules as r')
    .join('sheets as s', 's.region', 'r.region')
    .where('r.id', id)
    .orderBy('r.edition_number', 'desc')
    .select('r.region', 'r.edition_number', 's.edition_number as in_use')
    .first();
  return row === undefined ? null : homeRow.parse(row);
}

/** Ids of every rule in the editions in use, for the list of addresses. */
export async function listRuleIds(db: Knex): Promise<readonly string[]> {
  const rows: unknown[] = await db('rules as r')
    .join('sheets as s', (join) => join.on('s.region', 'r.region').andOn('s.edition_number', 'r.edition_number'))
    .orderBy('r.id')
    .limit(50_000)
    .pluck('r.id');
  return rows.map(String);
}
