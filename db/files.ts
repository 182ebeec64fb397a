import type { Knex } from 'knex';
import type { AccountId } from '@/lib/access/domain/actor';
import type { FileId, KeptFile, Sent } from '@/lib/files/domain/kept-file';
import { fileRow, sentRow } from './rows/file-row';
import type { Trx } from './transaction';

/** Where a sheet's proposal can still come into use, or be taken up again. */
const CLOSED_AMENDMENTS = ['in-use'] as const;

/** Puts in a file whose object is about to be put into the store. */
export async function insertComingFile(trx: Trx, file: Omit<KeptFile, 'state'>): Promise<void> {
  const { id, storeKey, sha256, type, bytes, name, ownerId, purpose, madeAt } = file;
  const row = { id, store_key: storeKey, sha256, type, bytes, name, owner_id: ownerId, purpose, state: 'coming', made_at: madeAt };
  await trx('files').insert(row);
}

/** The object is there. False when the file was given up meanwhile. */
export async function markFileReady(trx: Trx, id: FileId): Promise<boolean> {
  return (await trx('files').where({ id, state: 'coming' }).update({ state: 'ready' })) === 1;
}

/** Gives up a file whose object never came, or came for nothing. False when it is in use after all. */
export async function giveUpComingFile(db: Knex, id: FileId): Promise<boolean> {
  return (await db('files').where({ id, state: 'coming' }).update({ state: 'gone' })) === 1;
}

/** Gives up what has been coming since before `before`: whoever sent it has long had an answer. */
export async function giveUpComingFiles(db: Knex, before: Date): Promise<number> {
  return db('files').where({ state: 'coming' }).where('made_at', '<', before).update({ state: 'gone' });
}

/** Gives up a file that nobody owns, unless it is cited. */
export async function giveUpOwnerlessFile(db: Knex, id: FileId): Promise<boolean> {
  return (await db('files').where({ id, state: 'ready', owner_id: null }).update({ state: 'gone' })) === 1;
}

/** Takes away the row of a file whose object is gone. */
export async function deleteGoneFile(db: Knex, id: FileId): Promise<void> {
  await db('files').where({ id, state: 'gone' }).del();
}

/** Files that are given up and whose objects are still to be removed. */
export async function listGoneFiles(db: Knex, most: number): Promise<readonly KeptFile[]> {
  const rows: unknown[] = await db('files').where({ state: 'gone' }).orderBy('id').limit(most).select('*');
  return rows.map((row) => fileRow.parse(row));
}

/** Files that nobody owns any more, in the order of their ids, after `after`. */
export async function listOwnerlessFiles(db: Knex, after: string, most: number): Promise<readonly KeptFile[]> {
  const rows: unknown[] = await db('files')
    .where({ state: 'ready', owner_id: null })
    .where('id', '>', after)
    .orderBy('id')
    .limit(most)
    .select('*');
  return rows.map((row) => fileRow.parse(row));
}

/** A file that is there, or null. */
export async function findFile(db: Knex, id: FileId): Promise<KeptFile | null> {
  const row: unknown = await db('files').where({ id, state: 'ready' }).first();
  return row === undefined ? null : fileRow.parse(row);
}

/** A file with that content, the one kept first; null when there is none. `sha256`: 64 hexadecimal digits. */
export async function findFileBySha(db: Knex, sha256: string): Promise<KeptFile | null> {
  const row: unknown = await db('files').where({ sha256, state: 'ready' }).orderBy('id').first();
  return row === undefined ? null : fileRow.parse(row);
}

/** The files of one account, the oldest first. */
export async function listFilesOf(db: Knex, ownerId: AccountId, most: number): Promise<readonly KeptFile[]> {
  const rows: unknown[] = await db('files').where({ owner_id: ownerId, state: 'ready' }).orderBy('id').limit(most).select('*');
  return rows.map((row) => fileRow.parse(row));
}

/** How much of what an account has sent since an instant is kept, or about to be. */
export async function countSentSince(db: Knex, ownerId: AccountId, since: Date): Promise<Sent> {
  const row: unknown = await db('files')
    .where({ owner_id: ownerId })
    .whereNot({ state: 'gone' })
    .where('made_at', '>', since)
    .count({ files: '*' })
    .select({ bytes: db.raw('COALESCE(SUM(bytes), 0)') })
    .first();
  return sentRow.parse(row);
}

/** Whether an edition in use names a file's content: a source of its sheet carries that fingerprint. */
export async function isCitedInUse(db: Knex, sha256: string): Promise<boolean> {
  const row: unknown = await db('editions as e')
    .join('sheets as s', (join) => join.on('s.region', 'e.region').andOn('s.edition_number', 'e.number'))
    .where('e.document', 'like', naming(sha256))
    .select('e.region')
    .first();
  return row !== undefined;
}

/** Whether any edition there ever was, an amendment that can still come into use, or an entry of one names it. */
export async function isCitedAnywhere(db: Knex, sha256: string): Promise<boolean> {
  const asked = [
    db('editions').where('document', 'like', naming(sha256)).select({ found: 'region' }),
    db('amendments').whereNotIn('state', CLOSED_AMENDMENTS).where('document', 'like', naming(sha256)).select({ found: 'region' }),
    db('amendment_entries').where('entered', 'like', naming(sha256)).select({ found: 'item' }),
  ];
  for (const query of asked) {
    const row: unknown = await query.first();
    if (row !== undefined) return true;
  }
  return false;
}

// A hash is of digits and letters alone, so that nothing in it is a sign of the pattern; entries hold it among other words.
const naming = (sha256: string): string => `%${sha256}%`;

/** The files of a person who is forgotten belong to nobody. */
export async function letGoOfFiles(trx: Trx, ownerId: AccountId): Promise<void> {
  await trx('files').where({ owner_id: ownerId }).update({ owner_id: null, name: 'page-seen' });
}
