import { compare, decimalText, difference, product, quotient, ratio, rounded, sum, whole, type Fraction } from '@/lib/kernel/fraction';
import { err, ok, type Result } from '@/lib/kernel/result';

/** Units a maker may read and write measures in. Everything is kept and judged in mm, mL and °C. */
export type MeasureUnit = 'mm' | 'in' | 'mL' | 'fl-oz-us' | 'fl-oz-imperial' | 'C' | 'F';

type Quantity = 'length' | 'volume' | 'temperature';

/** `(value + shift) × upper / lower` is the value in mm, mL or °C, exactly and by definition. */
type Definition = { readonly quantity: Quantity; readonly upper: bigint; readonly lower: bigint; readonly shift: bigint };

const DEFINITIONS: Readonly<Record<MeasureUnit, Definition>> = {
  mm: { quantity: 'length', upper: 1n, lower: 1n, shift: 0n },
  in: { quantity: 'length', upper: 254n, lower: 10n, shift: 0n },
  mL: { quantity: 'volume', upper: 1n, lower: 1n, shift: 0n },
  'fl-oz-us': { quantity: 'volume', upper: 295_735_295_625n, lower: 10_000_000_000n, shift: 0n },
  'fl-oz-imperial': { quantity: 'volume', upper: 284_130_625n, lower: 10_000_000n, shift: 0n },
  C: { quantity: 'temperature', upper: 1n, lower: 1n, shift: 0n },
  F: { quantity: 'temperature', upper: 5n, lower: 9n, shift: -32n },
};

/** Decimals of a shown conversion where no limit asks for more. */
const PLACES: Readonly<Record<MeasureUnit, number>> = { mm: 1, in: 2, mL: 0, 'fl-oz-us': 1, 'fl-oz-imperial': 1, C: 0, F: 0 };

const ONE = whole(1n);
const factorOf = ({ upper, lower }: Definition): Fraction => quotient(upper, lower) ?? ONE;

/** The same measure in another unit, exactly; going there and back gives what one began with. */
export function converted(value: Fraction, from: MeasureUnit, to: MeasureUnit): Result<Fraction, 'not-the-same-quantity'> {
  const [here, there] = [DEFINITIONS[from], DEFINITIONS[to]];
  if (here.quantity !== there.quantity) return err('not-the-same-quantity');
  const base = product(sum(value, whole(here.shift)), factorOf(here));
  return ok(difference(ratio(base, factorOf(there)) ?? base, whole(there.shift)));
}

/** A difference in another unit, such as °F an hour in °C an hour: only the size of the degree counts. */
export function convertedStep(value: Fraction, from: MeasureUnit, to: MeasureUnit): Result<Fraction, 'not-the-same-quantity'> {
  const [here, there] = [DEFINITIONS[from], DEFINITIONS[to]];
  if (here.quantity !== there.quantity) return err('not-the-same-quantity');
  const base = product(value, factorOf(here));
  return ok(ratio(base, factorOf(there)) ?? base);
}

/** A conversion to be shown beside the measure itself. Where it is not `exact`, it is to be marked "about". */
export type ShownConversion = { readonly text: string; readonly exact: boolean };

export type ToShow = {
  readonly value: Fraction;
  readonly unit: MeasureUnit;
  readonly shownIn: MeasureUnit;
  /** In `unit`, each one a figure on whose side the reader will rely. */
  readonly limits: readonly Fraction[];
};

/**
 * U1: the rounded figure lies on the same side of every limit as the measure does, and of every limit rounded alike; digits are
 * added until it does. A measure that is the limit is shown by the same digits as the limit.
 */
export function shownConversion({ value, unit, shownIn, limits }: ToShow): Result<ShownConversion, 'not-the-same-quantity'> {
  const exact = converted(value, unit, shownIn);
  if (!exact.ok) return exact;
  const borders = limits.flatMap((limit) => {
    const border = converted(limit, unit, shownIn);
    return border.ok ? [border.value] : [];
  });
  let places = PLACES[shownIn];
  while (!borders.every((border) => keepsSide(exact.value, border, places))) places += 1;
  return ok({ text: decimalText(exact.value, places), exact: compare(rounded(exact.value, places), exact.value) === 0 });
}

/** Holds at the latest when one decimal is smaller than half the distance, so the search above ends. */
function keepsSide(value: Fraction, border: Fraction, places: number): boolean {
  const side = compare(value, border);
  const shown = rounded(value, places);
  return side === 0 || (compare(shown, border) === side && compare(shown, rounded(border, places)) === side);
}
