import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS amendment_entries (
    amendment_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    item VARCHAR(140) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    version INT UNSIGNED NOT NULL,
    entered LONGTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    saved_at DATETIME(3) NOT NULL,
    PRIMARY KEY (amendment_id, item),
    CONSTRAINT amendment_entries_json CHECK (JSON_VALID(entered)),
    CONSTRAINT amendment_entries_amendment FOREIGN KEY (amendment_id) REFERENCES amendments (id)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS amendment_entries');
}
