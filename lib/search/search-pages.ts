import 'server-only';
import { listMemberships } from '@/db/regions';
import { findCandidates, findTexts, type CandidateQuery } from '@/db/search';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { regionLine } from '@/lib/regions/domain/line';
import type { Ctx } from '@/lib/server/ctx';
import { addressOf, type Candidate, type SearchKind } from './domain/entry';
import { allOf, inPlaces, someOf } from './domain/full-text';
import { matchedSentence, type Stretch } from './domain/matched-sentence';
import { nearWords } from './domain/near-words';
import { readQuery, type Query } from './domain/query';
import { rank, type Ranked } from './domain/rank';
import type { Vocabulary } from './domain/vocabulary';
import { keptVocabulary } from './kept-vocabulary';
import { MOST_FOUND, type SearchQuery } from './schema';

export type Hit = Omit<Candidate, 'also' | 'score' | 'places'> & {
  readonly address: string;
  /** The name of the sheet it stands in; null for what belongs to no place. */
  readonly sheet: string | null;
  /** Names of the places a note speaks of. */
  readonly speaksOf: readonly string[];
  /** The sentence that has most of what was sought, with what was met. */
  readonly sentence: readonly Stretch[];
  /** Whether it stands in the reader's place or the layers above it, or belongs to no place. Always so where no place was named. */
  readonly isHere: boolean;
};

export type Found = {
  readonly hits: readonly Hit[];
  readonly count: number;
  /** There were more than can be leafed through. */
  readonly isMore: boolean;
  readonly query: Pick<Query, 'read' | 'mended' | 'places'>;
  /** Words near to those that nothing was found by. */
  readonly nearest: readonly string[];
};

/** Below that many, entries that have only some of what was sought are looked for as well. */
const FEW = 5;
const HEADINGS = 100;
/** Few beside the rules, and wanted first: so that many rules never crowd them out. */
const GUIDES = ['note', 'word', 'region', 'term'] as const;
const BASE = 'care';

/** Finds notes, words, sheets, rules and texts by a reader's words; those of the reader's place come first. */
export async function searchPages(ctx: Ctx, { q, kind, region, offset, limit }: SearchQuery): Promise<Found> {
  const vocabulary = await keptVocabulary(ctx.db);
  const query = readQuery(q, vocabulary);
  const here = region === null ? null : await layersOf(ctx, region);
  const candidates = await candidatesOf(ctx, query, { kind, here });
  const nameOf = (code: string): string | null => vocabulary.sheetNames.get(code) ?? null;
  const ranked = inReach(rank(query, candidates), here).slice(0, MOST_FOUND);
  const shown = ranked.slice(offset, offset + limit);
  const texts = new Map((await findTexts(ctx.db, shown)).map((found) => [addressOf(found), found.text]));
  return {
    hits: shown.map(({ also: _also, score: _score, rank: _rank, places, ...entry }) => ({
      ...entry,
      address: addressOf(entry),
      sheet: nameOf(entry.region),
      speaksOf: places.flatMap((code) => nameOf(code) ?? []),
      sentence: matchedSentence(texts.get(addressOf(entry)) ?? '', query.sought),
      isHere: here === null || here.has(entry.region),
    })),
    count: ranked.length,
    isMore: candidates.length > MOST_FOUND,
    query: { read: query.read, mended: query.mended, places: query.places },
    nearest: ranked.length > 0 ? [] : nearestOf(query, vocabulary),
  };
}

async function layersOf(ctx: Ctx, region: string): Promise<ReadonlySet<string>> {
  const { layers } = regionLine(await listMemberships(ctx.db), region, calendarDateOf(ctx.now));
  return new Set(['', BASE, region, ...layers]);
}

type Narrowing = { readonly kind: SearchQuery['kind']; readonly here: ReadonlySet<string> | null };

async function candidatesOf(ctx: Ctx, query: Query, { kind, here }: Narrowing): Promise<readonly Candidate[]> {
  const { sought } = query;
  const all = allOf(sought);
  const kinds = kind === null ? [] : [kind];
  const find = (
    words: string,
    where: CandidateQuery['where'],
    most = HEADINGS,
    of: readonly SearchKind[] = kinds,
  ): Promise<readonly Candidate[]> =>
    words.trim() === '' ? Promise.resolve([]) : findCandidates(ctx.db, { words, where, kinds: of, most });
  const [named, guides, inTitles] = await Promise.all([
    find(nearby(query, here), 'all_words'),
    kind === null ? find(all, 'heading_words', HEADINGS, GUIDES) : [],
    find(all, 'heading_words'),
  ]);
  // What has it in its title ranks first anyway: where there is plenty of that, the texts need not be gone through.
  const inTexts = inTitles.length >= HEADINGS ? [] : await find(all, 'all_words', MOST_FOUND);
  const found = together(named, guides, inTitles, inTexts);
  if (found.length >= FEW || sought.length < 2) return found;
  return together(found, await find(someOf(sought), 'heading_words'));
}

/** All of it, in the reader's place or in one that the question names. Empty where no place is named. */
function nearby({ sought, places }: Query, here: Narrowing['here']): string {
  const near = [...(here ?? []), ...places].filter((code) => code !== '');
  return near.length === 0 || (sought.length === 0 && places.length === 0)
    ? ''
    : `${allOf(sought)} ${inPlaces(near, here !== null && places.length === 0)}`;
}

const together = (...lists: readonly (readonly Candidate[])[]): readonly Candidate[] => [
  ...new Map(lists.flat().map((one) => [addressOf(one), one])).values(),
];

/** The reader's place first, each part in its order. */
function inReach(ranked: readonly Ranked[], here: ReadonlySet<string> | null): readonly Ranked[] {
  if (here === null) return ranked;
  return [...ranked.filter(({ region }) => here.has(region)), ...ranked.filter(({ region }) => !here.has(region))];
}

const nearestOf = ({ unknown, read }: Query, vocabulary: Vocabulary): readonly string[] => [
  ...new Set((unknown.length > 0 ? unknown : read.split(' ')).slice(0, 4).flatMap((word) => nearWords(word, vocabulary, 3).slice(0, 3))),
];
