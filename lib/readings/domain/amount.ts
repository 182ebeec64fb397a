import { compare, product, readFraction, sum, whole, type Fraction } from '@/lib/kernel/fraction';
import { err, ok, type Result } from '@/lib/kernel/result';

/** Digits a value may have, before and after the point together. */
export const MOST_DIGITS = 40;

export type AmountFault = 'not-a-number' | 'negative' | 'comma' | 'sign-of-below' | 'too-many-digits';

/** ASCII and full-width digits and points. No other digit is taken for one: the "²" of "10²" is no 2. */
const FULL_WIDTH = /[０-９．]/g;
const DIGITS = /^\d+(\.\d+)?$/;

/**
 * A value as a lab report gives it, exactly: a number, or digits with a point in a text. Nothing is guessed: a comma, which
 * means thousands in one country and decimals in the next, is refused, and so is anything but digits.
 */
export function readAmount(value: unknown): Result<Fraction, AmountFault> {
  if (typeof value === 'number') return readDigits(writtenOut(value));
  if (typeof value !== 'string') return err('not-a-number');
  return readDigits(value.trim().replace(FULL_WIDTH, (sign) => sign.normalize('NFKC')));
}

function readDigits(text: string): Result<Fraction, AmountFault> {
  const fault = faultOf(text);
  if (fault !== null) return err(fault);
  const amount = readFraction(text);
  return amount === null ? err('not-a-number') : ok(amount);
}

function faultOf(text: string): AmountFault | null {
  if (/^[<≤＜]/.test(text)) return 'sign-of-below';
  if (/^[-−－]\s*\d/.test(text)) return 'negative';
  if (/^[\d.,，]*\d[,，][\d.,，]*$/.test(text)) return 'comma';
  if (!DIGITS.test(text)) return 'not-a-number';
  return text.replace('.', '').length > MOST_DIGITS ? 'too-many-digits' : null;
}

/** A number in plain digits, where its shortest form has an exponent: 1e-7 is 0.0000001. */
function writtenOut(value: number): string {
  const text = String(value);
  const found = /^(-?)(\d)(?:\.(\d+))?e([+-]\d+)$/.exec(text);
  if (found === null) return text;
  const [, sign = '', first = '', rest = '', exponent = '0'] = found;
  const shift = Number(exponent);
  if (shift < 0) return `${sign}0.${'0'.repeat(-shift - 1)}${first}${rest}`;
  return `${sign}${first}${rest}${'0'.repeat(Math.max(0, shift - rest.length))}`;
}

/** All a figure may be, both ends included: a measured one is a single point. */
export type Span = { readonly least: Fraction; readonly most: Fraction };

export const spanOf = ({ value, below }: { readonly value: Fraction; readonly below: boolean }): Span => ({
  least: below ? whole(0n) : value,
  most: value,
});

export const scaled = ({ least, most }: Span, by: Fraction): Span => ({ least: product(least, by), most: product(most, by) });

export const added = (a: Span, b: Span): Span => ({ least: sum(a.least, b.least), most: sum(a.most, b.most) });

export const isPoint = ({ least, most }: Span): boolean => compare(least, most) === 0;

/** The highest upper end among some figures; null where there are none. */
export function highest(spans: readonly Span[]): Fraction | null {
  return spans.reduce<Fraction | null>((top, { most }) => (top === null || compare(top, most) < 0 ? most : top), null);
}

/** The mean of some figures; null where there are none. */
export function meanOf(spans: readonly Span[]): Span | null {
  const share = spans.length === 0 ? null : { numerator: 1n, denominator: BigInt(spans.length) };
  return share === null ? null : scaled(spans.reduce(added), share);
}
