import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS kept_forms (
    id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    owner BINARY(32) NOT NULL,
    sealed BLOB NOT NULL,
    made_at DATETIME(3) NOT NULL,
    PRIMARY KEY (owner, id),
    KEY kept_forms_by_age (made_at)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS kept_forms');
}
