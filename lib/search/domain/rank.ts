import Fuse from 'fuse.js';
import type { Candidate, SearchKind } from './entry';
import { indexWords, tokensOf } from './index-words';
import { unitsOf, type Query, type Sought } from './query';
import { readWords } from './read-words';

/** How welcome a kind is beside another that fits as well: a note answers, a word explains, a text is only pointed to. */
const WELCOME: Readonly<Record<SearchKind, number>> = { note: 0.6, word: 0.35, region: 0.2, term: 0.15, rule: 0.12, source: 0 };

const WEIGHT = { title: 1, also: 0.9, text: 0.25, share: 0.25, place: 0.6, sheet: 1, written: 0.2 };
/** Only the likeliest are looked at letter by letter. */
const LOOKED_AT = 50;
const LONGEST_PATTERN = 64;

export type Ranked = Candidate & { readonly rank: number };

/** Candidates in the order in which a reader would want them. */
export function rank(query: Query, candidates: readonly Candidate[]): readonly Ranked[] {
  const scored = candidates.map((candidate) => ({ ...candidate, rank: fitOf(query, candidate) })).toSorted(inOrder);
  const first = scored.slice(0, LOOKED_AT);
  const written = writtenAlike(query.read, first);
  const again = first.map((one, place) => ({ ...one, rank: one.rank + WEIGHT.written * (written.get(place) ?? 0) }));
  return [...again.toSorted(inOrder), ...scored.slice(LOOKED_AT)];
}

const inOrder = (a: Ranked, b: Ranked): number =>
  b.rank - a.rank || b.score - a.score || (`${a.kind} ${a.region} ${a.slug}` < `${b.kind} ${b.region} ${b.slug}` ? -1 : 1);

function fitOf({ sought, places }: Query, { kind, region, title, also }: Candidate): number {
  const titleTokens = new Set(indexWords(title));
  const alsoTokens = new Set(also.flatMap(indexWords));
  const fits = sought.map((one) => {
    if (has(titleTokens, one)) return WEIGHT.title;
    return has(alsoTokens, one) ? WEIGHT.also : WEIGHT.text;
  });
  const fit = fits.length === 0 ? 0 : fits.reduce((sum, value) => sum + value, 0) / fits.length;
  const isAlso = sought.some((one) => has(alsoTokens, one));
  const shares = isAlso ? also.map((name) => WEIGHT.also * shareOf(name, sought)) : [];
  const share = Math.max(shareOf(title, sought), ...shares);
  return fit + WEIGHT.share * share + WELCOME[kind] + placeFit(kind, places.includes(region), sought.length === 0);
}

function placeFit(kind: SearchKind, isThere: boolean, isAll: boolean): number {
  if (!isThere) return 0;
  return isAll && kind === 'region' ? WEIGHT.place + WEIGHT.sheet : WEIGHT.place;
}

/** How much of a name is what was sought. */
function shareOf(name: string, sought: readonly Sought[]): number {
  const units = unitsOf(readWords(name), null);
  const met = units.filter(({ words }) => {
    const tokens = new Set(tokensOf(words));
    return sought.some((one) => has(tokens, one));
  });
  return units.length === 0 ? 0 : met.length / units.length;
}

const has = (tokens: ReadonlySet<string>, { tokens: any, prefix }: Sought): boolean =>
  any.some((token) => tokens.has(token)) || (prefix !== null && [...tokens].some((token) => token.startsWith(prefix)));

/** How alike what was written is to a title or another name, from 0 to 1, by place in the list. */
function writtenAlike(read: string, candidates: readonly Candidate[]): ReadonlyMap<number, number> {
  const fuse = new Fuse(candidates, {
    keys: [
      { name: 'title', weight: 3 },
      { name: 'also', weight: 2 },
    ],
    includeScore: true,
    ignoreLocation: true,
    ignoreDiacritics: true,
    threshold: 0.5,
  });
  return new Map(fuse.search(read.slice(0, LONGEST_PATTERN)).map(({ refIndex, score = 1 }) => [refIndex, 1 - score]));
}
