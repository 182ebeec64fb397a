import fc from 'fast-check';
import { beforeAll, expect, test } from 'vitest';
import { POST } from '@/app/api/v1/checks/route';
import { db } from '@/db/connection';
import { foundSheets } from './founding';

beforeAll(foundSheets);

const KEYS = [
  'regions',
  'on',
  'answers',
  'declined',
  'keep',
  '__proto__',
  'constructor',
  'toString',
  'depth-mm',
  'contact',
  'turnover-a-year',
];
const odd = fc.letrec((tie) => ({
  value: fc.oneof(
    { depthSize: 'small' },
    fc.constantFrom(
      null,
      true,
      false,
      0,
      -1,
      1e308,
      '',
      'dk',
      'us-ca',
      '2026-12-01',
      '0',
      ' ',
      '\u0000',
      '\ud800',
      'ǅ',
      '🍞',
      "' or 1=1-- ",
    ),
    fc.double(),
    fc.string(),
    fc.array(tie('value'), { maxLength: 4 }),
    fc.dictionary(fc.oneof(fc.constantFrom(...KEYS), fc.string()), tie('value'), { maxKeys: 5 }),
  ),
})).value;

const body = fc.oneof(
  odd.map((value) => JSON.stringify(value)),
  fc.record({ regions: odd, answers: odd, declined: odd, on: odd, keep: odd }, { requiredKeys: [] }).map((value) => JSON.stringify(value)),
  fc.tuple(odd, fc.nat(200)).map(([value, at]) => JSON.stringify(value).slice(0, at)),
  fc.string(),
  fc.integer({ min: 1, max: 3000 }).map((deep) => `${'['.repeat(deep)}${']'.repeat(deep)}`),
  fc.constantFrom(
    '{"regions":["dk"],"regions":["eu"]}',
    '{"regions":["dk"],"answers":{"depth-mm":1e999}}',
    '\ufeff{}',
    '{"regions":["dk"],}',
  ),
);

test('API-11 two thousand malformed bodies give clear refusals, never a broken answer, and leave nothing behind', async () => {
  const seen = new Map<number, number>();
  await fc.assert(
    fc.asyncProperty(body, async (text) => {
      const request = new Request('http://localhost/api/v1/checks', {
        method: 'POST',
        headers: { 'content-type': 'application/json' },
        body: text,
      });
      const response = await POST(request);
      seen.set(response.status, (seen.get(response.status) ?? 0) + 1);
      expect(response.status).toBeLessThan(500);
      expect([200, 400, 404, 413, 422]).toContain(response.status);
    }),
    { numRuns: 2000, seed: 20261201 },
  );
  expect(({} as Record<string, unknown>)['regions']).toBeUndefined();
  expect(await db('checks').pluck('id')).toEqual([]);
  // Health of the generator: it reaches more than one kind of refusal.
  expect(seen.get(422) ?? 0).toBeGreaterThan(500);
  expect(seen.get(400) ?? 0).toBeGreaterThan(100);
}, 120_000);
