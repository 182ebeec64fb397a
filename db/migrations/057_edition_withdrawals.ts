import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS edition_withdrawals (
    region VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    number INT UNSIGNED NOT NULL,
    brought_back_as INT UNSIGNED NOT NULL,
    reason VARCHAR(2000) NOT NULL,
    withdrawn_by CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    withdrawn_at DATETIME(3) NOT NULL,
    PRIMARY KEY (region, number),
    CONSTRAINT edition_withdrawals_edition FOREIGN KEY (region, number) REFERENCES editions (region, number),
    CONSTRAINT edition_withdrawals_account FOREIGN KEY (withdrawn_by) REFERENCES accounts (id)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS edition_withdrawals');
}
