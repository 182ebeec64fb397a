import { readdirSync, readFileSync } from 'node:fs';
import { expect } from 'vitest';
import { z } from 'zod';

/*
 * The tables of tests/cases/readings can be read without the code: a place, a piece, a lab's figures, and how each line must
 * come out. Each row names where its rule or its figures stand.
 */
const FOLDER = new URL('../cases/readings/', import.meta.url);

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
export type Expected = z.output<typeof expected>;

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

/** Every table, by the name of its file. */
export const readingTables = readdirSync(FOLDER).map((file) => ({
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

/** A verdict as the engine or the API gives it, with the compared figure alone. */
export type FoundVerdict = Readonly<Record<string, unknown>> & { readonly substance: string; readonly part: string };

/** Asserts that a row's lines stand among the verdicts, each exactly once. */
export function expectLines(found: readonly FoundVerdict[], lines: readonly Expected[]): void {
  for (const line of lines) {
    const { status, reason = null, compared, ifConfirmed, alsoPossible, assuming } = line;
    const figure = compared === undefined ? {} : { compared };
    const open = { ...(alsoPossible === undefined ? {} : { alsoPossible }), ...(assuming === undefined ? {} : { assuming }) };
    const fitting = found.filter((one) => one.substance === line.substance && one.part === line.part);
    expect(fitting).toContainEqual(expect.objectContaining({ ...wanted(line), status, reason, ...figure, ...open }));
    expect(fitting.filter((one) => Object.entries(wanted(line)).every(([key, value]) => one[key] === value))).toHaveLength(1);
    expect(fitting.find((one) => 'ifConfirmed' in one)?.['ifConfirmed']).toBe(ifConfirmed);
  }
}
