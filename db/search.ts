import type { Knex } from 'knex';
import type { Candidate, SearchEntry, SearchKind } from '@/lib/search/domain/entry';
import { candidateRow, keyedTextRow, knownWordRow, regionNamesRow, revisionRow, suggestionRow } from './rows/search-row';

const SHOWN = [
  'kind',
  'region',
  'slug',
  'edition_number',
  'title',
  'also',
  'strength',
  'valid_from',
  'valid_to',
  'look_again_by',
  'places',
] as const;

export type CandidateQuery = {
  /** For boolean full text: words, brackets and marks of our own making. */
  readonly words: string;
  /** In titles and other names alone, or in all of the text. */
  readonly where: 'heading_words' | 'all_words';
  /** Of these kinds alone; none for all. */
  readonly kinds: readonly SearchKind[];
  readonly most: number;
};

/**
 * Entries that the database finds by their words, the likeliest first. Its full text hands them over in that order by itself; asked for the
 * order as well, it would read the row of everything it found before it gives the first.
 */
export async function findCandidates(db: Knex, { words, where, kinds, most }: CandidateQuery): Promise<readonly Candidate[]> {
  const rows: unknown[] = await db('search_entries')
    .whereRaw('match(??) against (? in boolean mode)', [where, words])
    .where((builder) => {
      if (kinds.length > 0) void builder.whereIn('kind', kinds);
    })
    .select(...SHOWN, db.raw('match(??) against (? in boolean mode) as score', [where, words]))
    .limit(most);
  return rows.map((row) => candidateRow.parse(row)).toSorted((a, b) => b.score - a.score);
}

type Key = Pick<SearchEntry, 'kind' | 'region' | 'slug'>;
export type KeyedText = Key & { readonly text: string };

/** The texts of these entries. */
export async function findTexts(db: Knex, keys: readonly Key[]): Promise<readonly KeyedText[]> {
  if (keys.length === 0) return [];
  const rows: unknown[] = await db('search_entries')
    .whereIn(
      ['kind', 'region', 'slug'],
      keys.map(({ kind, region, slug }) => [kind, region, slug]),
    )
    .select('kind', 'region', 'slug', 'text');
  return rows.map((row) => keyedTextRow.parse(row));
}

/** A number that differs after every change of the index. */
export async function searchRevision(db: Knex): Promise<string> {
  const row: unknown = await db('search_state').where({ id: 1 }).select('revision').first();
  return revisionRow.parse(row)?.revision ?? '0';
}

/** Every word that stands in an entry, with the count of entries. */
export async function listSearchWords(db: Knex): Promise<readonly { readonly word: string; readonly uses: number }[]> {
  const rows: unknown[] = await db('search_words').where('uses', '>', 0).limit(200_000).select('word', 'uses');
  return rows.map((row) => knownWordRow.parse(row));
}

/** All names of every place that has a sheet. */
export async function listRegionNames(db: Knex): Promise<readonly { readonly code: string; readonly names: readonly string[] }[]> {
  const rows: unknown[] = await db('search_entries').where({ kind: 'region' }).limit(10_000).select('slug', 'title', 'also');
  return rows.map((row) => {
    const { slug, title, also } = regionNamesRow.parse(row);
    return { code: slug, names: [title, ...also] };
  });
}

export type Suggestable = Pick<SearchEntry, 'kind' | 'region' | 'slug' | 'title' | 'also'>;

/** Entries of a kind by what they are called, in the order of their keys. */
export async function listTitles(db: Knex, kind: SearchKind, most: number): Promise<readonly Suggestable[]> {
  const rows: unknown[] = await db('search_entries')
    .where({ kind })
    .orderBy(['region', 'slug'])
    .limit(most)
    .select('kind', 'region', 'slug', 'title', 'also');
  return rows.map((row) => suggestionRow.parse(row));
}

export type ListedEntry = Candidate & { readonly text: string };

/** Notes in the order of their slugs, from the one after `after` on. */
export async function listNoteEntries(db: Knex, after: string, most: number): Promise<readonly ListedEntry[]> {
  const rows: unknown[] = await db('search_entries')
    .where({ kind: 'note', region: '' })
    .where('slug', '>', after)
    .orderBy('slug')
    .limit(most)
    .select(...SHOWN, 'text', db.raw('0 as score'));
  return rows.map((row) => ({ ...candidateRow.parse(row), text: keyedTextRow.parse(row).text }));
}
