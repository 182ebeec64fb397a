import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS day_book (
    number BIGINT UNSIGNED NOT NULL PRIMARY KEY,
    at DATETIME(3) NOT NULL,
    actor_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NULL,
    did VARCHAR(60) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    subject_kind VARCHAR(40) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    subject_id VARCHAR(80) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    reason TEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NULL,
    details LONGTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    previous_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    KEY day_book_by_act (did, number),
    KEY day_book_by_subject (subject_kind, subject_id, number),
    KEY day_book_by_time (at, number),
    KEY day_book_by_actor (actor_id, number),
    CONSTRAINT day_book_chain UNIQUE (previous_hash),
    CONSTRAINT day_book_details_json CHECK (JSON_VALID(details))
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS day_book');
}
