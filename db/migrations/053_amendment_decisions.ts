import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS amendment_decisions (
    id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
    amendment_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    version INT UNSIGNED NOT NULL,
    kind VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    decided_by CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    reason VARCHAR(2000) NULL,
    decided_at DATETIME(3) NOT NULL,
    KEY amendment_decisions_by_amendment (amendment_id, decided_at),
    CONSTRAINT amendment_decisions_kind_known CHECK (kind IN ('hold', 'release', 'send-back', 'approve-once', 'approve', 'refuse-stale')),
    CONSTRAINT amendment_decisions_amendment FOREIGN KEY (amendment_id) REFERENCES amendments (id),
    CONSTRAINT amendment_decisions_account FOREIGN KEY (decided_by) REFERENCES accounts (id)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS amendment_decisions');
}
