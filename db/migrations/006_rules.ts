import type { Knex } from 'knex';

export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS rules (
    region VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    edition_number INT UNSIGNED NOT NULL,
    id VARCHAR(80) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    topic VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    kind VARCHAR(10) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    strength VARCHAR(10) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    standing VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    title VARCHAR(200) NOT NULL,
    valid_from DATE NULL,
    valid_to DATE NULL,
    look_again_by DATE NOT NULL,
    PRIMARY KEY (region, edition_number, id),
    KEY rules_by_id (id, edition_number),
    CONSTRAINT rules_edition FOREIGN KEY (region, edition_number) REFERENCES editions (region, number),
    CONSTRAINT rules_kind_known CHECK (kind IN ('adds', 'replaces', 'excepts')),
    CONSTRAINT rules_strength_known CHECK (strength IN ('must', 'should', 'may', 'note')),
    CONSTRAINT rules_standing_known CHECK (standing IN ('law', 'guidance', 'standard', 'lab', 'common-practice')),
    CONSTRAINT rules_must_is_law CHECK (strength <> 'must' OR standing = 'law'),
    CONSTRAINT rules_span CHECK (valid_from IS NULL OR valid_to IS NULL OR valid_from < valid_to)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS rules');
}
