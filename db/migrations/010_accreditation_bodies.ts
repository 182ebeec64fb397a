import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS accreditation_bodies (
    region VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    edition_number INT UNSIGNED NOT NULL,
    position SMALLINT UNSIGNED NOT NULL,
    name VARCHAR(300) NOT NULL,
    url VARCHAR(1000) NULL,
    role VARCHAR(500) NOT NULL,
    evidence VARCHAR(10) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    PRIMARY KEY (region, edition_number, position),
    CONSTRAINT accreditation_bodies_edition FOREIGN KEY (region, edition_number) REFERENCES editions (region, number),
    CONSTRAINT accreditation_bodies_evidence_known CHECK (evidence IN ('read', 'memory'))
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS accreditation_bodies');
}
