import { compoundOf, meaningsOf, type Concept } from './lexicon';
import { readWords, type ReadWord } from './read-words';

/** The database leaves out words of one letter, and of two where it is set so; with these it never does. */
const PAD = '__';

/** A word as it stands in the index. */
export const wordToken = (stem: string): string => (stem.length < 3 ? `${stem}${PAD}` : stem);
/** A thing as it stands in the index, whatever word was used for it. */
export const conceptToken = ({ id }: Pick<Concept, 'id'>): string => `xc${id.replaceAll('-', '')}`;
/** A place as it stands in the index. */
export const placeToken = (code: string): string => `xr${code.replaceAll('-', '')}`;
/** What belongs to no place. */
export const NO_PLACE = placeToken('none');

/** A text as the index holds it: its words, each brought to its stem, and the things they mean. */
export function indexWords(text: string): readonly string[] {
  return tokensOf(readWords(text));
}

/** The same of words that were read already. */
export function tokensOf(words: readonly ReadWord[]): readonly string[] {
  const meant = meaningsOf(words).map(({ concept }) => conceptToken(concept));
  const parts = words.flatMap(({ folded }) => compoundOf(folded).map(conceptToken));
  return [...words.map((word) => wordToken(word.stem)), ...meant, ...parts];
}

/** Words of a text that a slip of the pen may be held against: letters only, each once. */
export function vocabularyOf(text: string): readonly string[] {
  const words = readWords(text).map(({ folded }) => folded);
  return [...new Set(words)].filter((word) => word.length > 2 && !/\p{N}/u.test(word));
}
