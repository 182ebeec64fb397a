import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS jobs (
    id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
    kind VARCHAR(40) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    input LONGTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    account_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NULL,
    state VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'waiting',
    tries SMALLINT UNSIGNED NOT NULL DEFAULT 0,
    done_count INT UNSIGNED NOT NULL DEFAULT 0,
    total_count INT UNSIGNED NOT NULL DEFAULT 0,
    result LONGTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NULL,
    failure VARCHAR(300) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NULL,
    run_at DATETIME(3) NOT NULL,
    claimed_by CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NULL,
    claimed_until DATETIME(3) NULL,
    made_at DATETIME(3) NOT NULL,
    ended_at DATETIME(3) NULL,
    KEY jobs_due (state, run_at),
    KEY jobs_claimed (state, claimed_until),
    KEY jobs_by_account (account_id),
    KEY jobs_by_end (state, ended_at),
    CONSTRAINT jobs_state CHECK (state IN ('waiting', 'running', 'done', 'parked')),
    CONSTRAINT jobs_input_json CHECK (JSON_VALID(input)),
    CONSTRAINT jobs_result_json CHECK (result IS NULL OR JSON_VALID(result))
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS jobs');
}
