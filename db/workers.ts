import type { Knex } from 'knex';
import { clock, clockPlus } from './database-clock';

/** Notes that a worker is alive. */
export async function beatWorker(db: Knex, id: string): Promise<void> {
  await db('workers')
    .insert({ id, began_at: clock(db), seen_at: clock(db) })
    .onConflict('id')
    .merge({ seen_at: clock(db) });
}

/** Takes a worker that ends off the list. */
export async function removeWorker(db: Knex, id: string): Promise<void> {
  await db('workers').where({ id }).del();
}

/** Whether any worker was seen within so many milliseconds. */
export async function isAnyWorkerSeen(db: Knex, withinMs: number): Promise<boolean> {
  const seen = await db('workers').where('seen_at', '>=', clockPlus(db, -withinMs)).limit(1).pluck('id');
  return seen.length > 0;
}

/** Deletes workers not seen for so many milliseconds: they were killed. Answers with how many went. */
export async function deleteLostWorkers(db: Knex, unseenForMs: number): Promise<number> {
  return db('workers').where('seen_at', '<', clockPlus(db, -unseenForMs)).del();
}
