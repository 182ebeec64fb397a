import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`ALTER TABLE doubts
    ADD COLUMN IF NOT EXISTS elsewhere VARCHAR(1000) NULL AFTER words,
    ADD COLUMN IF NOT EXISTS link VARCHAR(500) NULL AFTER elsewhere,
    ADD COLUMN IF NOT EXISTS aside_why VARCHAR(500) NULL AFTER answer,
    ADD COLUMN IF NOT EXISTS trace BINARY(32) NULL,
    ADD UNIQUE KEY IF NOT EXISTS doubts_by_trace (trace),
    ADD KEY IF NOT EXISTS doubts_by_answerer (answered_by)`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`ALTER TABLE doubts
    DROP KEY IF EXISTS doubts_by_answerer,
    DROP KEY IF EXISTS doubts_by_trace,
    DROP COLUMN IF EXISTS trace,
    DROP COLUMN IF EXISTS aside_why,
    DROP COLUMN IF EXISTS link,
    DROP COLUMN IF EXISTS elsewhere`);
}
