import type { Knex } from 'knex';

export const config = { transaction: false };

/** The answer of the studio note a check was begun from. It fills in a field and counts for nothing until the maker sends it. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`ALTER TABLE checks ADD COLUMN IF NOT EXISTS
    from_note LONGTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NULL CHECK (from_note IS NULL OR JSON_VALID(from_note)) AFTER entry`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('ALTER TABLE checks DROP COLUMN IF EXISTS from_note');
}
