import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS editions (
    region VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    number INT UNSIGNED NOT NULL,
    hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    origin VARCHAR(10) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    summary VARCHAR(500) NOT NULL,
    in_use_from DATETIME(3) NOT NULL,
    document LONGTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    PRIMARY KEY (region, number),
    CONSTRAINT editions_sheet FOREIGN KEY (region) REFERENCES sheets (region),
    CONSTRAINT editions_number_counts CHECK (number > 0),
    CONSTRAINT editions_origin_known CHECK (origin IN ('seed', 'amendment')),
    CONSTRAINT editions_document_json CHECK (JSON_VALID(document))
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS editions');
}
