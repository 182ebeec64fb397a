import { slipsBetween } from '@/lib/regions/domain/region-search';
import { lexiconWords } from './lexicon';
import { lettersOf, wordsByLength, type Vocabulary } from './vocabulary';

/** Slips forgiven in a word of that many letters. */
const slipsForgiven = (length: number): number => {
  if (length < 4) return 0;
  return length < 7 ? 1 : 2;
};

type Near = { readonly word: string; readonly slips: number; readonly weight: number };

const LEXICON = wordsByLength([...new Set(lexiconWords.values())].map((word) => ({ word, uses: 1_000_000 })));

/**
 * Words a slip or two away from one that nobody wrote: the fewest slips first, potters' words before others, and of those the words
 * that stand in most entries.
 */
export function nearWords(sought: string, vocabulary: Vocabulary, most = slipsForgiven(sought.length)): readonly string[] {
  if (most === 0) return [];
  const letters = lettersOf(sought);
  const lengths = Array.from({ length: 2 * most + 1 }, (_, place) => sought.length - most + place);
  const near = lengths
    .flatMap((length) => [...(LEXICON.get(length) ?? []), ...(vocabulary.byLength.get(length) ?? [])])
    .filter((known) => bitsOf(known.letters ^ letters) <= 2 * most)
    .map(({ word, uses }): Near => ({ word, slips: slipsBetween(sought, word), weight: uses + (word[0] === sought[0] ? 500 : 0) }))
    .filter(({ slips }) => slips <= most);
  near.sort((a, b) => a.slips - b.slips || b.weight - a.weight || (a.word < b.word ? -1 : 1));
  return [...new Set(near.map(({ word }) => word))].slice(0, 5);
}

/** Longer words that begin so, since somebody may not have written a word to its end: potters' words first, then the most used. */
export function wordsBeginning(sought: string, { byLength }: Vocabulary): readonly string[] {
  if (sought.length < 4) return [];
  const longer = [...LEXICON, ...byLength].filter(([length]) => length > sought.length).flatMap(([, words]) => words);
  return longer
    .filter(({ word }) => word.startsWith(sought))
    .toSorted((a, b) => b.uses - a.uses || a.word.length - b.word.length || (a.word < b.word ? -1 : 1))
    .slice(0, 5)
    .map(({ word }) => word);
}

function bitsOf(value: number): number {
  let rest = value;
  let count = 0;
  for (; rest !== 0; rest &= rest - 1) count += 1;
  return count;
}
