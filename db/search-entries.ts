import type { Sheet } from '@/lib/regions/domain/sheet';
import type { SearchEntry } from '@/lib/search/domain/entry';
import { vocabularyOf } from '@/lib/search/domain/index-words';
import { sheetEntries } from '@/lib/search/domain/sheet-entries';
import { storedEntry, type StoredEntry } from '@/lib/search/domain/stored-entry';
import { indexedRow, searchTextRow } from './rows/search-row';
import type { Trx } from './transaction';

/** What leaves the index: all of a sheet, or all of one kind that belongs to no place, or one entry of it. */
export type Leaving = {
  readonly region: string;
  readonly kind?: SearchEntry['kind'];
  readonly slug?: string;
  readonly edition_number?: number;
};

const AT_ONCE = 200;

/** Takes out what an earlier edition had in the index and puts in what this one has, in the edition's own transaction. */
export async function replaceSheetEntries(trx: Trx, edition: number, sheet: Sheet): Promise<void> {
  await replaceEntries(trx, { region: sheet.code }, sheetEntries(sheet, edition));
}

/** The same where words are read otherwise than when the sheet was put in, or it never was. Answers whether that was so. */
export async function refreshSheetEntries(trx: Trx, edition: number, sheet: Sheet): Promise<boolean> {
  const rows: unknown[] = await trx('search_entries').where({ region: sheet.code }).select('kind', 'slug', 'all_words');
  const there = new Map(rows.map((row) => indexedRow.parse(row)).map(({ kind, slug, all_words }) => [`${kind} ${slug}`, all_words]));
  const wanted = sheetEntries(sheet, edition).map(storedEntry);
  if (wanted.length === there.size && wanted.every(({ kind, slug, allWords }) => there.get(`${kind} ${slug}`) === allWords)) return false;
  await replaceSheetEntries(trx, edition, sheet);
  return true;
}

/** Puts in what ships with the program, in the place of what shipped before. What people have amended since stands. */
export async function replaceShippedEntries(trx: Trx, entries: readonly SearchEntry[]): Promise<void> {
  const amended: unknown[] = await trx('search_entries')
    .where({ region: '' })
    .where('edition_number', '>', 0)
    .select('kind', 'slug', 'all_words');
  const theirs = new Set(amended.map((row) => indexedRow.parse(row)).map(({ kind, slug }) => `${kind} ${slug}`));
  await replaceEntries(
    trx,
    { region: '', edition_number: 0 },
    entries.filter(({ kind, slug }) => !theirs.has(`${kind} ${slug}`)),
  );
}

/** Puts entries in the place of those that leave. Words that stand in no entry any more are forgotten with them. */
export async function replaceEntries(trx: Trx, leaving: Leaving, entries: readonly SearchEntry[]): Promise<void> {
  await trx('search_state')
    .insert({ id: 1, revision: 1 })
    .onConflict('id')
    .merge({ revision: trx.raw('revision + 1') });
  const rows: unknown[] = await trx('search_entries').where(leaving).select('title', 'also', 'text');
  if (rows.length > 0) await trx('search_entries').where(leaving).delete();
  const stored = entries.map(storedEntry);
  for (let start = 0; start < stored.length; start += AT_ONCE) {
    await trx('search_entries').insert(stored.slice(start, start + AT_ONCE).map(columnsOf));
  }
  const gone = rows.flatMap((row) => {
    const { title, also, text } = searchTextRow.parse(row);
    return vocabularyOf([title, ...also, text].join('\n'));
  });
  await countWords(
    trx,
    gone,
    stored.flatMap(({ vocabulary }) => vocabulary),
  );
}

// In the order of the words, so that two editions published at once wait for each other and never both ways.
async function countWords(trx: Trx, gone: readonly string[], come: readonly string[]): Promise<void> {
  const uses = new Map<string, number>();
  for (const word of come) uses.set(word, (uses.get(word) ?? 0) + 1);
  for (const word of gone) uses.set(word, (uses.get(word) ?? 0) - 1);
  const changed = [...uses]
    .filter(([, change]) => change !== 0)
    .sort(([one], [other]) => (one < other ? -1 : 1))
    .map(([word, change]) => ({ word, uses: change }));
  for (let start = 0; start < changed.length; start += AT_ONCE) {
    await trx('search_words')
      .insert(changed.slice(start, start + AT_ONCE))
      .onConflict('word')
      .merge({ uses: trx.raw('search_words.uses + values(uses)') });
  }
  const fallen = changed.filter((one) => one.uses < 0).map(({ word }) => word);
  for (let start = 0; start < fallen.length; start += AT_ONCE) {
    await trx('search_words')
      .whereIn('word', fallen.slice(start, start + AT_ONCE))
      .where('uses', '<=', 0)
      .delete();
  }
}

const columnsOf = (entry: StoredEntry): object => ({
  kind: entry.kind,
  region: entry.region,
  slug: entry.slug,
  edition_number: entry.edition,
  title: entry.title.slice(0, 500),
  also: entry.also.join('\n'),
  text: entry.text,
  strength: entry.strength,
  valid_from: entry.from,
  valid_to: entry.to,
  look_again_by: entry.lookAgainBy,
  places: entry.places.join(' '),
  heading_words: entry.headingWords,
  all_words: entry.allWords,
});
