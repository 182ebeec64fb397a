import { describe, expect, test } from 'vitest';
import { decimalOf } from '@/lib/kernel/decimal';
import { answersInput } from '@/lib/checks/schema';
import { readAmount } from '@/lib/readings/domain/amount';
import { factorOf, isKnownUnit } from '@/lib/readings/domain/unit';
import { verdictInput } from '@/lib/readings/schema';
import { exactly } from '../../builders/report';

const input = verdictInput(answersInput.default({}));

describe('READ-1 values', () => {
  test.each([
    [0, '0'],
    [-0, '0'],
    [0.31, '0.31'],
    [1e-7, '0.0000001'],
    [1.5e-9, '0.0000000015'],
    [1e21, '1000000000000000000000'],
    [1.25e22, '12500000000000000000000'],
    ['0.31', '0.31'],
    [' 4 ', '4'],
    ['1.234', '1.234'],
    ['０．３１', '0.31'],
    ['0.100000000000000005551115123125782702118', '0.100000000000000005551115123125782702118'],
  ])('%j is read as %s', (given, told) => {
    const read = readAmount(given);
    expect(read.ok ? decimalOf(read.value) : null).toBe(told);
  });

  test.each([
    [undefined, 'not-a-number'],
    [null, 'not-a-number'],
    [true, 'not-a-number'],
    [{}, 'not-a-number'],
    [['1'], 'not-a-number'],
    ['', 'not-a-number'],
    [NaN, 'not-a-number'],
    ['NaN', 'not-a-number'],
    [1e309, 'not-a-number'],
    ['1e309', 'not-a-number'],
    ['1e3', 'not-a-number'],
    ['Infinity', 'not-a-number'],
    ['0x10', 'not-a-number'],
    ['+1', 'not-a-number'],
    ['.5', 'not-a-number'],
    ['5.', 'not-a-number'],
    ['1 000', 'not-a-number'],
    ["1'000", 'not-a-number'],
    ['1_000', 'not-a-number'],
    ['10²', 'not-a-number'],
    ['½', 'not-a-number'],
    ['①', 'not-a-number'],
    ['٣', 'not-a-number'],
    ['1.2.3', 'not-a-number'],
    ['1,5', 'comma'],
    ['0,01', 'comma'],
    ['1.234,5', 'comma'],
    ['1,234.5', 'comma'],
    ['１，５', 'comma'],
    [-0.1, 'negative'],
    [-1e-9, 'negative'],
    ['-1', 'negative'],
    ['−1', 'negative'],
    ['< 0,01', 'sign-of-below'],
    ['<0.01', 'sign-of-below'],
    ['＜0.01', 'sign-of-below'],
    ['9'.repeat(41), 'too-many-digits'],
    ['9'.repeat(400), 'too-many-digits'],
    [`0.${'1'.repeat(40)}`, 'too-many-digits'],
    [1e300, 'too-many-digits'],
    [5e-324, 'too-many-digits'],
  ])('%j is refused: %s', (given, fault) => {
    expect(readAmount(given)).toEqual({ ok: false, error: fault });
  });

  test('forty digits are read', () => {
    const digits = '9'.repeat(40);
    const read = readAmount(digits);
    expect(read.ok && decimalOf(read.value)).toBe(digits);
  });
});

describe('READ-1 units', () => {
  test.each([
    'mg/L',
    'MG/l',
    'ug/mL',
    'µg/mL',
    'μg/mL',
    'ΜG/ML',
    ' ppm ',
    'PPB',
    'mg/dm²',
    'ug/cm2',
    'ｍｇ/Ｌ',
    '%',
    '％',
    'mg/article',
    'mg/kg',
  ])('%s is known', (unit) => {
    expect(isKnownUnit(unit)).toBe(true);
  });
  test.each(['', 'mg', 'g/L', 'mg/gal', 'mg/m2', 'constructor', '__proto__', 'mgL', 'ng/mL'])('%j is not', (unit) => {
    expect(isKnownUnit(unit)).toBe(false);
  });
  test('parts per million are of mass only for content', () => {
    expect(factorOf('ppm', 'L')).toEqual(exactly(1));
    expect(factorOf('%', 'kg')).toEqual(exactly(10000));
    expect(factorOf('%', 'L')).toBeNull();
  });
});

const faults = (body: object): readonly string[] => {
  const parsed = input.safeParse({ regions: ['eu'], ...body });
  return parsed.success ? [] : parsed.error.issues.map(({ path }) => `/${path.map(String).join('/')}`);
};
const one = { specimen: 'A', substance: 'Pb', value: 1, unit: 'mg/L' };

describe('READ-1 the door', () => {
  test.each([
    [{ readings: [one, { ...one, substance: 'Cd' }] }, []],
    [{ readings: [one, one] }, ['/readings/1']],
    [{ readings: [one, { ...one, specimen: ' A ' }] }, ['/readings/1']],
    [{ readings: [one, { ...one, part: 'lid' }] }, []],
    [{ readings: [one], furtherPieces: [one] }, []],
    [{ furtherPieces: [one, { ...one, specimen: 'B' }, one] }, ['/furtherPieces/2']],
    [{ readings: [{ ...one, substance: 'lead' }] }, ['/readings/0/substance']],
    [{ readings: [{ ...one, unit: 'mg/gal' }] }, ['/readings/0/unit']],
    [{ readings: [{ ...one, part: 'handle' }] }, ['/readings/0/part']],
    [{ readings: [{ substance: 'Pb', value: 1, unit: 'mg/L' }] }, ['/readings/0/specimen']],
    [{ readings: [{ specimen: 'A', substance: 'Pb', unit: 'mg/L' }] }, ['/readings/0/value']],
    [{ extracts: [{ part: 'lid', volumeMl: 0 }] }, ['/extracts/0/volumeMl']],
    [{ extracts: [{ part: 'lid', volumeMl: '1,5' }] }, ['/extracts/0/volumeMl']],
    [{ extracts: [{ part: 'lid', volumeMl: null, areaCm2: '12.5' }] }, []],
    [{ extracts: [{ part: 'lid' }, { part: 'lid' }] }, ['/extracts/1']],
    [{ conditions: { hours: -1 } }, ['/conditions/hours']],
    [{ conditions: { dark: 'yes' } }, ['/conditions/dark']],
    [{ declined: [] }, ['/']],
    [{ regions: ['eu', 'eu'] }, ['/regions']],
    [{ regions: [] }, ['/regions']],
  ])('%j', (body, at) => {
    expect(faults(body)).toEqual(at);
  });
});

describe('READ-3 a figure is shown exactly while its decimal ends', () => {
  test.each([
    [1n, 8n, '0.125'],
    [1n, 1024n, '0.0009765625'],
    [1n, 3n, '0.333333'],
    [2n, 3n, '0.666667'],
    [1n, 1n, '1'],
    [100n, 1n, '100'],
    [1n, 6n, '0.166667'],
    [1n, 3_000_000n, '0'],
    [1n, 1_500_000n, '0.000001'],
  ])('%s over %s', (numerator, denominator, told) => {
    expect(decimalOf({ numerator, denominator })).toBe(told);
  });
});
