import { createTranslator } from 'use-intl/core';
import accounts from '@/content/messages/en/accounts.json';
import amend from '@/content/messages/en/amend.json';
import doubts from '@/content/messages/en/doubts.json';
import files from '@/content/messages/en/files.json';
import review from '@/content/messages/en/review.json';
import bench from '@/content/messages/en/bench.json';
import broken from '@/content/messages/en/broken.json';
import checks from '@/content/messages/en/checks.json';
import dayBook from '@/content/messages/en/day-book.json';
import editions from '@/content/messages/en/editions.json';
import coverage from '@/content/messages/en/coverage.json';
import heard from '@/content/messages/en/heard.json';
import home from '@/content/messages/en/home.json';
import library from '@/content/messages/en/library.json';
import measures from '@/content/messages/en/measures.json';
import notes from '@/content/messages/en/notes.json';
import pieces from '@/content/messages/en/pieces.json';
import problems from '@/content/messages/en/problems.json';
import questions from '@/content/messages/en/questions.json';
import readings from '@/content/messages/en/readings.json';
import readingsPage from '@/content/messages/en/readings-page.json';
import regions from '@/content/messages/en/regions.json';
import search from '@/content/messages/en/search.json';
import sheetChecks from '@/content/messages/en/sheet-checks.json';
import site from '@/content/messages/en/site.json';
import stewards from '@/content/messages/en/stewards.json';

/** The one language there is so far. British, so that dates read "31 December". */
export const LOCALE = 'en-GB';

/** Every message of the interface, by file name. A file that is added joins here. */
export const MESSAGES = {
  accounts,
  amend,
  doubts,
  files,
  review,
  bench,
  broken,
  checks,
  'day-book': dayBook,
  editions,
  coverage,
  heard,
  home,
  library,
  measures,
  notes,
  pieces,
  problems,
  questions,
  readings,
  'readings-page': readingsPage,
  regions,
  search,
  'sheet-checks': sheetChecks,
  site,
  stewards,
};

/** `words('home.title')`. A key that does not exist is no valid program; a message that cannot be formatted throws. */
export const words = createTranslator({
  locale: LOCALE,
  messages: MESSAGES,
  timeZone: 'UTC',
  onError(error) {
    throw error;
  },
});

const said = new Map<string, string | null>();

/** The message at an address put together at run time ("questions.depth-mm.title"). It takes no arguments. Null where there is none. */
export function wordsAt(address: string): string | null {
  const found = said.get(address);
  if (found !== undefined) return found;
  const text = address
    .split('.')
    .reduce<unknown>((at, key) => (typeof at === 'object' && at !== null ? Reflect.get(at, key) : undefined), MESSAGES);
  const made = typeof text === 'string' ? createTranslator({ locale: LOCALE, messages: { text } })('text') : null;
  said.set(address, made);
  return made;
}
