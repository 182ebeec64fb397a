import { words } from '@/lib/kernel/words';
import { numberIn } from './condition-form';
import { linesIn, rowsIn, textIn, type Entry } from './domain/entry';
import { fieldsOf, payloadName, TOPICS, type PayloadField } from './domain/payload-fields';
import type { Payload } from './domain/rule';

/** A part of an item as read, before it is parsed, and what is missing in the words of its form, by field. */
export type ReadPart = { readonly value: Readonly<Record<string, unknown>>; readonly faults: Readonly<Record<string, string>> };

/** What one field says. `undefined`: nothing; `fault`: by the field's own part. */
type Said = { readonly value?: unknown; readonly faults?: Readonly<Record<string, string>> };

/** Reads the details of a rule by its topic. */
export function readPayload(entry: Entry): ReadPart {
  const topic = textIn(entry, payloadName('topic'));
  if (!TOPICS.some((one) => one === topic)) return { value: {}, faults: { [payloadName('topic')]: words('amend.fault.topic') } };
  let value: Readonly<Record<string, unknown>> = { topic };
  const faults: Record<string, string> = {};
  for (const field of fieldsOf(topic)) {
    const said = readField(entry, field);
    Object.assign(faults, said.faults);
    if (said.value !== undefined) value = withAt(value, field.name.split('.'), said.value);
    else if (field.isNeeded === true && said.faults === undefined) faults[payloadName(field.name)] = words('amend.fault.needed');
  }
  return { value, faults };
}

/** The object with that value put in under a path, `['amount', 'unit']`. */
function withAt(
  object: Readonly<Record<string, unknown>>,
  [name = '', ...rest]: readonly string[],
  value: unknown,
): Readonly<Record<string, unknown>> {
  const inner = object[name];
  return { ...object, [name]: rest.length === 0 ? value : withAt(isRecord(inner) ? inner : {}, rest, value) };
}

const isRecord = (value: unknown): value is Readonly<Record<string, unknown>> => typeof value === 'object' && value !== null;

function readField(entry: Entry, field: PayloadField): Said {
  const name = payloadName(field.name);
  switch (field.kind) {
    case 'number':
      return readNumber(entry, name);
    case 'tolerance':
      return readTolerance(entry, name);
    case 'money':
      return readMoney(entry, name);
    case 'yesno':
      return orNothing({ yes: true, no: false }[textIn(entry, name)]);
    case 'lines':
      return orNothing(linesIn(entry, name).length === 0 ? undefined : linesIn(entry, name));
    case 'words':
      return readLangWords(entry, name);
    case 'text':
    case 'long':
    case 'link':
    case 'date':
    case 'choice':
      return orNothing(textIn(entry, name) === '' ? undefined : textIn(entry, name));
  }
}

const orNothing = (value: unknown): Said => (value === undefined ? {} : { value });

function readNumber(entry: Entry, name: string): Said {
  if (textIn(entry, name) === '') return {};
  const value = numberIn(textIn(entry, name));
  return value === null ? { faults: { [name]: words('amend.fault.amount') } } : { value };
}

function readTolerance(entry: Entry, name: string): Said {
  const value = readNumber(entry, `${name}.value`);
  const margin = readNumber(entry, `${name}.plusMinus`);
  if (value.faults !== undefined || margin.faults !== undefined) return { faults: { ...value.faults, ...margin.faults } };
  if (value.value !== undefined) return { value: { value: value.value, plusMinus: margin.value ?? 0 } };
  return margin.value === undefined ? {} : { faults: { [`${name}.value`]: words('amend.fault.needed') } };
}

function readMoney(entry: Entry, name: string): Said {
  const amount = textIn(entry, `${name}.amount`);
  const currency = textIn(entry, `${name}.currency`).toUpperCase();
  if (amount === '') return {};
  if (!/^[A-Z]{3}$/.test(currency)) return { faults: { [`${name}.currency`]: words('amend.fault.currency') } };
  const text = amount.replaceAll(/\s/g, '').replace(',', '.');
  return numberIn(amount) === null
    ? { faults: { [`${name}.amount`]: words('amend.fault.amount') } }
    : { value: { amount: text, currency } };
}

function readLangWords(entry: Entry, name: string): Said {
  const said = new Map<string, string>();
  const faults: Record<string, string> = {};
  for (let row = 0; row < rowsIn(entry, name); row += 1) {
    const at = `${name}.${String(row)}`;
    const [lang, text] = [textIn(entry, `${at}.lang`), textIn(entry, `${at}.text`)];
    if (lang === '' && text === '') continue;
    Object.assign(faults, rowFaults(at, { lang, text, isTaken: said.has(lang) }));
    said.set(lang, text);
  }
  if (Object.keys(faults).length > 0) return { faults };
  return said.size === 0 ? {} : { value: Object.fromEntries(said) };
}

type LangRow = { readonly lang: string; readonly text: string; readonly isTaken: boolean };

function rowFaults(at: string, { lang, text, isTaken }: LangRow): Readonly<Record<string, string>> {
  if (lang === '') return { [`${at}.lang`]: words('amend.fault.lang') };
  if (isTaken) return { [`${at}.lang`]: words('amend.fault.langTwice') };
  return text === '' ? { [`${at}.text`]: words('amend.fault.needed') } : {};
}

/** The fields of a rule's details as they stand. */
export function writePayload(payload: Payload): Entry {
  const fields = fieldsOf(payload.topic).flatMap((field) => writeField(payloadName(field.name), valueAt(payload, field.name.split('.'))));
  return { [payloadName('topic')]: payload.topic, ...Object.fromEntries(fields) };
}

function valueAt(value: unknown, [name, ...rest]: readonly string[]): unknown {
  return name === undefined ? value : isRecord(value) ? valueAt(value[name], rest) : undefined;
}

type Fields = readonly (readonly [string, string])[];

function writeField(name: string, value: unknown): Fields {
  if (typeof value === 'string' || typeof value === 'number') return [[name, String(value)]];
  if (typeof value === 'boolean') return [[name, value ? 'yes' : 'no']];
  if (Array.isArray(value)) return [[name, value.map(String).join('\n')]];
  if (!isRecord(value)) return [[name, '']];
  if (name === payloadName('words'))
    return Object.entries(value).flatMap(([lang, text], row) => [
      [`${name}.${String(row)}.lang`, lang],
      [`${name}.${String(row)}.text`, String(text)],
    ]);
  return Object.entries(value).map(([part, said]) => [`${name}.${part}`, String(said)]);
}
