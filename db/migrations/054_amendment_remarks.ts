import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS amendment_remarks (
    id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
    amendment_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    answer_to CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NULL,
    line VARCHAR(300) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    words VARCHAR(2000) NOT NULL,
    author_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    made_at DATETIME(3) NOT NULL,
    answered_by CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NULL,
    answered_at DATETIME(3) NULL,
    KEY amendment_remarks_by_amendment (amendment_id, made_at),
    CONSTRAINT amendment_remarks_amendment FOREIGN KEY (amendment_id) REFERENCES amendments (id),
    CONSTRAINT amendment_remarks_answers FOREIGN KEY (answer_to) REFERENCES amendment_remarks (id),
    CONSTRAINT amendment_remarks_author FOREIGN KEY (author_id) REFERENCES accounts (id)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS amendment_remarks');
}
