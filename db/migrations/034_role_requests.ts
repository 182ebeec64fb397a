import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS role_requests (
    id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
    account_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    why VARCHAR(2000) NOT NULL,
    regions LONGTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    state VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    answer VARCHAR(2000) NULL,
    answered_by CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NULL,
    made_at DATETIME(3) NOT NULL,
    answered_at DATETIME(3) NULL,
    KEY role_requests_by_account (account_id, made_at),
    KEY role_requests_by_state (state, made_at),
    CONSTRAINT role_requests_state CHECK (state IN ('waiting', 'granted', 'refused', 'withdrawn')),
    CONSTRAINT role_requests_regions CHECK (JSON_VALID(regions)),
    CONSTRAINT role_requests_account FOREIGN KEY (account_id) REFERENCES accounts (id)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS role_requests');
}
