import { readdirSync, readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { z } from 'zod';
import { answersInput } from '@/lib/checks/schema';
import { regionVerdicts } from '@/lib/readings/domain/region-verdicts';
import { verdictInput } from '@/lib/readings/schema';
import { aDate, seedLine } from '../builders/seed-sheets';

/*
 * The tables beside this file can be read without the code: a place, a piece, a lab's figures, and how each line must come
 * out. Each row names where its rule or its figures stand.
 */
const FOLDER = new URL('./readings/', import.meta.url);
const DAY = aDate('2026-12-01');

const expected = z
  .strictObject({
    substance: z.string(),
    part: z.enum(['vessel', 'lid', 'rim', 'content']),
    per: z.string().optional(),
    strength: z.string().optional(),
    status: z.enum(['within', 'over', 'test-more', 'cannot-tell']),
    reason: z.string().optional(),
    ifConfirmed: z.string().optional(),
    compared: z.string().optional(),
    rule: z.string().nullable().optional(),
    alsoPossible: z.array(z.string()).optional(),
    assuming: z.array(z.string()).optional(),
  })
  .refine(({ status, reason }) => (status === 'cannot-tell') === (reason !== undefined));
type Expected = z.output<typeof expected>;

const rows = z.array(
  z.strictObject({
    name: z.string(),
    region: z.string(),
    answers: z.unknown(),
    readings: z.array(z.unknown()),
    furtherPieces: z.array(z.unknown()).optional(),
    extracts: z.array(z.unknown()).optional(),
    conditions: z.unknown().optional(),
    expect: z.array(expected).min(1),
    source: z.string().min(1),
  }),
);

const input = verdictInput(answersInput.default({}));
const tables = readdirSync(FOLDER).map((file) => ({
  file: file.replace('.json', ''),
  table: rows.parse(JSON.parse(readFileSync(new URL(file, FOLDER), 'utf8'))),
}));

const wanted = ({ substance, part, per, strength, rule }: Expected) => ({
  substance,
  part,
  ...(per === undefined ? {} : { per }),
  ...(strength === undefined ? {} : { strength }),
  ...(rule === undefined ? {} : { rule }),
});

for (const { file, table } of tables) {
  test.each(table)(`READ-20 ${file}: $name ($source)`, ({ name: _, region, source: _source, expect: lines, ...body }) => {
    const report = input.parse({ regions: [region], ...body });
    const { verdicts } = regionVerdicts(seedLine(region, DAY), report.answers, report, DAY);
    const found = verdicts.map((verdict) => ({ ...verdict, compared: verdict.compared?.value ?? null }));
    for (const line of lines) {
      const { status, reason = null, compared, ifConfirmed, alsoPossible, assuming } = line;
      const figure = compared === undefined ? {} : { compared };
      const open = { ...(alsoPossible === undefined ? {} : { alsoPossible }), ...(assuming === undefined ? {} : { assuming }) };
      const fitting = found.filter((one) => one.substance === line.substance && one.part === line.part);
      expect(fitting).toContainEqual(expect.objectContaining({ ...wanted(line), status, reason, ...figure, ...open }));
      expect(fitting.filter((one) => Object.entries(wanted(line)).every(([key, value]) => Reflect.get(one, key) === value))).toHaveLength(
        1,
      );
      expect(fitting.find((one) => 'ifConfirmed' in one)?.ifConfirmed).toBe(ifConfirmed);
    }
  });
}

test('READ-20 the tables hold what they promise: 120 rows, 40 of them on borders, conversions and gaps', () => {
  expect(tables.flatMap(({ table }) => table).length).toBeGreaterThanOrEqual(120);
  expect(tables.map(({ file }) => file).sort()).toEqual(
    ['borders', 'conditions', 'content', 'conversions', 'lids', 'missing', 'non-detects', 'retests', 'rims'].sort(),
  );
});
