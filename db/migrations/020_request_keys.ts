import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS request_keys (
    id VARCHAR(80) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
    who VARCHAR(80) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    act VARCHAR(60) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    input_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    answer LONGTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NULL,
    made_at DATETIME(3) NOT NULL,
    KEY request_keys_by_age (made_at),
    CONSTRAINT request_keys_answer_json CHECK (answer IS NULL OR JSON_VALID(answer))
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS request_keys');
}
