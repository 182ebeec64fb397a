import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS reading_sheets (
    id CHAR(22) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
    entry LONGTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    touched_at DATETIME(3) NOT NULL,
    KEY reading_sheets_by_age (touched_at),
    CONSTRAINT reading_sheets_id_shape CHECK (id REGEXP '^[A-Za-z0-9_-]{22}$'),
    CONSTRAINT reading_sheets_entry_json CHECK (JSON_VALID(entry))
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS reading_sheets');
}
