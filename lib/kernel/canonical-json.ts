export type Json = null | boolean | number | string | readonly Json[] | { readonly [key: string]: Json };

/**
 * One text for one value: members sorted by UTF-16 code units, no white space, numbers as ECMAScript writes them (RFC 8785).
 * Throws for what JSON cannot hold (NaN, infinities).
 */
export function canonicalJson(value: Json): string {
  if (typeof value === 'number' && !Number.isFinite(value)) throw new RangeError('JSON has no such number');
  if (value === null || typeof value !== 'object') return JSON.stringify(value);
  if (isList(value)) return `[${value.map(canonicalJson).join(',')}]`;
  const members = Object.entries(value).sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0));
  return `{${members.map(([key, member]) => `${JSON.stringify(key)}:${canonicalJson(member)}`).join(',')}}`;
}

const isList = (value: Json): value is readonly Json[] => Array.isArray(value);
