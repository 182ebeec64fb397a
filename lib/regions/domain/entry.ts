/** What the form of one item holds, as typed: by the name of the field. */
export type Entry = Readonly<Record<string, string | readonly string[]>>;

/** The text of a field, blanks at both ends taken off; empty where there is none. */
export function textIn(entry: Entry, name: string): string {
  const value = entry[name];
  return tidy(typeof value === 'string' ? value : (value?.[0] ?? ''));
}

/** One way of writing letters and line ends, whatever was typed on. */
const tidy = (typed: string): string => typed.normalize('NFC').replace(/\r\n?/g, '\n').trim();

/** All that was chosen under one name, each once. */
export function listIn(entry: Entry, name: string): readonly string[] {
  const value = entry[name] ?? [];
  return [...new Set((typeof value === 'string' ? [value] : value).map(tidy).filter((one) => one !== ''))];
}

/** The lines of a field that takes one thing a line. */
export const linesIn = (entry: Entry, name: string): readonly string[] =>
  textIn(entry, name)
    .split('\n')
    .map((line) => line.trim())
    .filter((line) => line !== '');

/** How many rows there are of a list whose fields are called `sources.0.…`, `sources.1.…`: one more than the highest. */
export function rowsIn(entry: Entry, list: string): number {
  return Object.keys(entry).reduce((most, name) => Math.max(most, (placeIn(name, list) ?? -1) + 1), 0);
}

/** The row a field belongs to; null for a field of no row of this list. */
export function placeIn(name: string, list: string): number | null {
  if (!name.startsWith(`${list}.`)) return null;
  const [place = ''] = name.slice(list.length + 1).split('.');
  return /^\d{1,3}$/.test(place) ? Number(place) : null;
}

/** Whether two entries say the same, whatever is empty left out. */
export function sameEntry(one: Entry, other: Entry): boolean {
  const names = new Set([...Object.keys(one), ...Object.keys(other)]);
  return [...names].every((name) => isSame(one[name], other[name]));
}

const asText = (value: Entry[string] | undefined): string => {
  const list = value === undefined ? [] : typeof value === 'string' ? [value] : value;
  return list.map((one) => one.replace(/\r\n?/g, '\n')).join('\u0000');
};
const isSame = (one: Entry[string] | undefined, other: Entry[string] | undefined): boolean => asText(one) === asText(other);
