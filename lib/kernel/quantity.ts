/** Units a question or a rule's threshold may use. Currencies (ISO 4217, upper case) are the units of money. */
export type Unit = 'mm' | 'cm' | 'mL' | 'L' | 'C' | 'percent' | 'pieces' | 'kg' | 'g' | 'people';

export type Money = { readonly amount: string; readonly currency: string };

/** An amount as a whole number of millionths of its base unit. Comparing two of them is exact. */
export type Millionths = bigint;

/** The unit each is compared in, and how many decimal places its millionths lie below it: a centimetre is 10⁷ millionths of a millimetre. */
const BASE: Readonly<Record<Unit, readonly [base: Unit, places: number]>> = {
  mm: ['mm', 6],
  cm: ['mm', 7],
  mL: ['mL', 6],
  L: ['mL', 9],
  C: ['C', 6],
  percent: ['percent', 6],
  pieces: ['pieces', 6],
  kg: ['kg', 6],
  g: ['kg', 3],
  people: ['people', 6],
};
const MONEY_PLACES = 6;

const CURRENCY = /^[A-Z]{3}$/;
const NUMBER = /^(-?)(\d{1,18})(?:\.(\d{1,40}))?(?:e([+-]?\d{1,2}))?$/i;

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
  const parts = baseUnit(unit) === null ? null : NUMBER.exec(String(value));
  if (parts === null) return null;
  const [, sign, whole = '', rest = '', power = '0'] = parts;
  const places = (isUnit(unit) ? BASE[unit][1] : MONEY_PLACES) + Number(power) - rest.length;
  const size = shifted(BigInt(whole + rest), places);
  return sign === '-' ? -size : size;
}

/** `digits` times ten to the power of `places`, rounded half up. */
function shifted(digits: bigint, places: number): bigint {
  if (places >= 0) return digits * 10n ** BigInt(places);
  const divisor = 10n ** BigInt(-places);
  return (2n * digits + divisor) / (2n * divisor);
}
