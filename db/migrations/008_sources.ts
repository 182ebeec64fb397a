import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS sources (
    region VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    edition_number INT UNSIGNED NOT NULL,
    id VARCHAR(80) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    title VARCHAR(500) NOT NULL,
    publisher VARCHAR(300) NOT NULL,
    identifier VARCHAR(300) NULL,
    url VARCHAR(1000) NULL,
    version_date VARCHAR(300) NULL,
    seen_on DATE NULL,
    seen_via VARCHAR(1000) NULL,
    PRIMARY KEY (region, edition_number, id),
    CONSTRAINT sources_edition FOREIGN KEY (region, edition_number) REFERENCES editions (region, number)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS sources');
}
