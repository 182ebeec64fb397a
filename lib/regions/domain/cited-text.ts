import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { foldText } from './region-search';
import type { Citation, Rule, Source, Term } from './rule';
import type { RegionKind, Sheet } from './sheet';

/** What of a sheet rests on a text: a rule or a term, with the place in the text it cites. */
export type Resting = {
  readonly place: { readonly code: string; readonly name: string };
  readonly id: string;
  readonly title: string;
  readonly citation: Citation;
} & ({ readonly kind: 'rule'; readonly strength: Rule['strength'] } | { readonly kind: 'term' });

/** A text that sheets cite. `address` is of its page: the sheet's code and the text's key in that sheet. */
export type CitedText = {
  readonly address: string;
  readonly source: Source;
  readonly resting: readonly Resting[];
  /** Sheets that name the text among their sources. */
  readonly places: readonly { readonly code: string; readonly name: string }[];
};

const PARTS = /^([a-z][a-z0-9]{1,9}(?:-[a-z0-9]{1,6})?)--([a-z0-9]+(?:-[a-z0-9]+)*)$/;

export const sourceAddress = (region: string, id: string): string => `${region}--${id}`;

/** The sheet and the key of an address such as "eu--reg-1935-2004"; null for anything else. */
export function readSourceAddress(address: string): { readonly region: string; readonly id: string } | null {
  const [, region, id] = PARTS.exec(address) ?? [];
  return region === undefined || id === undefined ? null : { region, id };
}

/** How well a text is known: read for one claim at least, or never; `on` is the day where it was kept. */
export type Reading = { readonly state: 'read' | 'not-read'; readonly on: CalendarDate | null };

/** Whether the text was read for any claim that rests on it. Where nothing rests on it, the day it was seen tells. */
export function readingOf({ source: { seenOn }, resting }: Pick<CitedText, 'source' | 'resting'>): Reading {
  const isRead = resting.length === 0 ? seenOn !== undefined : resting.some(({ citation }) => citation.evidence === 'read');
  return isRead ? { state: 'read', on: seenOn ?? null } : { state: 'not-read', on: null };
}

/** What is only said has an entry of its own among the sources; it is no text. */
const isText = ({ resting }: Pick<CitedText, 'resting'>): boolean =>
  resting.length === 0 || resting.some(({ citation }) => citation.standing !== 'common-practice');

/** Two entries are one text when they are at one address, or without one have the same title and publisher. */
const keyOf = ({ title, publisher, identifier = '', url = '' }: Source): string =>
  url === ''
    ? JSON.stringify([foldText(title), foldText(publisher), identifier])
    : JSON.stringify([url.replace(/\/$/, ''), foldText(title)]);

/** A text is at home in the widest of the sheets that name it. */
const WIDEST_FIRST: readonly RegionKind[] = ['bloc', 'country', 'part', 'standard', 'base'];

/** Every text that some sheets cite, each once under the widest sheet that names it, by title. */
export function citedTexts(sheets: readonly Sheet[], collator: Intl.Collator): readonly CitedText[] {
  const texts = new Map<string, CitedText>();
  for (const sheet of sheets.toSorted((a, b) => WIDEST_FIRST.indexOf(a.kind) - WIDEST_FIRST.indexOf(b.kind))) {
    for (const source of sheet.sources) {
      const key = keyOf(source);
      texts.set(key, joined(texts.get(key), textIn(sheet, source)));
    }
  }
  const order = (a: CitedText, b: CitedText): number =>
    collator.compare(a.source.title, b.source.title) || (a.address < b.address ? -1 : 1);
  return [...texts.values()].filter(isText).sort(order);
}

const textIn = (sheet: Sheet, source: Source): CitedText => ({
  address: sourceAddress(sheet.code, source.id),
  source,
  resting: restingOn(sheet, source.id),
  places: [{ code: sheet.code, name: sheet.name }],
});

/** The same text in one more sheet, or under one more key of the same one. */
function joined(known: CitedText | undefined, more: CitedText): CitedText {
  if (known === undefined) return more;
  const places = new Map([...known.places, ...more.places].map((place) => [place.code, place]));
  return { ...known, resting: [...known.resting, ...more.resting], places: [...places.values()] };
}

/** The text of that key in that sheet, with all that rests on it anywhere. Null where there is none. */
export function findText(sheets: readonly Sheet[], { region, id }: { readonly region: string; readonly id: string }): CitedText | null {
  const source = sheets.find(({ code }) => code === region)?.sources.find((one) => one.id === id);
  if (source === undefined) return null;
  const key = keyOf(source);
  const same = sheets.flatMap((sheet) => sheet.sources.filter((one) => keyOf(one) === key).map((one) => textIn(sheet, one)));
  const [first, ...others] = same;
  return first === undefined ? null : { ...others.reduce(joined, first), address: sourceAddress(region, id), source };
}

function restingOn(sheet: Sheet, source: string): readonly Resting[] {
  const place = { code: sheet.code, name: sheet.name };
  const uses = (item: Rule | Term): readonly Citation[] => item.sources.filter((citation) => citation.source === source);
  const rules = sheet.rules.flatMap((rule) =>
    uses(rule).map((citation): Resting => ({ kind: 'rule', place, id: rule.id, title: rule.title, strength: rule.strength, citation })),
  );
  const terms = sheet.terms.flatMap((term) =>
    uses(term).map((citation): Resting => ({ kind: 'term', place, id: term.id, title: term.name, citation })),
  );
  return [...rules, ...terms];
}

/** Texts of whose title, publisher, identifier or places each word asked for begins a word. No words find all. */
export function searchTexts(texts: readonly CitedText[], asked: string): readonly CitedText[] {
  const sought = foldText(asked)
    .split(' ')
    .filter((word) => word !== '');
  return texts.filter(({ source: { title, publisher, identifier = '' }, places }) => {
    const known = foldText([title, publisher, identifier, ...places.map(({ name }) => name)].join(' ')).split(' ');
    return sought.every((word) => known.some((own) => own.startsWith(word)));
  });
}
