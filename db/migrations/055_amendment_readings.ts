import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS amendment_readings (
    amendment_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    version INT UNSIGNED NOT NULL,
    reader_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    claim VARCHAR(300) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    read_at DATETIME(3) NOT NULL,
    PRIMARY KEY (amendment_id, reader_id, version, claim),
    CONSTRAINT amendment_readings_amendment FOREIGN KEY (amendment_id) REFERENCES amendments (id),
    CONSTRAINT amendment_readings_reader FOREIGN KEY (reader_id) REFERENCES accounts (id)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS amendment_readings');
}
