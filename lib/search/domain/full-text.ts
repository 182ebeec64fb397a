import { NO_PLACE, placeToken } from './index-words';
import type { Sought } from './query';

const ANY = /[^\p{L}\p{N}_]/gu;

/** A token holds letters, digits and low lines alone, so that no mark of the query language can stand in one. */
const clean = (token: string): string => token.replace(ANY, '').slice(0, 60);

/** One thing sought, in the language of boolean full text: any of its words. */
function oneOf({ tokens, prefix }: Sought): string {
  const words = [...tokens.map(clean), ...(prefix === null ? [] : [`${clean(prefix)}*`])].filter((word) => !/^\*?$/.test(word));
  return words.length > 1 ? `(${words.join(' ')})` : words.join('');
}

/** Entries that have all of it. */
export const allOf = (sought: readonly Sought[]): string =>
  sought
    .map(oneOf)
    .filter((said) => said !== '')
    .map((said) => `+${said}`)
    .join(' ');

/** Entries that have some of it. */
export const someOf = (sought: readonly Sought[]): string => sought.map(oneOf).join(' ').trim();

/** Entries that stand in one of these sheets; with `andNone` those that belong to no place as well. */
export function inPlaces(codes: readonly string[], andNone: boolean): string {
  const tokens = [...codes.map(placeToken), ...(andNone ? [NO_PLACE] : [])].map(clean);
  return `+(${tokens.join(' ')})`;
}
