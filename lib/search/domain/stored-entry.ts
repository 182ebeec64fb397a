import type { SearchEntry } from './entry';
import { indexWords, NO_PLACE, placeToken, vocabularyOf } from './index-words';

/** An entry with its words as the two indexes hold them, and those that a slip of the pen may be held against. */
export type StoredEntry = SearchEntry & {
  readonly headingWords: string;
  readonly allWords: string;
  readonly vocabulary: readonly string[];
};

/** An entry made ready for the index. Each word stands once: how often it is said tells little in texts this short. */
export function storedEntry(entry: SearchEntry): StoredEntry {
  const place = entry.region === '' ? NO_PLACE : placeToken(entry.region);
  const heading = [...new Set([...[entry.title, ...entry.also].flatMap(indexWords), place])];
  const all = new Set([...heading, ...indexWords(entry.text)]);
  return {
    ...entry,
    headingWords: heading.join(' '),
    allWords: [...all].join(' '),
    vocabulary: vocabularyOf([entry.title, ...entry.also, entry.text].join('\n')),
  };
}
