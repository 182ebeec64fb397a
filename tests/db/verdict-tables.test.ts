import { beforeAll, expect, test } from 'vitest';
import { z } from 'zod';
import { POST } from '@/app/api/v1/verdicts/route';
import { expectLines, readingTables } from '../builders/reading-tables';
import { foundSheets } from './founding';

beforeAll(foundSheets);

const reply = z.object({
  regions: z
    .array(
      z.object({
        verdicts: z.array(
          z.looseObject({ substance: z.string(), part: z.string(), compared: z.looseObject({ value: z.string() }).nullable() }),
        ),
      }),
    )
    .length(1),
});

/** The verdicts of one place, over the public interface and out of the database. */
async function verdictsOf(body: unknown) {
  const request = new Request('http://localhost:3000/api/v1/verdicts', {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify(body),
  });
  const response = await POST(request);
  expect(response.status).toBe(200);
  const [region] = reply.parse(await response.json()).regions;
  return (region?.verdicts ?? []).map((verdict) => ({ ...verdict, compared: verdict.compared?.value ?? null }));
}

for (const { file, table } of readingTables) {
  test(`READ-26 every row of ${file} comes out the same over /api/v1/verdicts`, async () => {
    for (const { name, region, source, expect: lines, ...body } of table) {
      const found = await verdictsOf({ regions: [region], on: '2026-12-01', ...body });
      expect(found.length, `${name} (${source})`).toBeGreaterThan(0);
      expectLines(found, lines);
    }
  });
}
