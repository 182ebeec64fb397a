import { createTranslator } from 'use-intl/core';
import broken from '@/content/messages/en/broken.json';
import checks from '@/content/messages/en/checks.json';
import home from '@/content/messages/en/home.json';
import measures from '@/content/messages/en/measures.json';
import pieces from '@/content/messages/en/pieces.json';
import problems from '@/content/messages/en/problems.json';
import questions from '@/content/messages/en/questions.json';
import readings from '@/content/messages/en/readings.json';
import readingsPage from '@/content/messages/en/readings-page.json';
import regions from '@/content/messages/en/regions.json';
import site from '@/content/messages/en/site.json';

/** The one language there is so far. British, so that dates read "31 December". */
export const LOCALE = 'en-GB';

/** Every message of the interface, by file name. A file that is added joins here. */
export const MESSAGES = {
  broken,
  checks,
  home,
  measures,
  pieces,
  problems,
  questions,
  readings,
  'readings-page': readingsPage,
  regions,
  site,
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
