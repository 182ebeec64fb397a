import type { Knex } from 'knex';

export const config = { transaction: false };

/** What readers can find, of editions in use and of shipped words alone. `heading_words` and `all_words` hold folded words for the two indexes. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE TABLE IF NOT EXISTS search_entries (
    kind VARCHAR(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    region VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    slug VARCHAR(80) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    edition_number INT UNSIGNED NOT NULL,
    title VARCHAR(500) NOT NULL,
    also TEXT NOT NULL,
    text MEDIUMTEXT NOT NULL,
    strength VARCHAR(10) CHARACTER SET ascii COLLATE ascii_bin NULL,
    valid_from DATE NULL,
    valid_to DATE NULL,
    look_again_by DATE NULL,
    places VARCHAR(500) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    heading_words TEXT NOT NULL,
    all_words MEDIUMTEXT NOT NULL,
    PRIMARY KEY (kind, region, slug),
    KEY search_entries_by_region (region),
    FULLTEXT KEY search_entries_headings (heading_words),
    FULLTEXT KEY search_entries_all (all_words),
    CONSTRAINT search_entries_kind_known CHECK (kind IN ('note', 'rule', 'region', 'source', 'word'))
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS search_entries');
}
