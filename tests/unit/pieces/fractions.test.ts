import { describe, expect, test } from 'vitest';
import { compare, decimalText, difference, numberOf, product, quotient, ratio, readFraction, sum, whole } from '@/lib/kernel/fraction';

describe('exact numbers', () => {
  test.each([
    ['12.50', '12.5'], ['-0.1', '-0.1'], ['+3', '3'], ['1e3', '1000'], ['1.5E-3', '0.0015'], ['007', '7'], ['-0', '0'], [0.1, '0.1'], [1e21, '1000000000000000000000'],
    [1e-7, '0.0000001'],
  ])('PIECE-18 %s reads as %s', (given, text) => {
    const read = readFraction(given);
    expect(read && decimalText(read, 12)).toBe(text);
  }); // prettier-ignore

  test.each([
    '',
    ' ',
    '.5',
    '5.',
    '1,5',
    '1e',
    '1e309',
    '1e9999',
    '0x10',
    'Infinity',
    '1 2',
    '--1',
    '1'.repeat(61),
    '１',
    NaN,
    Infinity,
    -Infinity,
  ])('PIECE-18 "%s" is refused', (given) => {
    expect(readFraction(given)).toBeNull();
  });

  test('PIECE-18 tenths add up', () => {
    const [a, b, c] = ['0.1', '0.2', '0.3'].map((text) => readFraction(text) ?? whole(0n));
    expect(a && b && c && compare(sum(a, b), c)).toBe(0);
  });

  test('PIECE-18 halves go away from zero, zeros at the end go', () => {
    const told = ['0.125', '-0.125', '0.995', '-0.004', '100', '0.999'].map((text) => decimalText(readFraction(text) ?? whole(7n), 2));
    expect(told).toEqual(['0.13', '-0.13', '1', '0', '100', '1']);
    expect([decimalText(whole(100n), 0), decimalText(whole(0n), 3)]).toEqual(['100', '0']);
  });

  test('PIECE-18 nothing is divided by zero', () => {
    expect([quotient(1n, 0n), ratio(whole(3n), whole(0n))]).toEqual([null, null]);
    expect(quotient(6n, -4n)).toEqual({ numerator: -3n, denominator: 2n });
  });

  test('PIECE-18 thirds are kept whole', () => {
    const third = quotient(1n, 3n) ?? whole(0n);
    expect(product(third, whole(3n))).toEqual(whole(1n));
    expect(difference(third, third)).toEqual(whole(0n));
    expect(numberOf(third, 6)).toBe(0.333333);
  });
});
