import type { Knex } from 'knex';

export const config = { transaction: false };

const known = (kinds: string): string => `ALTER TABLE search_entries
  DROP CONSTRAINT IF EXISTS search_entries_kind_known,
  ADD CONSTRAINT search_entries_kind_known CHECK (kind IN (${kinds}))`;

/** Words that sheets define for their own rules can be found as well. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(known(`'note', 'rule', 'region', 'source', 'word', 'term'`));
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(known(`'note', 'rule', 'region', 'source', 'word'`));
}
