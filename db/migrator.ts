import { setTimeout as wait } from 'node:timers/promises';
import type { Knex } from 'knex';
import { z } from 'zod';

const lockRow = z.object({ locked: z.coerce.boolean() }).optional();
const othersRow = z.object({ others: z.coerce.number() });
const latestAnswer = z.tuple([z.number(), z.array(z.string())]);
const listAnswer = z.tuple([z.array(z.unknown()), z.array(z.object({ file: z.string() }))]);

/** Brings the tables up to date and answers with the names of the steps taken. */
export async function migrate(owner: Knex, patienceMs = 120_000): Promise<readonly string[]> {
  await clearStaleLock(owner, patienceMs);
  const answer: unknown = await owner.migrate.latest();
  return latestAnswer.parse(answer)[1];
}

/** Steps not taken yet. */
export async function stepsToTake(owner: Knex): Promise<readonly string[]> {
  const answer: unknown = await owner.migrate.list();
  return listAnswer.parse(answer)[1].map(({ file }) => file);
}

// A migrator that was killed leaves its lock, and the server may still be at work on its last statement. Only migrators use the
// owner's account, so the lock is stale when nobody else is connected by it. Knex asks again by itself should we be wrong.
async function clearStaleLock(owner: Knex, patienceMs: number): Promise<void> {
  const until = Date.now() + patienceMs;
  while (await isLocked(owner)) {
    if ((await othersConnected(owner)) === 0) {
      await owner.migrate.forceFreeMigrationsLock();
      return;
    }
    if (Date.now() > until) throw new Error('Another migration is at work on this database. Please try again when it has ended.');
    await wait(250);
  }
}

async function isLocked(owner: Knex): Promise<boolean> {
  if (!(await owner.schema.hasTable('knex_migrations_lock'))) return false;
  const row: unknown = await owner('knex_migrations_lock').select({ locked: 'is_locked' }).first();
  return lockRow.parse(row)?.locked ?? false;
}

async function othersConnected(owner: Knex): Promise<number> {
  const row: unknown = await owner('information_schema.processlist')
    .whereRaw("user = substring_index(current_user(), '@', 1) and db = database() and id <> connection_id()")
    .count({ others: '*' })
    .first();
  return othersRow.parse(row).others;
}
