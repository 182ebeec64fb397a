import { QUESTIONS, type Question } from '@/lib/checks/domain/questions';
import { listIn, rowsIn, textIn, type Entry } from './entry';

/** How the parts of a block are joined; `unless`: none of them may be true. */
export const JOINS = ['all', 'any', 'unless'] as const;
export type Join = (typeof JOINS)[number];

/** What a whole condition can begin with: it applies always, or as a block says. */
export const ROOT_JOINS = ['always', ...JOINS] as const;
export type RootJoin = (typeof ROOT_JOINS)[number];

export const MOST_DEEP = 4;
export const MOST_LINES = 40;

/** A line as its form shows it. `question`: the id of one, or "term"; empty while nothing is chosen. */
export type EntryLine = {
  readonly kind: 'line';
  readonly path: string;
  readonly question: string;
  readonly by: string;
  readonly value: string;
  readonly unit: string;
  readonly values: readonly string[];
};
export type EntryBlock = { readonly kind: 'block'; readonly path: string; readonly join: Join; readonly parts: readonly EntryPart[] };
export type EntryPart = EntryLine | EntryBlock;
export type EntryRoot = { readonly join: RootJoin; readonly parts: readonly EntryPart[] };

/** The first field's name of a whole condition, and of all its parts. */
export const ROOT = 'when';

const isOneOf = <T extends string>(list: readonly T[], text: string): text is T => list.some((one) => one === text);

/** The tree of blocks and lines that an entry holds. Empty for an entry that says nothing of it. */
export function conditionIn(entry: Entry): EntryRoot {
  const join = textIn(entry, `${ROOT}.join`);
  return { join: isOneOf(ROOT_JOINS, join) ? join : 'all', parts: partsIn(entry, ROOT, 1) };
}

function partsIn(entry: Entry, path: string, depth: number): readonly EntryPart[] {
  return Array.from({ length: rowsIn(entry, path) }, (_, place) => `${path}.${String(place)}`).flatMap((at): readonly EntryPart[] => {
    const join = textIn(entry, `${at}.join`);
    if (isOneOf(JOINS, join)) return depth > 2 * MOST_DEEP ? [] : [{ kind: 'block', path: at, join, parts: partsIn(entry, at, depth + 1) }];
    return `${at}.question` in entry ? [lineIn(entry, at)] : [];
  });
}

const lineIn = (entry: Entry, path: string): EntryLine => ({
  kind: 'line',
  path,
  question: textIn(entry, `${path}.question`),
  by: textIn(entry, `${path}.by`),
  value: textIn(entry, `${path}.value`),
  unit: textIn(entry, `${path}.unit`),
  values: listIn(entry, `${path}.values`),
});

/** Lines in a tree; a tree may have 40. */
export const linesOf = (parts: readonly EntryPart[]): number =>
  parts.reduce((sum, part) => sum + (part.kind === 'line' ? 1 : linesOf(part.parts)), 0);

/** How many blocks a path is inside of: 1 for a part of the whole. */
export const depthOf = (path: string): number => path.split('.').length - 1;

const LIST: readonly Question[] = QUESTIONS;

/** What a line asks, in the terms of its form. */
export type Asked = { readonly kind: 'term' } | Question;
export const askedBy = (question: string): Asked | null =>
  question === 'term' ? { kind: 'term' } : (LIST.find(({ id }) => id === question) ?? null);

/** The ways a question of each kind can be asked, the usual first. */
export const WAYS = {
  yesno: ['yes', 'no'],
  choice: ['is', 'is-not'],
  several: ['is', 'is-not'],
  amount: ['le', 'lt', 'ge', 'gt'],
  money: ['le', 'lt', 'ge', 'gt'],
  region: ['within', 'not-within'],
  term: ['holds', 'holds-not'],
} as const satisfies Readonly<Record<Asked['kind'], readonly string[]>>;

export const waysOf = (asked: Asked): readonly string[] => WAYS[asked.kind];
