/** An exact number. `denominator` is above zero and shares no factor with `numerator`. */
export type Fraction = { readonly numerator: bigint; readonly denominator: bigint };

/** Longer figures are no measurement, and could be sent to keep us busy. */
const MOST_DIGITS = 60;
const MOST_EXPONENT = 60;
const DECIMAL = /^([+-]?)(\d+)(?:\.(\d+))?(?:e([+-]?\d{1,3}))?$/i;

const size = (value: bigint): bigint => (value < 0n ? -value : value);

function sharedFactor(one: bigint, other: bigint): bigint {
  let [larger, smaller] = [size(one), size(other)];
  while (smaller > 0n) [larger, smaller] = [smaller, larger % smaller];
  return larger;
}

function lowest(numerator: bigint, denominator: bigint): Fraction {
  const shared = sharedFactor(numerator, denominator);
  const sign = denominator < 0n ? -1n : 1n;
  return { numerator: (sign * numerator) / shared, denominator: (sign * denominator) / shared };
}

export const whole = (value: bigint): Fraction => ({ numerator: value, denominator: 1n });

/** A plain decimal number, point before the decimals. Null for anything else, infinities and very long figures included. */
export function readFraction(value: number | string): Fraction | null {
  const [, sign = '', digits, decimals = '', exponent = '0'] = DECIMAL.exec(String(value)) ?? [];
  if (digits === undefined || digits.length + decimals.length > MOST_DIGITS) return null;
  const figure = BigInt(`${sign.replace('+', '')}${digits}${decimals}`);
  return Math.abs(Number(exponent)) > MOST_EXPONENT ? null : shifted(figure, Number(exponent) - decimals.length);
}

/** `figure` with its point moved so many places to the right. */
const shifted = (figure: bigint, places: number): Fraction =>
  places < 0 ? lowest(figure, 10n ** BigInt(-places)) : whole(figure * 10n ** BigInt(places));

/** The quotient of two whole numbers; null where the lower one is zero. */
export const quotient = (upper: bigint, lower: bigint): Fraction | null => (lower === 0n ? null : lowest(upper, lower));

export const sum = (one: Fraction, other: Fraction): Fraction =>
  lowest(one.numerator * other.denominator + other.numerator * one.denominator, one.denominator * other.denominator);

export const negative = ({ numerator, denominator }: Fraction): Fraction => ({ numerator: -numerator, denominator });

export const difference = (one: Fraction, other: Fraction): Fraction => sum(one, negative(other));

export const product = (one: Fraction, other: Fraction): Fraction =>
  lowest(one.numerator * other.numerator, one.denominator * other.denominator);

/** `one` divided by `other`; null where `other` is zero. */
export const ratio = (one: Fraction, other: Fraction): Fraction | null =>
  quotient(one.numerator * other.denominator, one.denominator * other.numerator);

/** -1, 0 or 1, as `one` is less than, equal to or more than `other`. Exact. */
export function compare(one: Fraction, other: Fraction): -1 | 0 | 1 {
  const [left, right] = [one.numerator * other.denominator, other.numerator * one.denominator];
  if (left === right) return 0;
  return left < right ? -1 : 1;
}

/** The nearest fraction with so many decimals, half away from zero. */
export function rounded({ numerator, denominator }: Fraction, places: number): Fraction {
  const scale = 10n ** BigInt(places);
  const steps = (2n * size(numerator) * scale + denominator) / (2n * denominator);
  return lowest(numerator < 0n ? -steps : steps, scale);
}

/** With so many decimals at most, rounded half away from zero; zeros at the end are left away. */
export function decimalText(value: Fraction, places: number): string {
  const { numerator, denominator } = rounded(value, places);
  const steps = (size(numerator) * 10n ** BigInt(places)) / denominator;
  const digits = steps.toString().padStart(places + 1, '0');
  const decimals = digits.slice(digits.length - places).replace(/0+$/, '');
  const before = places === 0 ? digits : digits.slice(0, -places);
  return `${numerator < 0n ? '-' : ''}${before}${places === 0 || decimals === '' ? '' : `.${decimals}`}`;
}

/** The nearest number a computer's floating point has, by way of so many decimals. */
export const numberOf = (value: Fraction, places: number): number => Number(decimalText(value, places));
