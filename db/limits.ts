import type { Knex } from 'knex';

/** Deletes up to `most` counts whose time was over before `since`. Answers with how many went. */
export async function deleteOldLimits(db: Knex, since: Date, most: number): Promise<number> {
  return db('limits').where('expire', '<', since.getTime()).limit(most).del();
}
