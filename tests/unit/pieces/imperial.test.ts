import { describe, expect, test } from 'vitest';
import { z } from 'zod';
import { decimalText, readFraction, whole, type Fraction } from '@/lib/kernel/fraction';
import type { Result } from '@/lib/kernel/result';
import { converted, convertedStep, shownConversion, type MeasureUnit } from '@/lib/pieces/domain/imperial';
import { readTypedMeasure, readTypedTemperature } from '@/lib/pieces/domain/typed-measure';
import { workedExample } from './worked-examples';

const exact = (text: string): Fraction => {
  const read = readFraction(text);
  if (read === null) throw new Error(`${text} is no figure`);
  return read;
};
const valueOf = (result: Result<Fraction, string>): string => (result.ok ? decimalText(result.value, 12) : result.error); // prettier-ignore

const KNOWN: readonly (readonly [string, MeasureUnit, string, MeasureUnit, string])[] = [
  ['1', 'in', '25.4', 'mm', 'international inch of 1959, by definition'],
  ['1', 'fl-oz-us', '29.5735295625', 'mL', 'US gallon of 231 cubic inches, an ounce its 128th part, by definition'],
  ['1', 'fl-oz-imperial', '28.4130625', 'mL', 'imperial gallon of 4.54609 L, an ounce its 160th part, by definition'],
  ['212', 'F', '100', 'C', 'water boils, from memory'],
  ['32', 'F', '0', 'C', 'water freezes, from memory'],
  ['-40', 'F', '-40', 'C', 'the two scales meet, from memory'],
  ['128', 'fl-oz-us', '3785.411784', 'mL', 'US gallon, from memory'],
  ['160', 'fl-oz-imperial', '4546.09', 'mL', 'imperial gallon, from memory'],
];

describe('units', () => {
  test.each(KNOWN)('PIECE-12 %s %s is %s %s (%s)', (value, unit, other, otherUnit) => {
    expect(valueOf(converted(exact(value), unit, otherUnit))).toBe(other);
    expect(valueOf(converted(exact(other), otherUnit, unit))).toBe(value);
  });

  const cone = workedExample(
    'we-cone-02',
    z.object({ F: z.array(z.number()), rates_F_per_h: z.array(z.number()) }),
    z.object({ C: z.array(z.number()), rates_C_per_h: z.array(z.number()) }),
  );
  test.each(cone.inputs.F.map((fahrenheit, at) => [fahrenheit, cone.expected.C[at]] as const))(
    `PIECE-12 %s °F is about %s °C (${cone.by})`,
    (fahrenheit, celsius) => {
      expect(shownConversion({ value: whole(BigInt(fahrenheit)), unit: 'F', shownIn: 'C', limits: [] })).toMatchObject({
        ok: true,
        value: { text: String(celsius) },
      });
    },
  );
  test.each(cone.inputs.rates_F_per_h.map((rate, at) => [rate, cone.expected.rates_C_per_h[at]] as const))(
    `PIECE-12 %s °F an hour is %s °C an hour (${cone.by})`,
    (rate, celsius) => {
      expect(valueOf(convertedStep(whole(BigInt(rate)), 'F', 'C'))).toBe(String(celsius));
    },
  );

  test('PIECE-12 a length is never read as a volume', () => {
    expect(valueOf(converted(exact('1'), 'in', 'mL'))).toBe('not-the-same-quantity');
    expect(valueOf(convertedStep(exact('1'), 'F', 'mm'))).toBe('not-the-same-quantity');
  });

  test.each([
    ['25.4', 'mm', 'in', ['25'], '1', true],
    ['24', 'mm', 'in', ['25'], '0.94', false],
    ['25', 'mm', 'in', ['25'], '0.98', false],
    ['25.04', 'mm', 'in', ['25'], '0.99', false],
    ['25.001', 'mm', 'in', ['25'], '0.98429', false],
    ['1099.999', 'mL', 'fl-oz-us', ['1100'], '37.19539', false],
    ['1100', 'mL', 'fl-oz-us', ['1100', '3000'], '37.2', false],
    ['999.9', 'C', 'F', ['1000'], '1831.8', false],
    ['0.985', 'in', 'mm', ['1'], '25', false],
  ] as const)('PIECE-13 %s %s in %s beside the limits %s is shown as %s', (value, unit, shownIn, limits, text, isExact) => {
    const shown = shownConversion({ value: exact(value), unit, shownIn, limits: limits.map(exact) });
    expect(shown).toEqual({ ok: true, value: { text, exact: isExact } });
  });
});

describe('typed measures', () => {
  test.each([
    ['62', '62'], ['62.5', '62.5'], ['62,5', '62.5'], ['3 3/8', '3.375'], ['3⅜', '3.375'], ['½', '0.5'], ['1/4', '0.25'], ['３．５', '3.5'],
    ['1 234', '1234'], ['3 1⁄2', '3.5'], ['0.125', '0.125'],
  ])('PIECE-14 "%s" is %s', (typed, value) => {
    expect(valueOf(readTypedMeasure(typed))).toBe(value);
  }); // prettier-ignore

  test.each(['', 'x', '1e309', 'NaN', '-5', '1.2.3', '1.234,5', '3 /', '1/0', '3 3/8 1/2', '1'.repeat(400), '٣'])(
    'PIECE-14 "%s" is refused',
    (typed) => {
      expect(readTypedMeasure(typed)).toEqual({ ok: false, error: 'not-a-number' });
    },
  );

  test('PIECE-14 one mark before three digits is refused as unclear', () => {
    expect(readTypedMeasure('1.234')).toEqual({ ok: false, error: 'thousands-unclear' });
    expect(readTypedMeasure('1,234')).toEqual({ ok: false, error: 'thousands-unclear' });
  });

  test('PIECE-14 only a temperature may be below zero', () => {
    expect(valueOf(readTypedTemperature('-40'))).toBe('-40');
    expect(valueOf(readTypedTemperature('−1,5'))).toBe('-1.5');
    expect(valueOf(readTypedTemperature('2232'))).toBe('2232');
    expect(readTypedTemperature('--4')).toEqual({ ok: false, error: 'not-a-number' });
  });
});
