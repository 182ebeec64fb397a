import { readdir, readFile } from 'node:fs/promises';
import type { Knex } from 'knex';
import { noteEntry, wordListEntries } from '@/content/seed/shipped-entries';
import { ok } from '@/lib/kernel/result';
import type { SearchEntry } from '@/lib/search/domain/entry';
import { findEdition } from '../editions';
import { sheetLockRow } from '../rows/edition-row';
import { refreshSheetEntries, replaceShippedEntries } from '../search-entries';
import { inTransaction } from '../transaction';

// A seed is run again when its text changes. So when words come to be read otherwise (stems, tokens), count on here: reading 1.
const NOTES = new URL('../../content/notes/', import.meta.url);
const WORDS = 'content/words/terms.json';

/** Thrown with every fault of every file. */
class SeedRefused extends Error {}

async function shippedEntries(): Promise<readonly SearchEntry[]> {
  const names = (await readdir(NOTES)).filter((name) => name.endsWith('.mdx')).sort();
  const notes = await Promise.all(
    names.map(async (name) => noteEntry(`content/notes/${name}`, await readFile(new URL(name, NOTES), 'utf8'))),
  );
  const list = wordListEntries(WORDS, await readFile(new URL(`../../${WORDS}`, import.meta.url), 'utf8'));
  const faults = [...notes, list].flatMap((result) => (result.ok ? [] : result.error));
  if (faults.length > 0) throw new SeedRefused(`Notes and words need mending:\n${faults.join('\n')}`);
  return [...notes.flatMap((note) => (note.ok ? [note.value] : [])), ...(list.ok ? list.value : [])];
}

/** Puts shipped notes and the word list into the index, and every sheet in use whose words are read otherwise by now. Safe to run again. */
export async function seed(knex: Knex): Promise<void> {
  const shipped = await shippedEntries();
  const rows: unknown[] = await knex('sheets').orderBy('region').select('region', 'edition_number');
  for (const row of rows) {
    const { region, edition_number } = sheetLockRow.parse(row);
    await inTransaction(knex, async (trx) => {
      const edition = await findEdition(trx, region, edition_number);
      return ok(edition === null ? false : await refreshSheetEntries(trx, edition_number, edition.sheet));
    });
  }
  await inTransaction(knex, async (trx) => {
    await replaceShippedEntries(trx, shipped);
    return ok(null);
  });
}
