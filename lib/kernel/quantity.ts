import { Decimal } from 'decimal.js';

/** Units a question or a rule's threshold may use. Currencies (ISO 4217, upper case) are the units of money. */
export type Unit = 'mm' | 'cm' | 'mL' | 'L' | 'C' | 'percent' | 'pieces' | 'kg' | 'g' | 'people';

export type Money = { readonly amount: string; readonly currency: string };

/** An amount as a whole number of millionths of its base unit. Comparing two of them is exact. */
export type Millionths = bigint;

const BASE: Readonly<Record<Unit, readonly [base: Unit, factor: string]>> = {
  mm: ['mm', '1'],
  cm: ['mm', '10'],
  mL: ['mL', '1'],
  L: ['mL', '1000'],
  C: ['C', '1'],
  percent: ['percent', '1'],
  pieces: ['pieces', '1'],
  kg: ['kg', '1'],
  g: ['kg', '0.001'],
  people: ['people', '1'],
};

const CURRENCY = /^[A-Z]{3}$/;
const Exact = Decimal.clone({ precision: 60, rounding: Decimal.ROUND_HALF_UP });

export const isUnit = (text: string): text is Unit => Object.hasOwn(BASE, text);
export const isCurrency = (text: string): boolean => CURRENCY.test(text);

/** The unit in which amounts of `unit` are compared: litres in millilitres, a currency in itself. Null for no known unit. */
export function baseUnit(unit: string): string | null {
  if (isUnit(unit)) return BASE[unit][0];
  return isCurrency(unit) ? unit : null;
}

/**
 * `value` in `unit` as millionths of the base unit, rounded half up at the sixth decimal.
 * Null when the text is no plain decimal number or the unit is not known.
 */
export function millionths(value: number | string, unit: string): Millionths | null {
  const base = baseUnit(unit);
  const text = typeof value === 'number' ? String(value) : value;
  if (base === null || !/^-?\d{1,18}(\.\d{1,40})?(e[+-]?\d{1,2})?$/i.test(text)) return null;
  const factor = isUnit(unit) ? BASE[unit][1] : '1';
  return BigInt(new Exact(text).times(factor).times(1_000_000).toFixed(0));
}
