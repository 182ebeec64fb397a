import type { Knex } from 'knex';
import { canonicalJson } from '@/lib/kernel/canonical-json';
import type { SheetFields, SheetId } from '@/lib/readings/domain/sheet-id';
import { readingSheetRow, type ReadingSheet } from './rows/reading-sheet-row';
import type { Trx } from './transaction';

export type NewSheet = { readonly id: SheetId; readonly fields: SheetFields; readonly at: Date };

/** Keeps an entry at its address. The same form sent again, mended or not, takes the place of what it sent before. */
export async function putReadingSheet(trx: Trx, { id, fields, at }: NewSheet): Promise<void> {
  await trx('reading_sheets')
    .insert({ id, entry: canonicalJson(fields), touched_at: at })
    .onConflict('id')
    .merge();
}

/** The sheet, or null when there is none or it was sent before `since`. */
export async function findReadingSheet(db: Knex, id: SheetId, since: Date): Promise<ReadingSheet | null> {
  const row: unknown = await db('reading_sheets')
    .where({ id })
    .where('touched_at', '>=', since)
    .select('id', 'entry', 'touched_at')
    .first();
  return row === undefined ? null : readingSheetRow.parse(row);
}

/** Deletes up to `most` sheets sent before `since`. Answers with how many went. */
export async function deleteOldReadingSheets(db: Knex, since: Date, most: number): Promise<number> {
  return db('reading_sheets').where('touched_at', '<', since).limit(most).del();
}
