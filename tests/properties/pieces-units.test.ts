import fc from 'fast-check';
import { expect, test } from 'vitest';
import { compare, decimalText, product, readFraction, rounded, sum, whole, type Fraction } from '@/lib/kernel/fraction';
import { millionths } from '@/lib/kernel/quantity';
import { converted, shownConversion, type MeasureUnit } from '@/lib/pieces/domain/imperial';
import { readTypedMeasure } from '@/lib/pieces/domain/typed-measure';
import { guardedComparison } from '@/lib/readings/domain/guard-band';

const GROUPS: readonly (readonly MeasureUnit[])[] = [
  ['mm', 'in'],
  ['mL', 'fl-oz-us', 'fl-oz-imperial'],
  ['C', 'F'],
];

const decimals = fc
  .tuple(fc.bigInt(-(10n ** 15n), 10n ** 15n), fc.nat(9))
  .map(([digits, places]): Fraction => readFraction(`${digits}e-${places}`) ?? whole(0n));

const pairs = fc.constantFrom(...GROUPS).chain((group) => fc.tuple(fc.constantFrom(...group), fc.constantFrom(...group)));

const turned = (value: Fraction, from: MeasureUnit, to: MeasureUnit): Fraction => {
  const other = converted(value, from, to);
  if (!other.ok) throw new Error(other.error);
  return other.value;
};

test('PIECE-12 there and back is what one began with, exactly', () => {
  fc.assert(
    fc.property(decimals, pairs, (value, [from, to]) => {
      expect(turned(turned(value, from, to), to, from)).toEqual(value);
    }),
    { numRuns: 500 },
  );
});

test('PIECE-12 conversion keeps order', () => {
  fc.assert(
    fc.property(decimals, decimals, pairs, (one, other, [from, to]) => {
      expect(compare(turned(one, from, to), turned(other, from, to))).toBe(compare(one, other));
    }),
  );
});

/** Limits close to the measure, where rounding could hide on which side it lies. */
const nearby = fc.tuple(fc.bigInt(-50n, 50n), fc.nat(8)).map(([steps, places]) => readFraction(`${steps}e-${places}`) ?? whole(0n));

test('PIECE-13 a shown conversion never crosses a limit', () => {
  fc.assert(
    fc.property(decimals, fc.array(nearby, { maxLength: 4 }), pairs, (value, steps, [unit, shownIn]) => {
      const limits = steps.map((step) => sum(value, step));
      const shown = shownConversion({ value, unit, shownIn, limits });
      if (!shown.ok) throw new Error(shown.error);
      const read = readFraction(shown.value.text) ?? whole(-1n);
      for (const limit of limits) {
        const side = compare(value, limit);
        const back = turned(read, shownIn, unit);
        expect(side === 0 || compare(back, limit) === side).toBe(true);
      }
      expect(shown.value.exact).toBe(compare(read, turned(value, unit, shownIn)) === 0);
    }),
    { numRuns: 500 },
  );
});

test('PIECE-18 exact numbers agree with whole numbers of millionths', () => {
  const typed = fc.tuple(fc.bigInt(-(10n ** 12n), 10n ** 12n), fc.nat(9)).map(([digits, places]) => `${digits}e-${places}`);
  fc.assert(
    fc.property(typed, (text) => {
      const read = readFraction(text) ?? whole(0n);
      expect(rounded(product(read, whole(1_000_000n)), 0)).toEqual(whole(millionths(text, 'mm') ?? -1n));
    }),
  );
});

test('PIECE-14 what is typed as a decimal or a broken number is read exactly, the rest refused', () => {
  fc.assert(
    fc.property(fc.nat(999), fc.integer({ min: 1, max: 64 }), fc.nat(64), (units, lower, upper) => {
      const read = readTypedMeasure(`${units} ${upper}/${lower}`);
      expect(read.ok && compare(product(read.value, whole(BigInt(lower))), whole(BigInt(units * lower + upper)))).toBe(0);
    }),
  );
  fc.assert(
    fc.property(fc.string({ maxLength: 30 }), (text) => {
      const read = readTypedMeasure(text);
      expect(read.ok ? compare(read.value, whole(0n)) >= 0 : read.error.length > 0).toBe(true);
    }),
    { numRuns: 1000 },
  );
});

test('PIECE-16 clearly under exactly if figure plus uncertainty is at most the limit; a stricter limit never clears', () => {
  const amounts = fc.integer({ min: 1, max: 400 });
  fc.assert(
    fc.property(amounts, amounts, amounts, fc.nat(100), (value, doubt, limit, less) => {
      const hundredths = (count: number): string => decimalText(readFraction(`${count}e-2`) ?? whole(0n), 2);
      const at = (border: number) =>
        guardedComparison({
          value: hundredths(value),
          expandedUncertainty: hundredths(doubt),
          coverageFactor: 2,
          limit: hundredths(border),
        });
      const [here, stricter] = [at(limit), at(Math.max(0, limit - less))];
      if (!here.ok || !stricter.ok) throw new Error('refused');
      expect(here.value.clearance === 'clearly-under').toBe(value + doubt <= limit);
      expect(here.value.clearance === 'clearly-over').toBe(value > limit + doubt);
      expect(stricter.value.clearance === 'clearly-under' && here.value.clearance !== 'clearly-under').toBe(false);
      expect(stricter.value.chanceUnder).toBeLessThanOrEqual(here.value.chanceUnder);
    }),
  );
});
