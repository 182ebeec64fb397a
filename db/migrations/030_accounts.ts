import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS accounts (
    id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
    email VARCHAR(254) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NULL,
    name VARCHAR(80) NOT NULL,
    password_hash VARCHAR(255) CHARACTER SET ascii COLLATE ascii_bin NULL,
    role VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    state VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    version INT UNSIGNED NOT NULL DEFAULT 1,
    made_at DATETIME(3) NOT NULL,
    confirmed_at DATETIME(3) NULL,
    leaving_at DATETIME(3) NULL,
    second_factor_secret VARBINARY(128) NULL,
    second_factor_on_at DATETIME(3) NULL,
    second_factor_last_step BIGINT NULL,
    region VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NULL,
    currency CHAR(3) CHARACTER SET ascii COLLATE ascii_bin NULL,
    units VARCHAR(10) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'metric',
    is_demo TINYINT NOT NULL DEFAULT 0,
    UNIQUE KEY accounts_by_email (email),
    KEY accounts_by_leaving (state, leaving_at),
    KEY accounts_by_role (role, state),
    CONSTRAINT accounts_role CHECK (role IN ('maker', 'editor', 'moderator', 'steward')),
    CONSTRAINT accounts_state CHECK (state IN ('unconfirmed', 'open', 'closed', 'leaving', 'gone')),
    CONSTRAINT accounts_units CHECK (units IN ('metric', 'imperial')),
    CONSTRAINT accounts_gone_bare CHECK (state <> 'gone' OR (email IS NULL AND name = '' AND password_hash IS NULL))
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS accounts');
}
