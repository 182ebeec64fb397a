import type { Said } from '@/lib/day-book/domain/told-line';
import { words } from '@/lib/kernel/words';

/** Inside a sentence. */
export const saidName = (said: Said): string =>
  said.kind === 'named' ? said.name : words(said.kind === 'steward' ? 'doubts.onRule.steward' : 'doubts.onRule.formerEditor');
