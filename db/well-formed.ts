import { canonicalJson, type Json } from '@/lib/kernel/canonical-json';

/** Text as the database gives it back: half of a surrogate pair is no character, and becomes the sign for one that is missing. */
export const wellFormed = (text: string): string => Buffer.from(text, 'utf8').toString('utf8');

/** The same for every text in a JSON value. */
export function wellFormedJson(value: Json): Json {
  if (typeof value === 'string') return wellFormed(value);
  if (value === null || typeof value !== 'object') return value;
  if (isList(value)) return value.map(wellFormedJson);
  return Object.fromEntries(Object.entries(value).map(([key, member]) => [wellFormed(key), wellFormedJson(member)]));
}

const isList = (value: Json): value is readonly Json[] => Array.isArray(value);

/** The canonical text of a value in a form that MariaDB takes for JSON: it refuses half a surrogate pair. */
export const storedJson = (value: Json): string => canonicalJson(wellFormedJson(value));
