import { z } from 'zod';
import { regionCode } from '@/lib/kernel/shapes';
import { words } from '@/lib/kernel/words';
import { SEARCH_KINDS } from './domain/entry';
import { LONGEST_QUERY } from './domain/query';

/** Entries a page of the site shows. */
export const PAGE = 20;
/** Entries that can be leafed through. */
export const MOST_FOUND = 200;

export type SearchQuery = {
  readonly q: string;
  readonly kind: (typeof SEARCH_KINDS)[number] | null;
  readonly region: string | null;
  /** How many entries come before the first one shown. */
  readonly offset: number;
  readonly limit: number;
};

const wholeNumber = (least: number, most: number): z.ZodType<number, string> =>
  z
    .string()
    .regex(/^\d{1,4}$/, words('search.fault.number', { least, most }))
    .transform(Number)
    .pipe(z.number().min(least, words('search.fault.number', { least, most })).max(most, words('search.fault.number', { least, most })));

/** An opaque mark of a place in a list: letters and digits of our own making. */
export const afterMark = z
  .string()
  .max(120)
  .transform((mark) => Buffer.from(mark, 'base64url').toString('utf8'));
export const markOf = (place: string): string => Buffer.from(place, 'utf8').toString('base64url');

/** What the API's search takes. Unknown fields are refused. */
export const searchParameters = z
  .strictObject({
    q: z
      .string()
      .min(1, words('search.fault.empty'))
      .max(LONGEST_QUERY, words('search.fault.long', { most: LONGEST_QUERY })),
    kind: z.enum(SEARCH_KINDS).optional(),
    region: regionCode.optional(),
    limit: wholeNumber(1, 100).optional(),
    after: afterMark.pipe(wholeNumber(0, MOST_FOUND)).optional(),
  })
  .transform(({ q, kind = null, region = null, limit = PAGE, after = 0 }): SearchQuery => ({ q, kind, region, limit, offset: after }));

/** What the API's list of notes takes. */
export const notesParameters = z
  .strictObject({ limit: wholeNumber(1, 100).optional(), after: afterMark.optional() })
  .transform(({ limit = 100, after = '' }) => ({ limit, after }));
