import { conditionIn, depthOf, linesOf, MOST_DEEP, MOST_LINES, JOINS, ROOT } from './condition-entry';
import { placeIn, rowsIn, type Entry } from './entry';

/** Lists of rows in forms, with the fields of a row. A list of plain fields has one without a name. */
const ROWS: Readonly<Record<string, readonly string[]>> = {
  sources: ['source', 'locator', 'passage', 'passageLang', 'standing', 'evidence'],
  'payload.words': ['lang', 'text'],
  expected: ['rule', 'status'],
  except: ['rule', 'why'],
  targets: [''],
  alongside: [''],
};

const MOST_ROWS = 60;

/**
 * What a button inside a form does to what was typed: `add-line:when.0`, `add-block:when:any`, `add:sources`, `remove:when.0.1`,
 * `remove:sources.1`, `up:sources.1`, `clear:fingerprint`. Anything else leaves it as it is.
 */
export function applyDo(values: Entry, act: string): Entry {
  const [verb = '', at = '', more = ''] = act.split(':');
  switch (verb) {
    case 'add-line':
      return addPart(values, at, { question: '' });
    case 'add-block':
      return JOINS.some((join) => join === more) ? addPart(values, at, { join: more, '0.question': '' }) : values;
    case 'add':
      return addRow(values, at);
    case 'remove':
      return withoutRow(values, at);
    case 'up':
      return swappedUp(values, at);
    case 'clear':
      return Object.fromEntries(Object.entries(values).filter(([name]) => name !== at));
    default:
      return values;
  }
}

/** The name of the field that the eye goes to after a button: where the form is shown again. Null: the top. */
export function placeOfDo(values: Entry, act: string): string | null {
  const [verb = '', at = ''] = act.split(':');
  switch (verb) {
    case 'add-line':
      return `${at}.${String(rowsIn(values, at) - 1)}.question`;
    case 'add-block':
      return `${at}.${String(rowsIn(values, at) - 1)}.join`;
    case 'add':
      return rowField(at, rowsIn(values, at) - 1);
    case 'show':
      return at;
    default:
      return listPlace(at);
  }
}

/** After a row went, its list. */
function listPlace(at: string): string | null {
  const list = at.slice(0, Math.max(0, at.lastIndexOf('.')));
  if (list === '') return null;
  return list === ROOT || list.startsWith(`${ROOT}.`) ? `${list}.join` : `add-${list}`;
}

const rowField = (list: string, row: number): string => {
  const [first = ''] = ROWS[list] ?? [];
  return first === '' ? `${list}.${String(row)}` : `${list}.${String(row)}.${first}`;
};

/** A part at the end of a block of the condition, while there is room for it. */
function addPart(values: Entry, at: string, fields: Readonly<Record<string, string>>): Entry {
  const { parts } = conditionIn(values);
  const isBlock = at === ROOT || `${at}.join` in values;
  const deep = depthOf(at) + ('join' in fields ? 1 : 0);
  if (!isBlock || !/^when([.]\d{1,3})*$/.test(at) || linesOf(parts) >= MOST_LINES || deep >= MOST_DEEP) return values;
  const place = `${at}.${String(rowsIn(values, at))}`;
  return { ...values, ...Object.fromEntries(Object.entries(fields).map(([name, value]) => [`${place}.${name}`, value])) };
}

function addRow(values: Entry, list: string): Entry {
  const fields = Object.hasOwn(ROWS, list) ? ROWS[list] : undefined;
  const count = rowsIn(values, list);
  if (fields === undefined || count >= MOST_ROWS) return values;
  const row = `${list}.${String(count)}`;
  return { ...values, ...Object.fromEntries(fields.map((name) => [name === '' ? row : `${row}.${name}`, ''])) };
}

/** `when.0.1`: the list it is in, `when.0`, and its place, 1. */
function splitRow(at: string): { readonly list: string; readonly row: number } | null {
  const parts = /^(?<list>[a-z.0-9]+)[.](?<row>\d{1,3})$/.exec(at)?.groups;
  return parts?.['list'] === undefined ? null : { list: parts['list'], row: Number(parts['row']) };
}

/** Without that row or part; those after it move up. */
function withoutRow(values: Entry, at: string): Entry {
  const found = splitRow(at);
  if (found === null) return values;
  return renumbered(values, found.list, (row) => (row === found.row ? null : row > found.row ? row - 1 : row));
}

/** That row before the one above it. */
function swappedUp(values: Entry, at: string): Entry {
  const found = splitRow(at);
  if (found === null || found.row === 0) return values;
  const { list, row: moved } = found;
  return renumbered(values, list, (row) => (row === moved ? row - 1 : row === moved - 1 ? row + 1 : row));
}

function renumbered(values: Entry, list: string, placeOf: (row: number) => number | null): Entry {
  return Object.fromEntries(
    Object.entries(values).flatMap(([name, value]): readonly (readonly [string, Entry[string]])[] => {
      const row = placeIn(name, list);
      if (row === null) return [[name, value]];
      const place = placeOf(row);
      const rest = name.slice(`${list}.${String(row)}`.length);
      return place === null ? [] : [[`${list}.${String(place)}${rest}`, value]];
    }),
  );
}
