import { readdirSync, readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { z } from 'zod';
import { checklistOf } from '@/lib/checks/domain/checklist';
import { answersInput, declinedInput } from '@/lib/checks/schema';
import { aDate, seedLine } from '../builders/seed-sheets';

/*
 * The tables beside this file can be read without the code: a piece, a place, a day, and how its lines must come out.
 * Each row names where its border stands.
 */
const FOLDER = new URL('./', import.meta.url);
const rows = z.array(
  z.strictObject({
    name: z.string(),
    region: z.string(),
    on: z.string(),
    answers: answersInput,
    declined: declinedInput.default([]),
    lines: z.record(z.string(), z.enum(['applies', 'does-not-apply', 'not-settled', 'treat-as-applying', 'sources-disagree'])),
    source: z.string(),
  }),
);

for (const file of readdirSync(FOLDER).filter((name) => name.endsWith('.json'))) {
  const table = rows.parse(JSON.parse(readFileSync(new URL(file, FOLDER), 'utf8')));
  test.each(table)(`CHECK-50 ${file}: $name ($source)`, ({ region, on, answers, declined, lines }) => {
    const day = aDate(on);
    const judged = checklistOf(seedLine(region, day), answers, declined, day).rules;
    const found = Object.fromEntries(judged.filter(({ id }) => id in lines).map(({ id, status }) => [id, status]));
    expect(found).toEqual(lines);
  });
}
