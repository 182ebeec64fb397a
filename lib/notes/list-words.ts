import 'server-only';
import terms from '@/content/words/terms.json';
import type { WordEntry } from './domain/word';
import { wordEntries } from './schema';

let kept: readonly WordEntry[] | null = null;

/** The word list, in the order of its file. */
export function listWords(): readonly WordEntry[] {
  kept ??= wordEntries.parse(terms);
  return kept;
}
