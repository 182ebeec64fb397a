import { placeNicknames } from './lexicon';
import { readWords } from './read-words';
import { stem } from './stem';

/** All words that stand in entries, and the names of places: what a reader's words are read with. */
export type Vocabulary = {
  /** Stems of all words there are. */
  readonly stems: ReadonlySet<string>;
  /** Folded words by their length, with the count of entries they stand in. */
  readonly byLength: ReadonlyMap<number, readonly KnownWord[]>;
  /** Codes of places by their names, as runs of folded words. */
  readonly places: ReadonlyMap<string, string>;
  /** What each sheet is called, by its code. */
  readonly sheetNames: ReadonlyMap<string, string>;
};

export type KnownWord = { readonly word: string; readonly uses: number; readonly letters: number };

type Counted = Pick<KnownWord, 'word' | 'uses'>;
type Named = { readonly code: string; readonly names: readonly string[] };

/** Which of the letters a word has, a bit each: two words a slip apart differ in at most two bits. */
export function lettersOf(word: string): number {
  let letters = 0;
  for (const letter of word) letters |= 1 << ((letter.codePointAt(0) ?? 0) % 31);
  return letters;
}

/** Words by how many letters they have. */
export function wordsByLength(words: readonly Counted[]): ReadonlyMap<number, readonly KnownWord[]> {
  const byLength = new Map<number, KnownWord[]>();
  for (const { word, uses } of words) {
    const known = { word, uses, letters: lettersOf(word) };
    const same = byLength.get(word.length);
    if (same === undefined) byLength.set(word.length, [known]);
    else same.push(known);
  }
  return byLength;
}

/** Puts together what readers' words are read with. */
export function makeVocabulary(words: readonly Counted[], regions: readonly Named[]): Vocabulary {
  const named = regions.flatMap(({ code, names }) =>
    [...names, ...(placeNicknames[code] ?? [])].map((name) => [nameOf(name), code] as const),
  );
  return {
    stems: new Set(words.map(({ word }) => stem(word))),
    byLength: wordsByLength(words),
    places: new Map(named),
    sheetNames: new Map(regions.map(({ code, names }) => [code, names[0] ?? code])),
  };
}

const nameOf = (name: string): string =>
  readWords(name)
    .map(({ folded }) => folded)
    .join(' ');
