import fc from 'fast-check';
import { beforeAll, expect, test } from 'vitest';
import { z } from 'zod';
import { OPTIONS, POST } from '@/app/api/v1/verdicts/route';
import { db } from '@/db/connection';
import { foundSheets } from './founding';

beforeAll(foundSheets);

const AT = 'http://localhost:3000/api/v1/verdicts';
const JSON_TYPE = { 'content-type': 'application/json' };
const post = (body: unknown, headers: Record<string, string> = JSON_TYPE) =>
  POST(new Request(AT, { method: 'POST', headers, body: typeof body === 'string' ? body : JSON.stringify(body) }));

const verdict = z.looseObject({ substance: z.string(), part: z.string(), status: z.string(), reason: z.string().nullable() });
const reply = z.strictObject({
  on: z.string(),
  regions: z.array(
    z.strictObject({
      code: z.string(),
      categories: z.array(z.strictObject({ term: z.string(), name: z.string(), region: z.string(), possible: z.boolean() })),
      verdicts: z.array(verdict),
      authorities: z.array(z.looseObject({ name: z.string() })).min(1),
      accreditation: z.array(z.looseObject({ name: z.string() })),
    }),
  ),
  caution: z.string(),
});
const problem = z.looseObject({ status: z.number(), errors: z.array(z.object({ pointer: z.string(), detail: z.string() })).optional() });

const BODY = {
  regions: ['eu', 'us', 'ca'],
  on: '2026-12-01',
  answers: { use: 'food', form: 'mug', 'depth-mm': 95, 'capacity-ml': 350, 'holds-liquid': true },
  readings: [
    { specimen: 'A', part: 'vessel', substance: 'Pb', value: 0.31, unit: 'mg/L' },
    { specimen: 'A', substance: 'Cd', value: 0.01, unit: 'ug/mL', below: true },
  ],
  extracts: [
    { part: 'vessel', volumeMl: 320, areaCm2: null },
    { part: 'lid', volumeMl: 100 },
  ],
  conditions: { temperatureC: 22, hours: 24, dark: true, hot: false },
};

async function faults(body: unknown): Promise<z.output<typeof problem>> {
  const response = await post(body);
  expect(response.headers.get('content-type')).toBe('application/problem+json');
  const told = problem.parse(await response.json());
  expect(told.status).toBe(response.status);
  return told;
}

test('READ-14 the request of the interface gives a verdict for each place, with whom to ask and the caution', async () => {
  const told = reply.parse(await (await post(BODY)).json());
  expect(told.on).toBe('2026-12-01');
  expect(told.regions.map(({ code }) => code)).toEqual(['eu', 'us', 'ca']);
  const lines = told.regions.map(({ verdicts }) =>
    verdicts.map(({ substance, part, status, reason }) => [substance, part, status, reason].filter((one) => one !== null).join(' ')),
  );
  expect(lines).toEqual([
    ['Cd vessel within', 'Pb vessel within'],
    ['Pb content cannot-tell not-measured', 'Cd vessel test-more', 'Pb vessel test-more'],
    ['Cd rim cannot-tell not-measured', 'Cd vessel within', 'Pb rim cannot-tell not-measured', 'Pb vessel within'],
  ]);
  const fields = [
    ...['substance', 'part', 'per', 'status', 'reason', 'limit', 'compared', 'rule', 'region', 'strength', 'standing', 'evidence'],
    ...['decisionEvidence', 'decision', 'why', 'alsoPossible', 'assuming', 'sources'],
  ];
  expect(Object.keys(told.regions[0]?.verdicts[0] ?? {}).sort()).toEqual(fields.sort());
  expect(told.regions[0]?.verdicts[1]).toMatchObject({
    limit: { value: 1.5, unit: 'mg/L' },
    compared: { value: '0.31', unit: 'mg/L' },
    rule: 'eu-pb-cat3',
    alsoPossible: ['eu-pb-cat2'],
    assuming: ['cooked-in'],
  });
  expect(told.caution).toMatch(/not proof.*before you sell.*accredited/);
});

test('READ-14 the same request gives the same bytes, in whatever order its figures stand, and keeps nothing', async () => {
  const [one, two] = await Promise.all([post(BODY), post({ ...BODY, readings: BODY.readings.toReversed() })]);
  expect(one.status).toBe(200);
  expect(one.headers.get('access-control-allow-origin')).toBe('*');
  expect(one.headers.get('set-cookie')).toBeNull();
  expect(await one.text()).toBe(await two.text());
  expect(await db('checks').pluck('id')).toEqual([]);
  expect(await db('copies').pluck('hash')).toEqual([]);
});

test('READ-14 each fault is told with its place', async () => {
  const pointers = async (change: object) => (await faults({ ...BODY, ...change })).errors?.map(({ pointer }) => pointer);
  const [lead] = BODY.readings;
  expect(await pointers({ readings: [lead, lead] })).toEqual(['/readings/1']);
  expect(await pointers({ readings: [{ ...lead, value: '1,5' }] })).toEqual(['/readings/0/value']);
  expect(await pointers({ readings: [{ ...lead, colour: 1 }] })).toEqual(['/readings/0/colour']);
  expect(await pointers({ furtherPieces: [lead, { ...lead, specimen: 'B', unit: 'mg/gal' }] })).toEqual(['/furtherPieces/1/unit']);
  expect(await pointers({ answers: { use: 'eat' }, extracts: [{ part: 'foot' }] })).toEqual(['/answers/use', '/extracts/0/part']);
  expect(await pointers({ conditions: { light: 'dark' }, declined: [] })).toEqual(['/conditions/light', '/declined']);
  expect(await pointers({ on: '2026-02-30' })).toEqual(['/on']);
  expect(await faults({ ...BODY, regions: ['dk', 'zz'] })).toMatchObject({ status: 404, errors: [{ pointer: '/regions/1' }] });
  expect(await faults('{"regions":["eu"],"readings":[{"specimen":"A","substance":"Pb","value":1e309,"unit":"mg/L"}]}')).toMatchObject({
    status: 422,
    errors: [{ pointer: '/readings/0/value' }],
  });
  expect((await post(BODY, { 'content-type': 'text/plain' })).status).toBe(415);
  expect(OPTIONS().headers.get('access-control-allow-methods')).toBe('POST');
});

const ODD = [
  null,
  true,
  0,
  -1,
  1e308,
  '',
  'eu',
  'Pb',
  'A',
  'mg/L',
  '0.5',
  '1,5',
  '< 0.1',
  '\u0000',
  '\ud800',
  '９',
  'µg/mL',
  'vessel',
  'lid',
  'food',
];
const KEYS = [
  'regions',
  'on',
  'answers',
  'readings',
  'furtherPieces',
  'extracts',
  'conditions',
  'specimen',
  'value',
  'unit',
  '__proto__',
  'use',
];
const odd = fc.letrec((tie) => ({
  value: fc.oneof(
    { depthSize: 'small' },
    fc.constantFrom(...ODD),
    fc.double(),
    fc.string(),
    fc.array(tie('value'), { maxLength: 4 }),
    fc.dictionary(fc.oneof(fc.constantFrom(...KEYS), fc.string()), tie('value'), { maxKeys: 5 }),
  ),
})).value;
const nearly = (fields: Record<string, fc.Arbitrary<unknown>>) =>
  fc.record(Object.fromEntries(Object.entries(fields).map(([key, value]) => [key, fc.oneof({ weight: 4, arbitrary: value }, odd)])), {
    requiredKeys: [],
  });
const reading = nearly({
  specimen: fc.constantFrom('A', 'B'),
  part: fc.constantFrom('vessel', 'lid', 'rim', 'content'),
  substance: fc.constantFrom('Pb', 'Cd'),
  value: fc.oneof(fc.double({ min: 0, max: 10 }), fc.constantFrom('0.31', '4', '9'.repeat(40))),
  unit: fc.constantFrom('mg/L', 'ppm', '%', 'mg/article', 'mg/dm2'),
  below: fc.boolean(),
});
const whole = nearly({
  regions: fc.subarray(['eu', 'us-ca', 'ca', 'jp', 'zz'], { minLength: 1 }),
  answers: nearly({ use: fc.constant('food'), 'depth-mm': fc.nat(100), lidded: fc.boolean() }),
  readings: fc.array(reading, { maxLength: 4 }),
  furtherPieces: fc.array(reading, { maxLength: 3 }),
  extracts: fc.array(nearly({ part: fc.constantFrom('vessel', 'lid', 'rim'), volumeMl: fc.nat(500), areaCm2: fc.nat(500) }), {
    maxLength: 2,
  }),
  conditions: nearly({ temperatureC: fc.nat(40), hours: fc.nat(30), dark: fc.boolean(), hot: fc.boolean() }),
});
const body = fc.oneof(
  { weight: 2, arbitrary: whole.map((value) => JSON.stringify(value)) },
  odd.map((value) => JSON.stringify(value)),
  fc.tuple(whole, fc.nat(400)).map(([value, at]) => JSON.stringify(value).slice(0, at)),
  fc.string(),
  fc.integer({ min: 1, max: 3000 }).map((deep) => `{"readings":${'['.repeat(deep)}${']'.repeat(deep)}}`),
);

test('READ-15 two thousand malformed bodies give clear refusals, never a broken answer, and leave nothing behind', async () => {
  const seen = new Map<number, number>();
  await fc.assert(
    fc.asyncProperty(body, async (text) => {
      const { status } = await post(text);
      seen.set(status, (seen.get(status) ?? 0) + 1);
      expect([200, 400, 404, 413, 422]).toContain(status);
    }),
    { numRuns: 2000, seed: 20261201 },
  );
  expect(({} as Record<string, unknown>)['readings']).toBeUndefined();
  expect(await db('checks').pluck('id')).toEqual([]);
  // Health of the generator: it reaches every kind of refusal, and answers too.
  expect(seen.get(422) ?? 0).toBeGreaterThan(500);
  expect(seen.get(400) ?? 0).toBeGreaterThan(100);
  expect(seen.get(200) ?? 0).toBeGreaterThan(5);
}, 180_000);
