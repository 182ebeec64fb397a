import { conceptToken, wordToken } from './index-words';
import { compoundOf, lexiconWords, meaningsOf, type Meaning } from './lexicon';
import { nearWords, wordsBeginning } from './near-words';
import { readWords, type ReadWord } from './read-words';
import { stem } from './stem';
import { GENERAL_WORDS, STOP_WORDS } from './stop-words';
import type { Vocabulary } from './vocabulary';

/** Characters of a question that are read. */
export const LONGEST_QUERY = 200;
const MOST_WORDS = 12;
/** Words with a slip that are mended; a question of nothing but slips is no question. */
const MOST_MENDED = 6;

/** One thing that is sought: an entry has it when it has any of the tokens, or a word that begins with the prefix. */
export type Sought = { readonly tokens: readonly string[]; readonly prefix: string | null };

/** A question as it was understood. */
export type Query = {
  readonly sought: readonly Sought[];
  /** Codes of places it names. */
  readonly places: readonly string[];
  /** Its words with slips mended, folded. */
  readonly read: string;
  readonly mended: readonly { readonly from: string; readonly to: string }[];
  /** Words that nothing there is comes near to. */
  readonly unknown: readonly string[];
};

type Mended = { readonly word: ReadWord; readonly was: string; readonly isBeginning: boolean; readonly isUnknown: boolean };

/** Reads a reader's question: folded, slips mended, potters' words brought to the things they mean, names of places set apart. */
export function readQuery(asked: string, vocabulary: Vocabulary): Query {
  const words = readWords(asked.slice(0, LONGEST_QUERY)).slice(0, MOST_WORDS);
  const mended = mendAll(words, vocabulary);
  const read = mended.map(({ word }) => word);
  const units = unitsOf(read, vocabulary);
  const places = [...new Set(units.flatMap(({ place }) => place ?? []))];
  const telling = units.filter(({ place, words: own }) => place === null && !(places.length > 0 && own.every(isGeneral)));
  return {
    sought: telling.flatMap((unit) => soughtIn(unit, mended)),
    places,
    read: read.map(({ folded }) => folded).join(' '),
    mended: mended.flatMap(({ word, was }) => (word.folded === was ? [] : [{ from: was, to: word.folded }])),
    unknown: mended.flatMap(({ word, isUnknown }) => (isUnknown ? [word.folded] : [])),
  };
}

const isGeneral = ({ folded }: ReadWord): boolean => GENERAL_WORDS.has(folded);

function mendAll(words: readonly ReadWord[], vocabulary: Vocabulary): readonly Mended[] {
  const nameWords = new Set([...vocabulary.places.keys()].flatMap((name) => name.split(' ')));
  let left = MOST_MENDED;
  return words.map((word) => {
    const as = { word, was: word.folded, isBeginning: false, isUnknown: false };
    if (isKnown(word, vocabulary) || nameWords.has(word.folded)) return as;
    const [whole] = wordsBeginning(word.folded, vocabulary);
    if (whole !== undefined) return { ...as, word: { ...word, folded: whole, stem: stem(whole) }, isBeginning: true };
    left -= 1;
    const [near] = left < 0 ? [] : nearWords(word.folded, vocabulary);
    return near === undefined ? { ...as, isUnknown: true } : { ...as, word: { ...word, folded: near, stem: stem(near) } };
  });
}

const isKnown = ({ folded, stem: own }: ReadWord, { stems }: Vocabulary): boolean =>
  folded.length < 4 ||
  /\p{N}/u.test(folded) ||
  STOP_WORDS.has(folded) ||
  GENERAL_WORDS.has(folded) ||
  stems.has(own) ||
  lexiconWords.has(own) ||
  compoundOf(folded).length > 0;

/** A run of words that means one thing, or names a place, or a word by itself. */
export type Unit = { readonly words: readonly ReadWord[]; readonly meaning: Meaning | null; readonly place: string | null };

const LONGEST_NAME = 6;
const NO_NAMES: Vocabulary['places'] = new Map();

/** The words of a question or a title as the things they mean. Stop words that belong to none are left out. */
export function unitsOf(words: readonly ReadWord[], vocabulary: Pick<Vocabulary, 'places'> | null): readonly Unit[] {
  const meanings = new Map(meaningsOf(words).map((meaning) => [meaning.from, meaning]));
  const places = vocabulary?.places ?? NO_NAMES;
  const units: Unit[] = [];
  for (let at = 0; at < words.length;) {
    const unit = unitAt(words, at, { meaning: meanings.get(at) ?? null, places });
    if (tells(unit)) units.push(unit);
    at += unit.words.length;
  }
  return units;
}

/** The longer of what begins here; a place where its name and a meaning are of one length. */
function unitAt(words: readonly ReadWord[], at: number, { meaning, places }: Pick<Unit, 'meaning'> & Pick<Vocabulary, 'places'>): Unit {
  const name = nameAt(words, at, places);
  return name !== null && name.to >= (meaning?.to ?? 0) ? named(words, at, name) : meant(words, at, meaning);
}

const named = (words: readonly ReadWord[], at: number, { code, to }: Name): Unit => ({
  words: words.slice(at, to),
  meaning: null,
  place: code,
});
const meant = (words: readonly ReadWord[], at: number, meaning: Meaning | null): Unit => ({
  words: words.slice(at, meaning?.to ?? at + 1),
  meaning,
  place: null,
});

const tells = ({ words, meaning, place }: Unit): boolean =>
  meaning !== null || place !== null || words.some(({ folded }) => !STOP_WORDS.has(folded));

type Name = { readonly code: string; readonly to: number };

function nameAt(words: readonly ReadWord[], from: number, places: Vocabulary['places']): Name | null {
  for (let to = Math.min(words.length, from + LONGEST_NAME); to > from; to -= 1) {
    const run = words.slice(from, to).map(({ folded }) => folded);
    const code = places.get(run.join(' '));
    // "in" and "no" are codes of places and words of every sentence.
    if (code !== undefined && !run.every((word) => STOP_WORDS.has(word) || word === 'no')) return { code, to };
  }
  return null;
}

function soughtIn({ words, meaning }: Unit, mended: readonly Mended[]): readonly Sought[] {
  if (meaning !== null) return [{ tokens: [conceptToken(meaning.concept)], prefix: null }];
  const [word] = words;
  if (word === undefined) return [];
  const token = wordToken(word.stem);
  const parts = compoundOf(word.folded);
  if (parts.length > 0) return parts.map((part) => ({ tokens: [conceptToken(part), token], prefix: null }));
  const begun = mended.find((one) => one.word === word && one.isBeginning);
  return [{ tokens: [token], prefix: begun?.was ?? null }];
}
