import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS checks (
    id CHAR(22) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
    regions LONGTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    sale_on DATE NULL,
    answers LONGTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    declined LONGTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    entry LONGTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NULL,
    shown LONGTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NULL,
    kept BOOLEAN NOT NULL DEFAULT FALSE,
    version INT UNSIGNED NOT NULL DEFAULT 1,
    begun_at DATETIME(3) NOT NULL,
    touched_at DATETIME(3) NOT NULL,
    KEY checks_by_age (kept, touched_at),
    CONSTRAINT checks_id_shape CHECK (id REGEXP '^[A-Za-z0-9_-]{22}$'),
    CONSTRAINT checks_regions_json CHECK (JSON_VALID(regions)),
    CONSTRAINT checks_answers_json CHECK (JSON_VALID(answers)),
    CONSTRAINT checks_declined_json CHECK (JSON_VALID(declined)),
    CONSTRAINT checks_entry_json CHECK (entry IS NULL OR JSON_VALID(entry)),
    CONSTRAINT checks_shown_json CHECK (shown IS NULL OR JSON_VALID(shown))
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS checks');
}
