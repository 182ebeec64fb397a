import type { CalendarDate } from '@/lib/kernel/calendar-date';

/** What a note is about, in the order the list of notes shows it. */
export const NOTE_TOPICS = ['surface', 'metals', 'clay-and-firing', 'testing', 'use', 'selling'] as const;
export type NoteTopic = (typeof NOTE_TOPICS)[number];

/** The front matter of a studio note. */
export type NoteHead = {
  readonly title: string;
  readonly slug: string;
  /** The short answer, in plain text. */
  readonly summary: string;
  readonly topics: readonly NoteTopic[];
  /** Codes of the regions it speaks of by name; none where it speaks of pots anywhere. */
  readonly places: readonly string[];
  readonly lookAgainBy: CalendarDate;
  /** Other words it is looked for by, in any language. */
  readonly synonyms: readonly string[];
};

export type Note = NoteHead & {
  /** The text below the front matter, in MDX. */
  readonly body: string;
};

/** A fact of the researched packs, or a rule of a region sheet, that a note cites. */
export type Cited = { readonly kind: 'fact' | 'rule'; readonly id: string };

const CITATION = /<(Fact|Rule)\s+id="([^"]+)"/g;
const HEADING = /^## +(.+)$/gm;
const NOTE_LINK = /\]\(\/notes\/([a-z0-9-]+)/g;
const TERM = /<Term\s+id="([^"]+)"/g;
const DRAWING = /<Drawing\s+of="([^"]+)"/g;
const CHECK = /<Check\s+question="([^"]+)"\s+answer="([^"]+)"/g;

const distinct = <Item>(items: readonly Item[], keyOf: (item: Item) => string): readonly Item[] => [
  ...new Map(items.map((item) => [keyOf(item), item])).values(),
];
const firstsOf = (body: string, pattern: RegExp): readonly string[] => [...new Set([...body.matchAll(pattern)].map(([, one = '']) => one))];

/** Everything a body cites, in the order of its first citation, each once. */
export function citedIn(body: string): readonly Cited[] {
  const all = [...body.matchAll(CITATION)].map(([, tag, id = '']): Cited => ({ kind: tag === 'Fact' ? 'fact' : 'rule', id }));
  return distinct(all, ({ kind, id }) => `${kind} ${id}`);
}

/** A heading as part of an address: "Why it can come weeks later" as "why-it-can-come-weeks-later". */
export const headingId = (text: string): string =>
  text
    .toLowerCase()
    .normalize('NFKD')
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-+|-+$/g, '');

export type Heading = { readonly id: string; readonly text: string };

/** The headings below the title, for a list of contents. */
export const headingsIn = (body: string): readonly Heading[] =>
  [...body.matchAll(HEADING)].map(([, text = '']) => ({ id: headingId(text.trim()), text: text.trim() }));

/** Slugs of the notes that a body links to. */
export const linkedNotes = (body: string): readonly string[] => firstsOf(body, NOTE_LINK);

/** Slugs of the words that a body links to in the word list. */
export const termsIn = (body: string): readonly string[] => firstsOf(body, TERM);

/** Names of the drawings in a body. */
export const drawingsIn = (body: string): readonly string[] => firstsOf(body, DRAWING);

/** The questions a body leads to, each with the answer it speaks of. */
export const checksIn = (body: string): readonly { readonly question: string; readonly answer: string }[] =>
  [...body.matchAll(CHECK)].map(([, question = '', answer = '']) => ({ question, answer }));
