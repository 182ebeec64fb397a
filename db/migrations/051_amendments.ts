import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS amendments (
    id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
    region VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    author_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    state VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    version INT UNSIGNED NOT NULL,
    base_number INT UNSIGNED NULL,
    summary VARCHAR(500) NOT NULL,
    intended LONGTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    document LONGTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    made_at DATETIME(3) NOT NULL,
    changed_at DATETIME(3) NOT NULL,
    sent_at DATETIME(3) NULL,
    opened_by CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NULL,
    opened_at DATETIME(3) NULL,
    edition_number INT UNSIGNED NULL,
    KEY amendments_by_author (author_id, changed_at),
    KEY amendments_by_state (state, sent_at),
    KEY amendments_by_region (region, state),
    CONSTRAINT amendments_state_known CHECK (state IN ('draft', 'sent', 'held', 'sent-back', 'once-approved', 'withdrawn', 'in-use', 'refused-stale')),
    CONSTRAINT amendments_in_use_numbered CHECK ((state = 'in-use') = (edition_number IS NOT NULL)),
    CONSTRAINT amendments_intended_json CHECK (JSON_VALID(intended)),
    CONSTRAINT amendments_document_json CHECK (JSON_VALID(document)),
    CONSTRAINT amendments_author FOREIGN KEY (author_id) REFERENCES accounts (id)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS amendments');
}
