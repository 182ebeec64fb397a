import { z } from 'zod';
import { err, ok, type Result } from '@/lib/kernel/result';
import { words } from '@/lib/kernel/words';
import type { EntryValues } from './amendment-schema';
import { linesIn, rowsIn, textIn, type Entry } from './domain/entry';
import type { Source } from './domain/rule';
import type { Membership, Sheet } from './domain/sheet';
import { readItemKey, type ItemKey, type SheetItem } from './domain/sheet-items';
import { itemFaults } from './item-faults';
import { dateIn, readRule, readTerm, ruleFields, termFields, textOrNothing, type Raw } from './rule-form';
import { contact, membership, rule, source, term, trial } from './schema';
import { readTrial, writeTrial } from './trial-form';

/** By the name of a field; `form` for what belongs to none. */
export type ItemFaults = Readonly<Record<string, string>>;
type Read = Result<SheetItem, ItemFaults>;

/** Reads the form of one item. What a form does not show (ids, researched facts) is taken from the key and from the sheet. */
export function readItem(key: ItemKey, values: EntryValues, sheet: Sheet): Read {
  const { list, id } = readItemKey(key) ?? { list: 'text' as const, id: '' };
  switch (list) {
    case 'rules':
      return parsed(rule, readRule(values, { id, sheet }), (value) => ({ list, value }));
    case 'terms':
      return parsed(term, readTerm(values, { id, sheet }), (value) => ({ list, value }));
    case 'sources':
      return parsed(source, { value: sourceFields(values, id) }, (value) => ({ list, value }));
    case 'trials':
      return readTrialPiece(values, id);
    case 'memberships':
      return parsed(membership, { value: membershipFields(values, id) }, (value) => ({ list, value }));
    case 'authorities':
    case 'accreditation':
      return parsed(contact, { value: contactFields(values) }, (value) => ({ list, value }));
    case 'place':
      return readPlace(values);
    case 'text':
      return parsed(z.string().min(1), { value: textIn(values, 'text') }, (value) => ({ list, value }), 'text');
    case 'gaps':
      return ok({ list, value: linesIn(values, 'gaps') });
  }
}

/** Both what the form itself finds missing and what the schema refuses; the form's own words come first. */
function parsed<T>(schema: z.ZodType<T>, { value, faults = {} }: Raw, made: (value: T) => SheetItem, field?: string): Read {
  const read = schema.safeParse(value);
  const found = read.success ? {} : field === undefined ? itemFaults(read.error.issues) : { [field]: words('amend.fault.needed') };
  const all = { ...withoutCovered(found, faults), ...faults };
  return read.success && Object.keys(all).length === 0 ? ok(made(read.data)) : err(all);
}

/** A missing part makes the whole around it wrong: what the form has said in detail is not said again in general. */
function withoutCovered(found: ItemFaults, faults: ItemFaults): ItemFaults {
  const own = Object.keys(faults);
  const isCovered = (name: string): boolean => own.some((one) => one.split('.')[0] === name.split('.')[0]);
  return Object.fromEntries(Object.entries(found).filter(([name]) => !isCovered(name) || name.startsWith('sources.')));
}

function readTrialPiece(values: Entry, id: string): Read {
  const { value, faults } = readTrial(values);
  return parsed(trial, { value: { id, ...value }, faults }, (read) => ({ list: 'trials', value: read }));
}

function readPlace(values: Entry): Read {
  const value = { name: textIn(values, 'name'), kind: textIn(values, 'kind'), languages: wordsIn(values, 'languages') };
  return parsed(place, { value }, (read) => ({ list: 'place', value: read }));
}

const place = z.strictObject({
  name: z.string().min(1).max(200),
  kind: z.enum(['bloc', 'country', 'part', 'standard', 'base']),
  languages: z.array(z.string().regex(/^[a-z]{2,3}(-[A-Za-z0-9]{2,8})*$/, { error: () => words('amend.fault.languages') })),
});

const wordsIn = (values: Entry, name: string): readonly string[] =>
  textIn(values, name)
    .split(/[\s,]+/)
    .filter((one) => one !== '');

const SOURCE_TEXTS = ['identifier', 'url', 'versionDate', 'seenOn', 'seenVia'] as const;

function sourceFields(values: Entry, id: string): unknown {
  const texts = Object.fromEntries(SOURCE_TEXTS.flatMap((name) => Object.entries(textOrNothing(values, name))));
  return { id, title: textIn(values, 'title'), publisher: textIn(values, 'publisher'), ...texts, ...fingerprintIn(values) };
}

/** "<sha256> <media type> <bytes>", as the page attached to a source is written into its form. */
function fingerprintIn(values: Entry): Readonly<Record<string, unknown>> {
  const [sha256 = '', type = '', bytes = ''] = textIn(values, 'fingerprint').split(' ');
  return sha256 === '' ? {} : { fingerprint: { sha256, type, bytes: Number(bytes) } };
}

/** What the form of a source says of the page kept with it. */
export const fingerprintText = ({ sha256, type, bytes }: NonNullable<Source['fingerprint']>): string =>
  `${sha256} ${type} ${String(bytes)}`;

function membershipFields(values: Entry, parent: string): unknown {
  const except = Array.from({ length: rowsIn(values, 'except') }, (_, row) => `except.${String(row)}`)
    .map((at) => ({ rule: textIn(values, `${at}.rule`), why: textIn(values, `${at}.why`) }))
    .filter((one) => one.rule !== '' || one.why !== '');
  return { parent, from: dateIn(values, 'from'), to: dateIn(values, 'to'), except };
}

function contactFields(values: Entry): unknown {
  return { name: textIn(values, 'name'), url: dateIn(values, 'url'), role: textIn(values, 'role'), evidence: textIn(values, 'evidence') };
}

/** The form of an item as it stands: read again, it is that item. */
export function writeItem(item: SheetItem): EntryValues {
  return plain(fieldsOf(item));
}

/** Lists that a form may change are lists of its own. */
const plain = (entry: Entry): EntryValues =>
  Object.fromEntries(
    Object.entries(entry).map(([name, value]): [string, string | string[]] => [name, typeof value === 'string' ? value : [...value]]),
  );

function fieldsOf(item: SheetItem): Entry {
  switch (item.list) {
    case 'rules':
      return ruleFields(item.value);
    case 'terms':
      return termFields(item.value);
    case 'sources': {
      const { fingerprint, id: _, ...texts } = item.value;
      return { ...texts, ...(fingerprint === undefined ? {} : { fingerprint: fingerprintText(fingerprint) }) };
    }
    case 'trials':
      return writeTrial(item.value);
    case 'memberships':
      return writeMembership(item.value);
    case 'authorities':
    case 'accreditation': {
      const { name, url, role, evidence } = item.value;
      return { name, url: url ?? '', role, evidence };
    }
    case 'place':
      return { name: item.value.name, kind: item.value.kind, languages: item.value.languages.join(', ') };
    case 'text':
      return { text: item.value };
    case 'gaps':
      return { gaps: item.value.join('\n') };
  }
}

function writeMembership({ from, to, except }: Membership): Entry {
  const left = except.flatMap(({ rule: left, why }, row): readonly (readonly [string, string])[] => [
    [`except.${String(row)}.rule`, left],
    [`except.${String(row)}.why`, why],
  ]);
  return { from: from ?? '', to: to ?? '', ...Object.fromEntries(left) };
}
