import type { Knex } from 'knex';
import { clock, clockPlus } from './database-clock';

/**
 * Claims a round that is walked every so often: true for the one worker whose statement changed the row. A round that was cut short is
 * walked again when it is due next, so it has to bear that.
 */
export async function claimRound(db: Knex, name: string, everyMs: number): Promise<boolean> {
  await db('rounds')
    .insert({ name, due_at: clock(db) })
    .onConflict('name')
    .ignore();
  const changed = await db('rounds')
    .where({ name })
    .where('due_at', '<=', clock(db))
    .update({ due_at: clockPlus(db, everyMs), walked_at: clock(db) });
  return changed === 1;
}
