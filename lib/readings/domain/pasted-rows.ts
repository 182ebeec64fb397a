import { readPart, readRow, readSubstance, readUnit, type Cells, type Refused, type RowColumn, type SheetRow } from './row-words';

/** What became of one pasted line. Every line that is not empty is one of these: nothing is dropped in silence. */
export type PastedLine = { readonly line: number; readonly text: string } & (
  | { readonly kind: 'heading'; readonly ignored: readonly string[] }
  | { readonly kind: 'understood'; readonly row: SheetRow }
  | { readonly kind: 'not-understood'; readonly why: Refused['why'] | 'columns' | 'too-many' }
);

/** Rows one sheet can take; a report of a lab has a few dozen. */
export const MOST_ROWS = 200;

type Separator = '\t' | ';' | ',';

const HEADINGS: Readonly<Record<RowColumn, readonly string[]>> = {
  specimen: [
    'specimen',
    'specimens',
    'specimenno',
    'specimenid',
    'sample',
    'sampleno',
    'sampleid',
    'piece',
    'item',
    'id',
    'no',
    'nr',
    'number',
    'labno',
    'testpiece',
  ],
  part: ['part', 'surface', 'place', 'where', 'location'],
  substance: ['substance', 'element', 'analyte', 'metal', 'parameter', 'symbol'],
  value: ['value', 'result', 'results', 'reading', 'figure', 'amount', 'concentration', 'release', 'measured'],
  unit: ['unit', 'units'],
  below: ['below', 'belowdetection', 'belowlod', 'belowloq', 'notdetected', 'nd', 'qualifier', 'flag', '<'],
};

const HEADING_OF: ReadonlyMap<string, RowColumn> = new Map(
  (['specimen', 'part', 'substance', 'value', 'unit', 'below'] as const).flatMap((column) =>
    HEADINGS[column].map((word) => [word, column] as const),
  ),
);

/** How the cells of a line are to be read: by the heading, or in the usual order. */
type Layout = { readonly columns: readonly (RowColumn | null)[]; readonly unit: string };

/** Reads rows pasted from a spreadsheet: tabs, semicolons or commas between cells, with or without a heading. */
export function readPasted(text: string): readonly PastedLine[] {
  const lines = text
    .replaceAll('\r\n', '\n')
    .split(/[\n\r]/)
    .map((line, place) => ({ line: place + 1, text: line.replaceAll('\u00a0', ' ') }))
    .filter((one) => one.text.trim() !== '');
  const separator = separatorOf(lines.map((one) => one.text));
  const [first] = lines;
  const layout = first === undefined ? null : headingOf(splitLine(first.text, separator));
  return lines.map((one, place): PastedLine => {
    if (layout !== null && place === 0) return { ...one, kind: 'heading', ignored: layout.ignored };
    if (place - (layout === null ? 0 : 1) >= MOST_ROWS) return { ...one, kind: 'not-understood', why: 'too-many' };
    return { ...one, ...lineOf(splitLine(one.text, separator), layout) };
  });
}

/** The rows that were understood, in the order of the lines. */
export const rowsOf = (lines: readonly PastedLine[]): readonly SheetRow[] =>
  lines.flatMap((line) => (line.kind === 'understood' ? [line.row] : []));

function separatorOf(lines: readonly string[]): Separator {
  if (lines.some((line) => line.includes('\t'))) return '\t';
  return lines.some((line) => line.includes(';')) ? ';' : ',';
}

/** Cells of a line. Quotation marks keep a separator inside a cell, as spreadsheets write it. */
function splitLine(line: string, separator: Separator): readonly string[] {
  const cells: string[] = [];
  let cell = '';
  let quoted = false;
  for (const sign of line) {
    if (sign === '"') quoted = !quoted;
    else if (sign === separator && !quoted) {
      cells.push(cell.trim());
      cell = '';
    } else cell += sign;
  }
  return [...cells, cell.trim()];
}

type Found = { readonly column: RowColumn | null; readonly unit: string; readonly said: string };

/** Null when the line is no heading: fewer than two of its cells are words of a heading, or one of them is a figure. */
function headingOf(cells: readonly string[]): (Layout & { readonly ignored: readonly string[] }) | null {
  const found = cells.map(headingCell);
  const known = found.filter(({ column }) => column !== null).length;
  if (known < 2 || cells.some((cell) => /^[<≤]?\s*\d/.test(cell))) return null;
  const columns = found.map(({ column }, place) => (found.findIndex((one) => one.column === column) === place ? column : null));
  return {
    columns,
    unit: found.find(({ column, unit }) => column === 'value' && unit !== '')?.unit ?? '',
    ignored: found.flatMap(({ said }, place) => (columns[place] === null && said !== '' ? [said] : [])),
  };
}

/** "Result (mg/L)" names the column and the unit of all its figures. */
function headingCell(cell: string): Found {
  const [, word = '', unit = ''] = /^([^([]*?)\s*[([]([^)\]]*)[)\]]\s*$/.exec(cell) ?? [null, cell, ''];
  const column =
    HEADING_OF.get(
      word === '<'
        ? word
        : word
            .normalize('NFKC')
            .toLowerCase()
            .replaceAll(/[^\p{L}]/gu, ''),
    ) ?? null;
  return { column, unit: readUnit(unit) === null ? '' : unit, said: cell };
}

type Outcome =
  { readonly kind: 'understood'; readonly row: SheetRow } | { readonly kind: 'not-understood'; readonly why: Refused['why'] | 'columns' };

function lineOf(cells: readonly string[], layout: Layout | null): Outcome {
  const read = layout === null ? inUsualOrder(cells) : byHeading(cells, layout);
  if (read === null) return { kind: 'not-understood', why: 'columns' };
  const row = readRow(read);
  return row.ok ? { kind: 'understood', row: row.value } : { kind: 'not-understood', why: row.error.why };
}

function byHeading(cells: readonly string[], { columns, unit }: Layout): Cells | null {
  if (cells.slice(columns.length).some((cell) => cell !== '')) return null;
  const read = named(cells, columns);
  return (read.unit ?? '') === '' && unit !== '' ? { ...read, unit } : read;
}

/** Without a heading: specimen, part (which may be left out), substance, value, unit, below (which may be left out). */
function inUsualOrder(cells: readonly string[]): Cells | null {
  const filled = cells.slice(0, cells.findLastIndex((cell) => cell !== '') + 1);
  const second = filled[1] ?? '';
  const hasPart = readPart(second) !== null && readSubstance(filled[2] ?? '') !== null;
  if (!hasPart && readSubstance(second) === null) return null;
  const columns: readonly RowColumn[] = hasPart
    ? ['specimen', 'part', 'substance', 'value', 'unit', 'below']
    : ['specimen', 'substance', 'value', 'unit', 'below'];
  return filled.length > columns.length ? null : named(filled, columns);
}

const named = (cells: readonly string[], columns: readonly (RowColumn | null)[]): Cells =>
  Object.fromEntries(
    columns.flatMap((column, place) => {
      const cell = cells[place];
      return column === null || cell === undefined ? [] : [[column, cell]];
    }),
  );
