import Fuse from 'fuse.js';
import { addressOf, type SearchKind } from './entry';

/** An entry in few letters: kind, sheet, key, title, other names. Sent to the reader whole, once. */
export type CompactEntry = readonly [kind: SearchKind, region: string, slug: string, title: string, also?: string];

/** What suggestions are made of: the entries, and the words around them. */
export type SuggestionIndex = {
  readonly label: string;
  readonly kinds: Readonly<Record<SearchKind, string>>;
  /** What to say of so many suggestions; the place in the list is the count. */
  readonly counts: readonly string[];
  readonly entries: readonly CompactEntry[];
};

export type Suggestion = { readonly address: string; readonly title: string; readonly kind: SearchKind };

export const MOST_SUGGESTED = 6;
const LONGEST = 60;
/** The order of kinds that fit as well as each other. */
const WELCOME: Readonly<Record<SearchKind, number>> = { note: 0, region: 0.05, word: 0.08, term: 0.18, rule: 0.2, source: 0.3 };

/** A finder over the index: what a reader may mean who has written that much. Small slips are forgiven. */
export function makeSuggester({ entries }: SuggestionIndex): (text: string) => readonly Suggestion[] {
  const fuse = new Fuse(entries, {
    keys: [
      { name: 'title', weight: 2, getFn: ([, , , title]) => title },
      { name: 'also', weight: 1, getFn: ([, , , , also = '']) => (also === '' ? [] : also.split(';')) },
    ],
    includeScore: true,
    ignoreLocation: true,
    ignoreDiacritics: true,
    threshold: 0.3,
    minMatchCharLength: 2,
  });
  return (text) => {
    const sought = text.trim().slice(0, LONGEST);
    if (sought.length < 2) return [];
    return fuse
      .search(sought, { limit: 60 })
      .toSorted((a, b) => rankOf(a) - rankOf(b))
      .slice(0, MOST_SUGGESTED)
      .map(({ item: [kind, region, slug, title] }) => ({ kind, title, address: addressOf({ kind, region, slug }) }));
  };
}

const rankOf = ({ item: [kind], score = 1 }: { readonly item: CompactEntry; readonly score?: number }): number => score + WELCOME[kind];
