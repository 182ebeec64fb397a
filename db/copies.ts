import type { Knex } from 'knex';
import { copyRow } from './rows/copy-row';
import type { Trx } from './transaction';

/** Keeps a dated copy; one that is kept already stays as it is. */
export async function insertCopy(
  trx: Trx,
  copy: { readonly hash: string; readonly document: string; readonly madeAt: Date },
): Promise<void> {
  await trx('copies').insert({ hash: copy.hash, document: copy.document, made_at: copy.madeAt }).onConflict('hash').ignore();
}

/** The canonical text of a dated copy, or null. */
export async function findCopy(db: Knex, hash: string): Promise<{ readonly text: string; readonly madeAt: Date } | null> {
  const row: unknown = await db('copies').where({ hash }).select('document', 'made_at').first();
  return row === undefined ? null : copyRow.parse(row);
}
