import kept from '@/content/words/synonyms.json';
import { readWords, type ReadWord } from './read-words';

/** One thing under all the words that potters of several languages have for it. The first English word names it. */
export type Concept = { readonly id: string; readonly name: string };

/** A run of words that means one thing: from the word at `from` to the one before `to`. */
export type Meaning = { readonly from: number; readonly to: number; readonly concept: Concept };

const LANGUAGES = ['en', 'de', 'da', 'fr'] as const;
const LONGEST = 5;
/** A shorter part of a compound would be found by chance in too many words. */
const LEAST_PART = 3;
const LEAST_COMPOUND = 7;
const JOINTS = ['', 's', 'n', 'e', 'en', 'er', 'es'];

const phraseOf = (said: string): string =>
  readWords(said)
    .map((word) => word.stem)
    .join(' ');

const forms = kept.concepts.flatMap((entry) => {
  const concept = { id: entry.concept, name: entry.en[0] ?? entry.concept };
  return LANGUAGES.flatMap((language) => entry[language].map((form) => ({ form, concept })));
});

const byPhrase: ReadonlyMap<string, Concept> = new Map(forms.map(({ form, concept }) => [phraseOf(form), concept]));
const starts: ReadonlySet<string> = new Set([...byPhrase.keys()].map((phrase) => phrase.split(' ')[0] ?? ''));
const parts: ReadonlyMap<string, Concept> = new Map(
  forms.flatMap(({ form, concept }) => {
    const [word, second] = readWords(form);
    return word === undefined || second !== undefined || word.folded.length < LEAST_PART
      ? []
      : ([
          [word.folded, concept],
          [word.stem, concept],
        ] as const);
  }),
);

/** Folded single words of the list, by what they are compared by: a slip of the pen is mended to one of them. */
export const lexiconWords: ReadonlyMap<string, string> = new Map(
  forms.flatMap(({ form }) => readWords(form).map((word) => [word.stem, word.folded] as const)),
);

/** Other names of each place, by its code. */
export const placeNicknames: Readonly<Partial<Record<string, readonly string[]>>> = kept.places;

/** What a run of words means, the longest run first. Words that the list does not know belong to none. */
export function meaningsOf(words: readonly ReadWord[]): readonly Meaning[] {
  const found: Meaning[] = [];
  for (let at = 0; at < words.length;) {
    const meaning = meaningAt(words, at);
    if (meaning !== null) found.push(meaning);
    at = meaning?.to ?? at + 1;
  }
  return found;
}

function meaningAt(words: readonly ReadWord[], from: number): Meaning | null {
  if (!starts.has(words[from]?.stem ?? '')) return null;
  for (let to = Math.min(words.length, from + LONGEST); to > from; to -= 1) {
    const concept = byPhrase.get(
      words
        .slice(from, to)
        .map((word) => word.stem)
        .join(' '),
    );
    if (concept !== undefined) return { from, to, concept };
  }
  return null;
}

/** The parts of a compound such as "Bleiglasur" when all of it is made of words of the list; none otherwise. */
export function compoundOf(folded: string): readonly Concept[] {
  if (folded.length < LEAST_COMPOUND) return [];
  for (let cut = folded.length - LEAST_PART; cut >= LEAST_PART; cut -= 1) {
    const head = partOf(folded.slice(0, cut));
    if (head === undefined) continue;
    const tail = parts.get(folded.slice(cut)) ?? parts.get(readWords(folded.slice(cut))[0]?.stem ?? '');
    if (tail !== undefined) return [head, tail];
  }
  return [];
}

function partOf(head: string): Concept | undefined {
  const joint = JOINTS.find((one) => head.endsWith(one) && head.length - one.length >= LEAST_PART && parts.has(without(head, one)));
  return joint === undefined ? undefined : parts.get(without(head, joint));
}

const without = (word: string, ending: string): string => word.slice(0, word.length - ending.length);
