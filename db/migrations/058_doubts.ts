import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS doubts (
    id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
    region VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    rule_id VARCHAR(100) CHARACTER SET ascii COLLATE ascii_bin NULL,
    words VARCHAR(2000) NOT NULL,
    state VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    answer VARCHAR(2000) NULL,
    answered_by CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NULL,
    made_at DATETIME(3) NOT NULL,
    answered_at DATETIME(3) NULL,
    KEY doubts_by_state (state, made_at),
    KEY doubts_by_rule (rule_id, state),
    KEY doubts_by_region (region, state),
    CONSTRAINT doubts_state_known CHECK (state IN ('waiting', 'answered', 'set-aside')),
    CONSTRAINT doubts_answered CHECK ((state = 'answered') = (answer IS NOT NULL)),
    CONSTRAINT doubts_region FOREIGN KEY (region) REFERENCES regions (code)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS doubts');
}
