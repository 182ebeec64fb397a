import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS regions (
    code VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
    name VARCHAR(200) NOT NULL,
    kind VARCHAR(10) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    CONSTRAINT regions_code_shape CHECK (code REGEXP '^[a-z][a-z0-9]{1,9}(-[a-z0-9]{1,6}){0,1}$'),
    CONSTRAINT regions_kind_known CHECK (kind IN ('bloc', 'country', 'part', 'standard', 'base'))
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS regions');
}
