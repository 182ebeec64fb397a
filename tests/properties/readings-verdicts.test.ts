import fc from 'fast-check';
import { expect, test } from 'vitest';
import { checklistOf } from '@/lib/checks/domain/checklist';
import { decimalOf } from '@/lib/kernel/decimal';
import { product, ratio, type Fraction } from '@/lib/kernel/fraction';
import { scaleBetween, type Basis } from '@/lib/readings/domain/extract';
import { PARTS, type Extract } from '@/lib/readings/domain/reading';
import { regionVerdicts } from '@/lib/readings/domain/region-verdicts';
import { factorOf, isKnownUnit, UNITS, type Per } from '@/lib/readings/domain/unit';
import { aReading, answersOf, aReport, exactly } from '../builders/report';
import { aDate, seedLine } from '../builders/seed-sheets';

const RUNS = { numRuns: 300, seed: 20261201 };
const DAY = aDate('2026-12-01');

const digits = fc
  .tuple(fc.bigInt({ min: 1n, max: 10n ** 20n }), fc.nat(12))
  .map(([value, places]) => exactly(`${String(value)}e-${String(places)}`));
const scale = (a: Fraction, factor: Fraction | null): Fraction => product(a, factor ?? exactly(0));

test('READ-2 from one unit to another and back is the very figure', () => {
  const pers: readonly Per[] = ['L', 'dm2', 'article', 'kg'];
  fc.assert(
    fc.property(fc.constantFrom(...pers), fc.constantFrom(...UNITS), fc.constantFrom(...UNITS), digits, (per, one, other, value) => {
      const [from, to] = [factorOf(one, per), factorOf(other, per)];
      if (from === null || to === null) return;
      const there = scale(value, ratio(from, to));
      expect(scale(there, ratio(to, from))).toEqual(value);
      expect(isKnownUnit(one)).toBe(true);
    }),
    { ...RUNS, numRuns: 2000 },
  );
});

test('READ-2 a way over extracts and back is the very figure', () => {
  const bases: readonly Basis[] = PARTS.flatMap((part) => (['L', 'dm2', 'article'] as const).map((per) => ({ per, part })));
  const extracts = fc.tuple(...PARTS.map((part) => fc.record({ part: fc.constant(part), volumeMl: digits, areaCm2: digits })));
  fc.assert(
    fc.property(fc.constantFrom(...bases), fc.constantFrom(...bases), extracts, digits, (from, to, given: readonly Extract[], value) => {
      const [there, back] = [scaleBetween(from, to, given), scaleBetween(to, from, given)];
      expect([there, back]).not.toContain(null);
      expect(scale(scale(value, there), back)).toEqual(value);
    }),
    { ...RUNS, numRuns: 1000 },
  );
});

const answers = fc
  .record(
    {
      use: fc.constantFrom('food', 'decorative'),
      form: fc.constantFrom('bowl', 'mug', 'jug', 'plate'),
      'holds-liquid': fc.boolean(),
      'depth-mm': fc.constantFrom(20, 25, 26, 90),
      'capacity-ml': fc.constantFrom(300, 1100, 3000, 3001),
      'cooked-in': fc.boolean(),
      lidded: fc.boolean(),
      'for-children': fc.boolean(),
      'rim-decorated': fc.boolean(),
      'lead-or-cadmium-in-materials': fc.boolean(),
      inside: fc.constantFrom('glazed', 'unglazed'),
      'changed-since-test': fc.boolean(),
    },
    { requiredKeys: [] },
  )
  .map(answersOf);

const reading = fc.record({
  specimen: fc.constantFrom('A', 'B', 'C'),
  part: fc.constantFrom(...PARTS),
  substance: fc.constantFrom('Pb', 'Cd', 'Co'),
  value: fc.constantFrom('0', '0.3', '0.5', '2', '4', '5.9', '6.1', '150').map(exactly),
  unit: fc.constantFrom(...UNITS),
  below: fc.boolean(),
});
const list = fc.uniqueArray(reading, {
  maxLength: 6,
  selector: ({ specimen, part, substance }) => [specimen, part, substance].join(' '),
});
const extract = fc.record({
  part: fc.constantFrom(...PARTS),
  volumeMl: fc.constantFrom(null, exactly(300)),
  areaCm2: fc.constantFrom(null, exactly('45.5')),
});
const report = fc.record({
  readings: list,
  furtherPieces: list,
  extracts: fc.uniqueArray(extract, { selector: ({ part }) => part, maxLength: 3 }),
  conditions: fc.record(
    { temperatureC: fc.constantFrom(20, 22, 30), hours: fc.constantFrom(24, 25), dark: fc.boolean(), hot: fc.boolean() },
    { requiredKeys: [] },
  ),
});
const region = fc.constantFrom('eu', 'dk', 'us', 'us-ca', 'ca', 'jp');

test('READ-8 READ-9 READ-10 READ-12 every possible limit stands in one entry, every figure is spoken of, and each reason has its place', () => {
  const seen = new Set<string>();
  fc.assert(
    fc.property(region, answers, report, (code, said, read) => {
      const line = seedLine(code, DAY);
      const { verdicts } = regionVerdicts(line, said, read, DAY);
      const possible = checklistOf(line, said, [], DAY).rules.filter(
        ({ topic, status }) => topic === 'limit' && status !== 'does-not-apply',
      );
      const told = verdicts.flatMap(({ rule, alsoPossible }) => (rule === null ? [] : [rule, ...alsoPossible]));
      expect(told.toSorted()).toEqual(possible.map(({ id }) => id).sort());
      const keys = verdicts.map(({ region: sheet, strength, substance, part, per }) =>
        JSON.stringify([sheet, strength, substance, part, per]),
      );
      expect(new Set(keys).size).toBe(keys.length);
      for (const { status, reason, ifConfirmed, limit, per } of verdicts) {
        seen.add(reason ?? status);
        expect(reason === null).toBe(status !== 'cannot-tell');
        expect(ifConfirmed).toBeUndefined();
        expect(limit === null).toBe(per === null);
        expect(reason === 'not-covered').toBe(said['changed-since-test'] === true);
      }
      for (const { substance, part } of [...read.readings, ...read.furtherPieces].filter(({ part: where }) => where !== 'lid'))
        expect(verdicts.some((one) => one.substance === substance && one.part === part)).toBe(true);
    }),
    RUNS,
  );
  const reasons = ['not-measured', 'no-limit', 'conditions-differ', 'needs-conversion', 'too-coarse', 'category-open', 'not-covered'];
  expect([...seen]).toEqual(expect.arrayContaining(['within', 'over', 'test-more', ...reasons]));
});

test('READ-2 READ-3 one amount in any spelling is one verdict, and a measured figure is shown as it was given', () => {
  const bowl = answersOf({
    use: 'food',
    'holds-liquid': true,
    'depth-mm': 60,
    'capacity-ml': 600,
    'cooked-in': false,
    'packaging-or-storage': false,
  });
  fc.assert(
    fc.property(region, digits, (code, value) => {
      const told = ['mg/L', 'ug/mL', 'ug/L', 'ppb'].map((unit) => {
        const factor = factorOf(unit, 'L') ?? exactly(1);
        const own = ratio(value, factor) ?? exactly(0);
        const read = aReport({ readings: [aReading({ value: decimalOf(own), unit })] });
        return regionVerdicts(seedLine(code, DAY), bowl, read, DAY).verdicts;
      });
      for (const verdicts of told) expect(verdicts).toEqual(told[0]);
      const lead = told[0]?.find(({ substance, part }) => substance === 'Pb' && part === 'vessel');
      expect(lead?.compared?.value).toBe(decimalOf(value));
    }),
    { ...RUNS, numRuns: 100 },
  );
});
