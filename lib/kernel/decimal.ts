import { decimalText, type Fraction } from './fraction';

/** Places of a decimal that does not end. */
const PLACES = 6;

/** A number as a decimal: exact while it ends, else rounded half up at the sixth place. */
export function decimalOf(value: Fraction): string {
  return decimalText(value, placesOf(value) ?? PLACES);
}

/** How many places the decimal has; null where it never ends. */
function placesOf({ denominator }: Fraction): number | null {
  const [odd, twos] = strip(denominator, 2n);
  const [rest, fives] = strip(odd, 5n);
  return rest === 1n ? Math.max(twos, fives) : null;
}

function strip(from: bigint, factor: bigint): readonly [rest: bigint, times: number] {
  let [rest, count] = [from, 0];
  for (; rest % factor === 0n; rest /= factor) count += 1;
  return [rest, count];
}
