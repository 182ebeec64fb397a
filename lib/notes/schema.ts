import { z } from 'zod';
import { calendarDate, regionCode, slug, words } from '@/lib/kernel/shapes';
import { NOTE_TOPICS, type NoteHead } from './domain/note';
import type { NoteFact } from './domain/note-sources';
import type { WordEntry } from './domain/word';

/** "a; b" as a list. */
const listed = (mark: string): z.ZodType<string[], string> =>
  z.string().transform((text) =>
    text
      .split(mark)
      .map((item) => item.trim())
      .filter((item) => item !== ''),
  );

/** The fields of a note's front matter, all of them texts. */
export const noteHead = z.strictObject({
  title: words.max(90),
  slug,
  summary: words.max(320),
  topics: listed(',').pipe(z.array(z.enum(NOTE_TOPICS)).min(1, 'A note stands under one topic at least')),
  places: listed(',').pipe(z.array(regionCode)),
  lookAgainBy: calendarDate,
  synonyms: listed(';').pipe(z.array(words.max(60)).max(40)),
}) satisfies z.ZodType<NoteHead>;

/** What content/notes/fact-sources.json holds of each cited fact, by its id in the packs. */
export const factSources = z.record(
  z.string(),
  z.strictObject({
    source: z.strictObject({
      title: words,
      publisher: words,
      identifier: words.optional(),
      locator: words.optional(),
      url: z.url({ protocol: /^https?$/ }).optional(),
      versionDate: words.optional(),
    }),
    evidence: z.enum(['read', 'memory', 'common-practice']),
    weak: z.boolean(),
  }),
) satisfies z.ZodType<Readonly<Record<string, NoteFact>>>;

/** The word list, content/words/terms.json. */
export const wordEntries = z.array(
  z.strictObject({
    slug,
    name: words.max(60),
    definition: words.max(600),
    also: z.record(z.string().regex(/^[a-z]{2}$/), z.array(words.max(60)).min(1)),
    see: z.array(slug),
  }),
) satisfies z.ZodType<readonly WordEntry[]>;
