import { numberIn, readCondition, writeCondition } from './condition-form';
import { rowsIn, textIn, type Entry } from './domain/entry';
import type { Citation, Rule, Term } from './domain/rule';
import type { Sheet } from './domain/sheet';
import { readPayload, writePayload } from './payload-form';

/** An item as a form has it, not parsed yet, and what the form itself finds missing. */
export type Raw = { readonly value: unknown; readonly faults?: Readonly<Record<string, string>> };

type Where = { readonly id: string; readonly sheet: Sheet };

/** Reads the form of a rule. */
export function readRule(values: Entry, { id, sheet }: Where): Raw {
  const when = readCondition(values);
  const payload = readPayload(values);
  const before = sheet.rules.find((one) => one.id === id);
  const sources = citations(values);
  const order = numberIn(textIn(values, 'order'));
  const value = {
    id,
    region: sheet.code,
    kind: textIn(values, 'kind'),
    targets: rowTexts(values, 'targets'),
    alongside: rowTexts(values, 'alongside'),
    when: when.value,
    from: dateIn(values, 'from'),
    to: dateIn(values, 'to'),
    order: order ?? nextOrder(sheet),
    firm: textIn(values, 'firm') === 'yes',
    strength: textIn(values, 'strength'),
    standing: sources[0]?.standing ?? '',
    title: textIn(values, 'title'),
    says: textIn(values, 'says'),
    payload: payload.value,
    sources,
    facts: before?.facts ?? [],
    lookAgainBy: textIn(values, 'lookAgainBy'),
    ...textOrNothing(values, 'note'),
  };
  return { value, faults: { ...when.faults, ...payload.faults } };
}

/** Reads the form of a word that rules use. */
export function readTerm(values: Entry, { id, sheet }: Where): Raw {
  const when = readCondition(values);
  const value = {
    id,
    region: sheet.code,
    name: textIn(values, 'name'),
    says: textIn(values, 'says'),
    category: textIn(values, 'category') === 'yes',
    when: when.value,
    from: dateIn(values, 'from'),
    to: dateIn(values, 'to'),
    sources: citations(values),
    facts: sheet.terms.find((one) => one.id === id)?.facts ?? [],
  };
  return { value, faults: when.faults };
}

export const dateIn = (values: Entry, name: string): string | null => (textIn(values, name) === '' ? null : textIn(values, name));

/** `{ name: text }`, or nothing where the field is empty. */
export const textOrNothing = (values: Entry, name: string, as = name): Readonly<Record<string, string>> =>
  textIn(values, name) === '' ? {} : { [as]: textIn(values, name) };

/** The filled rows of a list of plain fields, `targets.0`, `targets.1`. */
const rowTexts = (values: Entry, list: string): readonly string[] =>
  Array.from({ length: rowsIn(values, list) }, (_, row) => textIn(values, `${list}.${String(row)}`)).filter((text) => text !== '');

type RawCitation = Readonly<Record<string, string>> & { readonly standing: string };

function citations(values: Entry): readonly RawCitation[] {
  return Array.from({ length: rowsIn(values, 'sources') }, (_, row) => `sources.${String(row)}`).map((at) => ({
    source: textIn(values, `${at}.source`),
    standing: textIn(values, `${at}.standing`),
    evidence: textIn(values, `${at}.evidence`),
    ...textOrNothing(values, `${at}.locator`, 'locator'),
    ...textOrNothing(values, `${at}.passage`, 'passage'),
    ...textOrNothing(values, `${at}.passageLang`, 'passageLang'),
  }));
}

/** Behind all rules there are. */
export const nextOrder = (sheet: Sheet): number => sheet.rules.reduce((most, { order }) => Math.max(most, order), 0) + 10;

/** The form of a rule as it stands. */
export function ruleFields({
  kind,
  targets,
  alongside,
  when,
  from,
  to,
  order,
  firm,
  strength,
  title,
  says,
  payload,
  sources,
  lookAgainBy,
  note,
}: Rule): Entry {
  return {
    title,
    says,
    strength,
    kind,
    ...rows('targets', targets),
    ...rows('alongside', alongside),
    ...writeCondition(when),
    from: from ?? '',
    to: to ?? '',
    order: String(order),
    firm: firm ? 'yes' : '',
    ...writePayload(payload),
    ...writeCitations(sources),
    lookAgainBy,
    note: note ?? '',
  };
}

const rows = (list: string, texts: readonly string[]): Entry =>
  Object.fromEntries(texts.map((text, row) => [`${list}.${String(row)}`, text]));

function writeCitations(sources: readonly Citation[]): Entry {
  return Object.fromEntries(
    sources.flatMap(({ source: cited, locator = '', passage = '', passageLang = '', standing, evidence }, row) =>
      Object.entries({ source: cited, locator, passage, passageLang, standing, evidence }).map(
        ([name, value]) => [`sources.${String(row)}.${name}`, value] as const,
      ),
    ),
  );
}

/** The form of a word as it stands. */
export function termFields({ name, says, category, when, from, to, sources }: Term): Entry {
  return {
    name,
    says,
    category: category ? 'yes' : '',
    ...writeCondition(when),
    from: from ?? '',
    to: to ?? '',
    ...writeCitations(sources),
  };
}
