import { MESSAGES } from '@/lib/kernel/words';
import { namesOfPlace } from '@/lib/regions/domain/place-names';
import type { Rule, Source } from '@/lib/regions/domain/rule';
import type { Sheet } from '@/lib/regions/domain/sheet';
import type { SearchEntry } from './entry';
import { placeNicknames } from './lexicon';

/** What a reader finds of a sheet: the sheet itself, its rules, the words it defines for them, and the texts they rest on. */
export function sheetEntries(sheet: Sheet, edition: number): readonly SearchEntry[] {
  const of = { ...BARE, region: sheet.code, edition };
  return [
    { ...of, kind: 'region', slug: sheet.code, title: sheet.name, also: namesOf(sheet), text: plain([sheet.text, ...sheet.gaps]) },
    ...sheet.rules.map((rule): SearchEntry => ({ ...of, ...ruleParts(rule) })),
    ...sheet.terms.map(({ id, name, says, from, to }): SearchEntry => ({
      ...of,
      kind: 'term',
      slug: id,
      title: name,
      text: plain([says]),
      from,
      to,
    })),
    ...sheet.sources.filter(({ id }) => id !== NO_TEXT).map((source): SearchEntry => ({ ...of, ...sourceParts(source) })),
  ];
}

const BARE = { also: [], strength: null, from: null, to: null, lookAgainBy: null, places: [] } as const;
/** What is only said has an entry of its own among the sources; there is nothing to find in it. */
const NO_TEXT = 'common-practice';

const LANGUAGES = ['de', 'da', 'fr'];

function namesOf({ code, name, languages }: Sheet): readonly string[] {
  const kept: Readonly<Record<string, string>> = MESSAGES.regions.alsoCalled;
  const also = [...(placeNicknames[code] ?? []), ...(kept[code] === undefined ? [] : [kept[code]]), code];
  return namesOfPlace(code, { languages: [...LANGUAGES, ...languages], also }).filter((other) => other !== name);
}

function ruleParts({ id, title, says, note, payload, strength, from, to, lookAgainBy }: Rule): Partial<SearchEntry> & EntryHead {
  const text = plain([says, ...textsIn(payload), note ?? '']);
  const also = payload.topic === 'limit' ? [payload.substance] : [];
  return { kind: 'rule', slug: id, title, also, text, strength, from, to, lookAgainBy };
}

function sourceParts({ id, title, publisher, identifier = '', versionDate = '' }: Source): Partial<SearchEntry> & EntryHead {
  return {
    kind: 'source',
    slug: id,
    title,
    also: identifier === '' ? [] : [identifier],
    text: plain([publisher, identifier, versionDate]),
  };
}

type EntryHead = Pick<SearchEntry, 'kind' | 'slug' | 'title' | 'text'>;

/** The words in a payload, exact ones of labels among them; its codes, units and addresses are none. */
function textsIn(payload: Rule['payload']): readonly string[] {
  const exact = payload.topic === 'label' ? Object.values(payload.words ?? {}) : [];
  const own = Object.entries(payload).flatMap(([field, value]) => (typeof value === 'string' && !CODES.has(field) ? [value] : []));
  const fields = payload.topic === 'paper' ? (payload.fields ?? []) : [];
  return [...own, ...exact, ...fields].map((text) => (/[.!?]$/.test(text) ? text : `${text}.`));
}

const CODES = new Set(['topic', 'substance', 'part', 'per', 'link', 'currency', 'light', 'asOf', 'symbol']);

/** Markdown's marks taken off, as a reader would read it aloud. */
const plain = (texts: readonly string[]): string =>
  texts
    .filter((text) => text !== '')
    .join('\n')
    .replace(/\[([^\]\n]*)\]\([^)\n]*\)/g, '$1')
    .replace(/^#{1,6} +|^[-*] +|\*\*/gm, '');
