import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS membership_exceptions (
    region VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    position SMALLINT UNSIGNED NOT NULL,
    rule VARCHAR(80) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    why VARCHAR(1000) NOT NULL,
    PRIMARY KEY (region, position, rule),
    CONSTRAINT membership_exceptions_of FOREIGN KEY (region, position) REFERENCES memberships (region, position) ON DELETE CASCADE
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS membership_exceptions');
}
