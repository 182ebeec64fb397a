import { Decimal } from 'decimal.js';
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { millionths } from '@/lib/kernel/quantity';

/** What a unit is in its base, as the SI has it. */
const FACTORS = { mm: '1', cm: '10', mL: '1', L: '1000', C: '1', kg: '1', g: '0.001', DKK: '1' } as const;
const Exact = Decimal.clone({ precision: 80, rounding: Decimal.ROUND_HALF_UP });

const decimalText = fc
  .tuple(
    fc.constantFrom('', '-'),
    fc.bigInt({ min: 0n, max: 10n ** 18n - 1n }),
    fc.option(fc.stringMatching(/^\d{1,40}$/)),
    fc.option(fc.integer({ min: -40, max: 20 })),
  )
  .map(
    ([sign, whole, rest, power]) => `${sign}${String(whole)}${rest === null ? '' : `.${rest}`}${power === null ? '' : `e${String(power)}`}`,
  );

// Source: decimal.js 10.6.0, a reference library for exact decimals. Nothing in the product uses it.
test('CHECK-23 an amount is the same number of millionths as decimal.js makes of it, rounded half up', () => {
  fc.assert(
    fc.property(decimalText, fc.constantFrom(...(['mm', 'cm', 'mL', 'L', 'C', 'kg', 'g', 'DKK'] as const)), (text, unit) => {
      const expected = new Exact(text).times(FACTORS[unit]).times(1_000_000).toFixed(0);
      expect(millionths(text, unit)).toBe(BigInt(expected));
    }),
    { numRuns: 1000, seed: 20261201 },
  );
});
