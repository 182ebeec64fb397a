import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS day_book_checks (
    id TINYINT UNSIGNED NOT NULL PRIMARY KEY,
    checked_at DATETIME(3) NOT NULL,
    number BIGINT UNSIGNED NOT NULL,
    hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    break_number BIGINT UNSIGNED NULL,
    break_why VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NULL,
    CONSTRAINT day_book_checks_one CHECK (id = 1)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS day_book_checks');
}
