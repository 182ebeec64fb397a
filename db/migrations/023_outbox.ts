import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS outbox (
    id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
    account_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NULL,
    kind VARCHAR(40) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    address VARCHAR(254) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    subject VARCHAR(200) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    body_text MEDIUMTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NULL,
    body_html MEDIUMTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NULL,
    leave_url VARCHAR(500) CHARACTER SET ascii COLLATE ascii_bin NULL,
    message_id VARCHAR(320) CHARACTER SET ascii COLLATE ascii_bin NULL,
    state VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'waiting',
    tries SMALLINT UNSIGNED NOT NULL DEFAULT 0,
    due_at DATETIME(3) NOT NULL,
    claimed_by CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NULL,
    claimed_until DATETIME(3) NULL,
    last_answer VARCHAR(300) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NULL,
    made_at DATETIME(3) NOT NULL,
    ended_at DATETIME(3) NULL,
    KEY outbox_due (state, due_at),
    KEY outbox_claimed (state, claimed_until),
    KEY outbox_by_account (account_id),
    KEY outbox_by_end (state, ended_at),
    CONSTRAINT outbox_state CHECK (state IN ('waiting', 'sending', 'sent', 'bounced', 'parked'))
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS outbox');
}
