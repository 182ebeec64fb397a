import type { Knex } from 'knex';
import { editionHeadRow, type EditionHead } from './rows/edition-row';

/** Editions of all sheets that came into use at that instant or later, the newest first. */
export async function listEditionsSince(db: Knex, since: Date, limit: number): Promise<readonly EditionHead[]> {
  const rows: unknown[] = await db('editions')
    .where('in_use_from', '>=', since)
    .orderBy('in_use_from', 'desc')
    .orderBy(['region', 'number'])
    .limit(limit)
    .select('region', 'number', 'hash', 'origin', 'summary', 'in_use_from');
  return rows.map((row) => editionHeadRow.parse(row));
}
