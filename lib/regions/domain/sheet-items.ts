import type { Rule, Source, Term } from './rule';
import type { Contact, Membership, Sheet } from './sheet';
import type { Trial } from './trial';

/** The lists of a sheet whose members one writes one by one. */
export const ITEM_LISTS = ['rules', 'terms', 'sources', 'trials', 'memberships', 'authorities', 'accreditation'] as const;
export type ItemList = (typeof ITEM_LISTS)[number];

/** What is there once: the place itself, its text, and what was not found. */
export const WHOLE_ITEMS = ['place', 'text', 'gaps'] as const;
export type WholeItem = (typeof WHOLE_ITEMS)[number];

/** Where something stands in a sheet: `rules/dk-register`, `text`. Members of lists go by their id, contacts by their place from 1 on. */
export type ItemKey = WholeItem | `${ItemList}/${string}`;

export type Place = Pick<Sheet, 'name' | 'kind' | 'languages'>;

/** A part of a sheet as its form writes it. */
export type SheetItem =
  | { readonly list: 'rules'; readonly value: Rule }
  | { readonly list: 'terms'; readonly value: Term }
  | { readonly list: 'sources'; readonly value: Source }
  | { readonly list: 'trials'; readonly value: Trial }
  | { readonly list: 'memberships'; readonly value: Membership }
  | { readonly list: 'authorities' | 'accreditation'; readonly value: Contact }
  | { readonly list: 'place'; readonly value: Place }
  | { readonly list: 'text'; readonly value: string }
  | { readonly list: 'gaps'; readonly value: readonly string[] };

const SHAPE = /^(?<list>[a-z]+)\/(?<id>[a-z0-9][a-z0-9-]{0,99})$/;

/** The key in parts; null for what is none. */
export function readItemKey(key: string): { readonly list: ItemList | WholeItem; readonly id: string } | null {
  const whole = WHOLE_ITEMS.find((item) => item === key);
  if (whole !== undefined) return { list: whole, id: '' };
  const parts = SHAPE.exec(key)?.groups;
  const list = ITEM_LISTS.find((name) => name === parts?.['list']);
  return list === undefined || parts?.['id'] === undefined ? null : { list, id: parts['id'] };
}

export const isItemKey = (key: string): key is ItemKey => readItemKey(key) !== null;

/** The key of a member of a list. */
export const keyIn = (list: ItemList, id: string): ItemKey => `${list}/${id}`;

/** The part of a sheet under a key; null where there is none. */
export function itemOf(sheet: Sheet, key: ItemKey): SheetItem | null {
  const read = readItemKey(key);
  if (read === null) return null;
  const { list, id } = read;
  switch (list) {
    case 'place':
      return { list, value: { name: sheet.name, kind: sheet.kind, languages: sheet.languages } };
    case 'text':
      return { list, value: sheet.text };
    case 'gaps':
      return { list, value: sheet.gaps };
    case 'rules':
      return found(
        list,
        sheet.rules.find((rule) => rule.id === id),
      );
    case 'terms':
      return found(
        list,
        sheet.terms.find((term) => term.id === id),
      );
    case 'sources':
      return found(
        list,
        sheet.sources.find((source) => source.id === id),
      );
    case 'trials':
      return found(
        list,
        sheet.trials.find((trial) => trial.id === id),
      );
    case 'memberships':
      return found(
        list,
        sheet.memberships.find(({ parent }) => parent === id),
      );
    case 'authorities':
    case 'accreditation':
      return found(list, sheet[list][Number(id) - 1]);
  }
}

function found<L extends SheetItem['list'], V>(list: L, value: V | undefined): { readonly list: L; readonly value: V } | null {
  return value === undefined ? null : { list, value };
}

/** The sheet with that part put in, in its old place when it had one, else at the end of its list. */
export function withItem(sheet: Sheet, key: ItemKey, item: SheetItem): Sheet {
  const id = readItemKey(key)?.id ?? '';
  switch (item.list) {
    case 'place':
      return { ...sheet, ...item.value };
    case 'text':
      return { ...sheet, text: item.value };
    case 'gaps':
      return { ...sheet, gaps: item.value };
    case 'rules':
      return { ...sheet, rules: put(sheet.rules, item.value, (one) => one.id === id) };
    case 'terms':
      return { ...sheet, terms: put(sheet.terms, item.value, (one) => one.id === id) };
    case 'sources':
      return { ...sheet, sources: put(sheet.sources, item.value, (one) => one.id === id) };
    case 'trials':
      return { ...sheet, trials: put(sheet.trials, item.value, (one) => one.id === id) };
    case 'memberships':
      return { ...sheet, memberships: put(sheet.memberships, item.value, ({ parent }) => parent === id) };
    case 'authorities':
    case 'accreditation':
      return { ...sheet, [item.list]: put(sheet[item.list], item.value, (_, at) => at === Number(id) - 1) };
  }
}

function put<T>(list: readonly T[], value: T, isIt: (one: T, at: number) => boolean): readonly T[] {
  const at = list.findIndex(isIt);
  return at === -1 ? [...list, value] : list.with(at, value);
}

/** The sheet without that member of a list; what is there once cannot be taken out. */
export function withoutItem(sheet: Sheet, key: ItemKey): Sheet {
  const read = readItemKey(key);
  if (read === null) return sheet;
  const { list, id } = read;
  switch (list) {
    case 'place':
    case 'text':
    case 'gaps':
      return sheet;
    case 'memberships':
      return { ...sheet, memberships: sheet.memberships.filter(({ parent }) => parent !== id) };
    case 'authorities':
    case 'accreditation':
      return { ...sheet, [list]: sheet[list].filter((_, at) => at !== Number(id) - 1) };
    case 'rules':
    case 'terms':
    case 'sources':
    case 'trials':
      return { ...sheet, [list]: sheet[list].filter((one) => one.id !== id) };
  }
}

/** A sheet of a place with nothing in it yet. */
export const emptySheet = (code: string, name: string, kind: Sheet['kind']): Sheet => ({
  code,
  name,
  kind,
  languages: [],
  memberships: [],
  text: '',
  textFacts: [],
  authorities: [],
  accreditation: [],
  gaps: [],
  sources: [],
  terms: [],
  rules: [],
  trials: [],
  leftOut: [],
});
