import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS files (
    id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
    store_key CHAR(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    sha256 CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    type VARCHAR(100) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    bytes INT UNSIGNED NOT NULL,
    name VARCHAR(200) NOT NULL,
    owner_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NULL,
    purpose VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    state VARCHAR(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    made_at DATETIME(3) NOT NULL,
    UNIQUE KEY files_by_store_key (store_key),
    KEY files_by_sha256 (sha256),
    KEY files_by_owner (owner_id, made_at),
    KEY files_by_state (state, made_at),
    CONSTRAINT files_state_known CHECK (state IN ('coming', 'ready', 'gone')),
    CONSTRAINT files_purpose_known CHECK (purpose IN ('page-seen')),
    CONSTRAINT files_hold_something CHECK (bytes > 0),
    CONSTRAINT files_owner FOREIGN KEY (owner_id) REFERENCES accounts (id)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS files');
}
