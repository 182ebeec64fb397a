import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS sessions (
    id BINARY(32) NOT NULL PRIMARY KEY,
    account_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    made_at DATETIME(3) NOT NULL,
    seen_at DATETIME(3) NOT NULL,
    ends_at DATETIME(3) NOT NULL,
    fresh_at DATETIME(3) NOT NULL,
    second_factor_at DATETIME(3) NULL,
    agent VARCHAR(200) NOT NULL DEFAULT '',
    KEY sessions_by_account (account_id, made_at),
    KEY sessions_by_end (ends_at),
    CONSTRAINT sessions_account FOREIGN KEY (account_id) REFERENCES accounts (id)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS sessions');
}
