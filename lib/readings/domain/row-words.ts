import { readDecimal } from '@/lib/checks/domain/spoken-answer';
import { err, ok, type Result } from '@/lib/kernel/result';
import { MESSAGES } from '@/lib/kernel/words';

export const SHEET_UNITS = ['mg/L', 'ug/mL', 'ug/L', 'ppm', 'ppb', 'mg/dm2', 'ug/cm2', 'mg/article', 'mg/kg', '%'] as const;
export type SheetUnit = (typeof SHEET_UNITS)[number];

export const SHEET_PARTS = ['vessel', 'lid', 'rim', 'content'] as const;
export type SheetPart = (typeof SHEET_PARTS)[number];

/** One figure of a report as it was understood. `value` is a plain decimal; with `below` it is the most there can be. */
export type SheetRow = {
  readonly specimen: string;
  readonly part: SheetPart;
  readonly substance: string;
  readonly value: string;
  readonly unit: SheetUnit;
  readonly below: boolean;
};

export const COLUMNS = ['specimen', 'part', 'substance', 'value', 'unit', 'below'] as const;
export type RowColumn = (typeof COLUMNS)[number];
export type Cells = Readonly<Partial<Record<RowColumn, string>>>;

export type RowFault =
  | 'no-specimen'
  | 'too-long'
  | 'unknown-part'
  | 'no-substance'
  | 'unknown-substance'
  | 'no-value'
  | 'not-a-number'
  | 'thousands-unclear'
  | 'no-unit'
  | 'unknown-unit'
  | 'two-units'
  | 'unknown-below';
export type Refused = { readonly column: RowColumn; readonly why: RowFault };

/** As letters and signs that compare: full-width forms, both micro signs, case and spaces made one. */
const fold = (text: string): string => text.normalize('NFKC').replaceAll('μ', 'u').toLowerCase().replaceAll(/\s/g, '');

const UNIT_WORDS: Readonly<Record<string, SheetUnit>> = {
  ...Object.fromEntries(SHEET_UNITS.map((unit) => [fold(unit), unit])),
  'mg/litre': 'mg/L',
  'mg/liter': 'mg/L',
  'mg/piece': 'mg/article',
  percent: '%',
};

/** The unit a lab's spelling stands for. Null where it is none of ours. */
export const readUnit = (text: string): SheetUnit | null => own(UNIT_WORDS, fold(text));

const PART_WORDS: Readonly<Record<string, SheetPart>> = {
  '': 'vessel',
  vessel: 'vessel',
  inside: 'vessel',
  lid: 'lid',
  cover: 'lid',
  rim: 'rim',
  lip: 'rim',
  content: 'content',
  totalcontent: 'content',
};

/** The part of a piece. No word means the vessel. */
export const readPart = (text: string): SheetPart | null => own(PART_WORDS, fold(text));

/** Symbols of the elements that sheets and reports may name, in the order of the message file. */
export const SUBSTANCES: readonly string[] = Object.keys(MESSAGES.regions.substance);

const SUBSTANCE_WORDS: Readonly<Record<string, string>> = {
  ...Object.fromEntries(
    Object.entries(MESSAGES.regions.substance).flatMap(([symbol, name]): readonly (readonly [string, string])[] => [
      [fold(symbol), symbol],
      [fold(name), symbol],
      [fold(`${name} (${symbol})`), symbol],
    ]),
  ),
  aluminum: 'Al',
};

/** The symbol of an element by symbol or name. */
export const readSubstance = (text: string): string | null => own(SUBSTANCE_WORDS, fold(text));

const BELOW = new Set(['yes', 'y', 'x', 'true', '1', '<', 'below', 'nd', 'n.d.', '<lod', '<loq', '<dl']);
const MEASURED = new Set(['', 'no', 'n', 'false', '0', '-', '=']);

function own<T>(list: Readonly<Record<string, T>>, key: string): T | null {
  return Object.hasOwn(list, key) ? (list[key] ?? null) : null;
}

const LONGEST_NAME = 40;
/** A figure with a sign before it and a unit behind; "1e3" is none. */
const FIGURE = /^(<=|<|≤)?\s*(\d[\d\s.,]*?)\s*((?!e[+-]?\d)[^\d\s.,].*)?$/iu;

/** Reads one row. The first cell that cannot be read is named; nothing is guessed. */
export function readRow(cells: Cells): Result<SheetRow, Refused> {
  const named = nameOf(cells);
  if (!named.ok) return named;
  const substance = substanceOf(cellOf(cells, 'substance'));
  if (!substance.ok) return substance;
  const figure = figureOf(cells);
  return figure.ok ? ok({ ...named.value, substance: substance.value, ...figure.value }) : figure;
}

const cellOf = (cells: Cells, column: RowColumn): string => cells[column] ?? '';

function nameOf(cells: Cells): Result<Pick<SheetRow, 'specimen' | 'part'>, Refused> {
  const specimen = cellOf(cells, 'specimen').normalize('NFKC').trim();
  if (specimen === '') return refuse('specimen', 'no-specimen');
  if (specimen.length > LONGEST_NAME) return refuse('specimen', 'too-long');
  const part = readPart(cellOf(cells, 'part'));
  return part === null ? refuse('part', 'unknown-part') : ok({ specimen, part });
}

function substanceOf(text: string): Result<string, Refused> {
  if (text.trim() === '') return refuse('substance', 'no-substance');
  const symbol = readSubstance(text);
  return symbol === null ? refuse('substance', 'unknown-substance') : ok(symbol);
}

function figureOf(cells: Cells): Result<Pick<SheetRow, 'value' | 'unit' | 'below'>, Refused> {
  const text = cellOf(cells, 'value').normalize('NFKC').trim();
  if (text === '') return refuse('value', 'no-value');
  const { sign, digits, beside } = partsOf(text);
  const number = readDecimal(digits);
  if (!number.ok) return refuse('value', number.error === 'thousands-unclear' ? 'thousands-unclear' : 'not-a-number');
  const unit = unitOf(cellOf(cells, 'unit'), beside);
  if (!unit.ok) return unit;
  const below = belowOf(cellOf(cells, 'below'));
  return below === null ? refuse('below', 'unknown-below') : ok({ value: number.value, unit: unit.value, below: below || sign !== '' });
}

function partsOf(text: string): { readonly sign: string; readonly digits: string; readonly beside: string } {
  const [, sign = '', digits = '', beside = ''] = FIGURE.exec(text) ?? [];
  return { sign, digits, beside };
}

function belowOf(text: string): boolean | null {
  const said = fold(text);
  if (BELOW.has(said)) return true;
  return MEASURED.has(said) ? false : null;
}

/** The unit stands in a cell of its own or behind the figure. In both places it has to be the same. */
function unitOf(cell: string, beside: string): Result<SheetUnit, Refused> {
  const [said, other] = [cell, beside].filter((text) => text.trim() !== '');
  if (said === undefined) return refuse('unit', 'no-unit');
  const unit = readUnit(said);
  if (unit === null) return refuse('unit', 'unknown-unit');
  return other === undefined || readUnit(other) === unit ? ok(unit) : refuse('unit', 'two-units');
}

const refuse = (column: RowColumn, why: RowFault): { readonly ok: false; readonly error: Refused } => err({ column, why });
