import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS recovery_codes (
    account_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    hash BINARY(32) NOT NULL,
    used_at DATETIME(3) NULL,
    PRIMARY KEY (account_id, hash),
    CONSTRAINT recovery_codes_account FOREIGN KEY (account_id) REFERENCES accounts (id)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS recovery_codes');
}
