import type { Knex } from 'knex';

/** The database's own clock: web processes and workers on several machines agree on it. */
export const clock = (db: Knex): Knex.Raw => db.raw('UTC_TIMESTAMP(3)');

/** That clock's instant `ms` from now, or ago when below zero. */
export const clockPlus = (db: Knex, ms: number): Knex.Raw =>
  db.raw('TIMESTAMPADD(MICROSECOND, ?, UTC_TIMESTAMP(3))', [Math.round(ms) * 1000]);
