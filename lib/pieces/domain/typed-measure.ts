import { quotient, readFraction, sum, type Fraction } from '@/lib/kernel/fraction';
import { err, ok, type Result } from '@/lib/kernel/result';
import { readDecimal } from '@/lib/checks/domain/spoken-answer';

export type MeasureFault = 'not-a-number' | 'thousands-unclear';

/** "3 3/8": inches are cut in halves as often as in tenths. After NFKC the one-sign fractions read the same way. */
const BROKEN = /^(?:(\d{1,6}) +)?(\d{1,6}) ?\/ ?(\d{1,6})$/;
const ONE_SIGN = /(\d)([\u00bc-\u00be\u2150-\u215e])/gu;

/** A measure as it is typed: 62, 62.5, 62,5, 3 3/8 or 3⅜. One mark before exactly three digits is refused, not guessed. */
export function readTypedMeasure(typed: string): Result<Fraction, MeasureFault> {
  const text = typed.replace(ONE_SIGN, '$1 $2').normalize('NFKC').replaceAll('\u2044', '/').trim();
  const [, units = '0', upper, lower] = BROKEN.exec(text) ?? [];
  if (upper !== undefined && lower !== undefined) return broken(BigInt(units), BigInt(upper), BigInt(lower));
  const decimal = readDecimal(text);
  if (!decimal.ok) return err(decimal.error === 'thousands-unclear' ? 'thousands-unclear' : 'not-a-number');
  const read = readFraction(decimal.value);
  return read === null ? err('not-a-number') : ok(read);
}

function broken(units: bigint, upper: bigint, lower: bigint): Result<Fraction, MeasureFault> {
  const part = quotient(upper, lower);
  return part === null ? err('not-a-number') : ok(sum({ numerator: units, denominator: 1n }, part));
}

/** A temperature as it is typed; a minus sign may stand before it. */
export function readTypedTemperature(typed: string): Result<Fraction, MeasureFault> {
  const [, sign = '', rest = ''] = /^\s*([-\u2212]?)(.*)$/u.exec(typed) ?? [];
  const read = readTypedMeasure(rest);
  if (!read.ok || sign === '') return read;
  return ok({ numerator: -read.value.numerator, denominator: read.value.denominator });
}
