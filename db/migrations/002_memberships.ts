import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS memberships (
    region VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    position SMALLINT UNSIGNED NOT NULL,
    parent VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    valid_from DATE NULL,
    valid_to DATE NULL,
    PRIMARY KEY (region, position),
    CONSTRAINT memberships_region FOREIGN KEY (region) REFERENCES regions (code),
    CONSTRAINT memberships_parent FOREIGN KEY (parent) REFERENCES regions (code),
    CONSTRAINT memberships_not_itself CHECK (region <> parent),
    CONSTRAINT memberships_span CHECK (valid_from IS NULL OR valid_to IS NULL OR valid_from < valid_to)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS memberships');
}
