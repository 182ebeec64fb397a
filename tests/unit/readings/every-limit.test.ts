import { expect, test } from 'vitest';
import type { Answers } from '@/lib/checks/domain/knowledge';
import type { LimitPayload, Rule } from '@/lib/regions/domain/rule';
import { regionVerdicts } from '@/lib/readings/domain/region-verdicts';
import type { Verdict } from '@/lib/readings/domain/verdict';
import { aReading, answersOf, aReport } from '../../builders/report';
import { aDate, seedLine, seedSheets } from '../../builders/seed-sheets';

/*
 * Every limit of the sheets with its figure, in its own unit, on each side of it. The expected side is written down here by
 * the rule's own words (how many decide, and where the figure itself falls), not taken from the code that decides.
 */
const DAY = aDate('2026-12-01');
/** Denmark reads the limits of the EU. */
const PLACES: readonly string[] = ['eu', 'us', 'us-ca', 'ca', 'jp'];

const food = {
  use: 'food',
  'for-children': false,
  'packaging-or-storage': false,
  'lead-or-cadmium-in-materials': true,
  inside: 'glazed',
  'outside-glazed': true,
  employees: 12,
};
const hollow = { ...food, form: 'bowl', 'holds-liquid': true, 'drinking-rim': false, 'rim-decorated': false, contact: ['dry'] };
const pieces: readonly Answers[] = [true, false].flatMap((cooked) =>
  [
    { ...hollow, 'depth-mm': 20, 'capacity-ml': 300 },
    { ...hollow, 'depth-mm': 60, 'capacity-ml': 600 },
    { ...hollow, 'depth-mm': 120, 'capacity-ml': 2000 },
    { ...hollow, 'depth-mm': 250, 'capacity-ml': 4000 },
    { ...hollow, form: 'mug', 'drinking-rim': true, 'rim-decorated': true, 'depth-mm': 95, 'capacity-ml': 350 },
    { ...hollow, form: 'jug', 'depth-mm': 200, 'capacity-ml': 1500 },
    { ...hollow, 'depth-mm': 20, 'capacity-ml': 300, 'for-children': true },
  ].map((piece) => answersOf({ ...piece, 'cooked-in': cooked })),
);

type Limited = { readonly id: string; readonly region: string; readonly payload: LimitPayload };
const limits = [...seedSheets.values()]
  .flatMap(({ rules }) => rules)
  .flatMap(({ id, region, payload, to }: Rule): readonly Limited[] =>
    payload.topic === 'limit' && to === null && PLACES.includes(region) ? [{ id, region, payload }] : [],
  );

const PARTS = { inside: 'vessel', rim: 'rim', article: 'content', glaze: 'content', 'metal-part': 'vessel' } as const;
const extracts = (['vessel', 'rim'] as const).map((part) => ({ part, volumeMl: { numerator: 100n, denominator: 1n }, areaCm2: null }));

function verdictOf({ id, region, payload }: Limited, answers: Answers, value: string): Verdict | undefined {
  const { substance, part, amount, decision } = payload;
  const many = decision.kind === 'first-then-three' ? 1 : decision.specimens;
  const readings = Array.from({ length: many }, (_, at) =>
    aReading({ specimen: String(at), substance, part: PARTS[part], unit: amount.unit, value }),
  );
  const { verdicts } = regionVerdicts(seedLine(region, DAY), answers, aReport({ readings, extracts }), DAY);
  return verdicts.find(({ rule, alsoPossible }) => rule === id && alsoPossible.length === 0);
}

const shift = (value: number, by: string): string => {
  const places = 6;
  const steps = BigInt(Math.round(value * 10 ** places)) + BigInt(by);
  const digits = steps.toString().padStart(places + 1, '0');
  return `${digits.slice(0, -places)}.${digits.slice(-places)}`;
};

const ON_LIMIT = {
  within: { status: 'within', reason: null },
  over: { status: 'over', reason: null },
  unclear: { status: 'cannot-tell', reason: 'at-limit' },
};

test('READ-11 the sheets hold limits of all these places', () => {
  expect([...new Set(limits.map(({ region }) => region))].sort()).toEqual([...PLACES].sort());
  expect(limits.length).toBeGreaterThanOrEqual(49);
});

test.each(limits)('READ-11 $id on both sides of its border', (limit) => {
  const answers = pieces.find((piece) => verdictOf(limit, piece, '0') !== undefined);
  expect(answers, 'a piece for which this limit alone counts').toBeDefined();
  const { amount, decision } = limit.payload;
  const at = (value: string) => verdictOf(limit, answers ?? {}, value);
  expect(at(shift(amount.value, '-1'))).toMatchObject({ status: 'within', reason: null });
  expect(at(shift(amount.value, '0'))).toMatchObject(ON_LIMIT[decision.atLimit]);
  const retest = decision.kind === 'first-then-three';
  expect(at(shift(amount.value, '1'))).toMatchObject({ status: retest ? 'test-more' : 'over', reason: null });
  if (!retest) return;
  expect(at(shift(amount.value * 1.5, '0'))).toMatchObject({ status: 'test-more' });
  expect(at(shift(amount.value * 1.5, '1'))).toMatchObject({ status: 'over' });
});
