import { z } from 'zod';
import { parseCalendarDate, type CalendarDate } from '@/lib/kernel/calendar-date';
import { SEARCH_KINDS, type Candidate } from '@/lib/search/domain/entry';

const listed = (mark: string): z.ZodType<readonly string[], string> =>
  z.string().transform((text): readonly string[] => (text === '' ? [] : text.split(mark)));
const day = z
  .string()
  .nullable()
  .transform((text): CalendarDate | null => (text === null ? null : parseCalendarDate(text)));

export const searchTextRow = z.object({ title: z.string(), also: listed('\n'), text: z.string() });

export const candidateRow = z
  .object({
    kind: z.enum(SEARCH_KINDS),
    region: z.string(),
    slug: z.string(),
    edition_number: z.number(),
    title: z.string(),
    also: listed('\n'),
    strength: z.enum(['must', 'should', 'may', 'note']).nullable(),
    valid_from: day,
    valid_to: day,
    look_again_by: day,
    places: listed(' '),
    score: z.number(),
  })
  .transform(({ edition_number: edition, valid_from: from, valid_to: to, look_again_by: lookAgainBy, ...row }): Candidate => ({
    ...row,
    edition,
    from,
    to,
    lookAgainBy,
  }));

export const keyedTextRow = z.object({ kind: z.enum(SEARCH_KINDS), region: z.string(), slug: z.string(), text: z.string() });
export const knownWordRow = z.object({ word: z.string(), uses: z.number() });
export const regionNamesRow = z.object({ slug: z.string(), title: z.string(), also: listed('\n') });
export const revisionRow = z.object({ revision: z.coerce.string() }).optional();
export const suggestionRow = z.object({
  kind: z.enum(SEARCH_KINDS),
  region: z.string(),
  slug: z.string(),
  title: z.string(),
  also: listed('\n'),
});
export const indexedRow = z.object({ kind: z.string(), slug: z.string(), all_words: z.string() });
