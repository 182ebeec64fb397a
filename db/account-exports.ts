import type { Knex } from 'knex';
import { z } from 'zod';
import type { AccountId } from '@/lib/access/domain/actor';
import type { Trx } from './transaction';

const archiveRow = z
  .object({ archive: z.instanceof(Buffer), made_at: z.date() })
  .transform((row) => ({ archive: row.archive, madeAt: row.made_at }));
export type KeptArchive = z.output<typeof archiveRow>;

export type NewArchive = { readonly id: string; readonly accountId: AccountId; readonly archive: Buffer; readonly at: Date };

/** Keeps an archive under the id of the job that made it; a job run again makes it anew. */
export async function putArchive(db: Knex, { id, accountId, archive, at }: NewArchive): Promise<void> {
  await db('account_exports').insert({ id, account_id: accountId, archive, made_at: at }).onConflict('id').merge(['archive', 'made_at']);
}

/** The archive, if it is this account's own and was made after `since`. */
export async function findArchive(db: Knex, id: string, accountId: AccountId, since: Date): Promise<KeptArchive | null> {
  const row: unknown = await db('account_exports')
    .where({ id, account_id: accountId })
    .where('made_at', '>', since)
    .select('archive', 'made_at')
    .first();
  return row === undefined ? null : archiveRow.parse(row);
}

/** Deletes up to `most` archives made before `since`. */
export async function deleteOldArchives(db: Knex, since: Date, most: number): Promise<number> {
  return db('account_exports').where('made_at', '<=', since).limit(most).del();
}

export async function deleteArchivesOf(trx: Trx, accountId: AccountId): Promise<void> {
  await trx('account_exports').where({ account_id: accountId }).del();
}
