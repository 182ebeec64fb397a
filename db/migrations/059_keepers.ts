import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS keepers (
    region VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    account_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    since DATETIME(3) NOT NULL,
    PRIMARY KEY (region, account_id),
    KEY keepers_by_account (account_id),
    CONSTRAINT keepers_region FOREIGN KEY (region) REFERENCES regions (code),
    CONSTRAINT keepers_account FOREIGN KEY (account_id) REFERENCES accounts (id)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS keepers');
}
