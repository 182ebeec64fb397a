import type { Knex } from 'knex';

export const config = { transaction: false };

/** An edition can also come of withdrawing the one after it. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`ALTER TABLE editions
    DROP CONSTRAINT IF EXISTS editions_origin_known,
    ADD CONSTRAINT editions_origin_known CHECK (origin IN ('seed', 'amendment', 'withdrawal'))`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`ALTER TABLE editions
    DROP CONSTRAINT IF EXISTS editions_origin_known,
    ADD CONSTRAINT editions_origin_known CHECK (origin IN ('seed', 'amendment'))`);
}
