import type { Knex } from 'knex';
import { z } from 'zod';

export type KeptForm = { readonly id: string; readonly owner: Buffer; readonly sealed: Buffer; readonly at: Date };

const keptRow = z.object({ sealed: z.instanceof(Buffer) });

/** Keeps what somebody typed under the key of its form; the same form refused again takes the place of its last try. */
export async function putKeptForm(db: Knex, { id, owner, sealed, at }: KeptForm): Promise<void> {
  await db('kept_forms').insert({ id, owner, sealed, made_at: at }).onConflict(['owner', 'id']).merge(['sealed', 'made_at']);
}

/** What was kept, for the one who typed it, if that was after `since`. */
export async function findKeptForm(db: Knex, id: string, owner: Buffer, since: Date): Promise<Buffer | null> {
  const row: unknown = await db('kept_forms').where({ id, owner }).where('made_at', '>', since).select('sealed').first();
  return row === undefined ? null : keptRow.parse(row).sealed;
}

/** Deletes up to `most` forms kept before `since`. */
export async function deleteOldKeptForms(db: Knex, since: Date, most: number): Promise<number> {
  return db('kept_forms').where('made_at', '<=', since).limit(most).del();
}
