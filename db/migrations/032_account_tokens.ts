import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS account_tokens (
    hash BINARY(32) NOT NULL PRIMARY KEY,
    account_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    kind VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    email VARCHAR(254) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NULL,
    made_at DATETIME(3) NOT NULL,
    ends_at DATETIME(3) NOT NULL,
    UNIQUE KEY account_tokens_newest (account_id, kind),
    KEY account_tokens_by_end (ends_at),
    CONSTRAINT account_tokens_kind CHECK (kind IN ('confirm', 'link', 'reset', 'address')),
    CONSTRAINT account_tokens_account FOREIGN KEY (account_id) REFERENCES accounts (id)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS account_tokens');
}
