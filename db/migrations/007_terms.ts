import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS terms (
    region VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    edition_number INT UNSIGNED NOT NULL,
    id VARCHAR(80) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    name VARCHAR(200) NOT NULL,
    category BOOLEAN NOT NULL,
    valid_from DATE NULL,
    valid_to DATE NULL,
    PRIMARY KEY (region, edition_number, id),
    KEY terms_by_id (id, edition_number),
    CONSTRAINT terms_edition FOREIGN KEY (region, edition_number) REFERENCES editions (region, number),
    CONSTRAINT terms_span CHECK (valid_from IS NULL OR valid_to IS NULL OR valid_from < valid_to)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS terms');
}
