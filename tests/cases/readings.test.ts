import { expect, test } from 'vitest';
import { answersInput } from '@/lib/checks/schema';
import { regionVerdicts } from '@/lib/readings/domain/region-verdicts';
import { verdictInput } from '@/lib/readings/schema';
import { expectLines, readingTables } from '../builders/reading-tables';
import { aDate, seedLine } from '../builders/seed-sheets';

const DAY = aDate('2026-12-01');
const input = verdictInput(answersInput.default({}));

for (const { file, table } of readingTables) {
  test.each(table)(`READ-20 ${file}: $name ($source)`, ({ name: _, region, source: _source, expect: lines, ...body }) => {
    const report = input.parse({ regions: [region], ...body });
    const { verdicts } = regionVerdicts(seedLine(region, DAY), report.answers, report, DAY);
    expectLines(
      verdicts.map((verdict) => ({ ...verdict, compared: verdict.compared?.value ?? null })),
      lines,
    );
  });
}

test('READ-20 the tables hold what they promise: 120 rows, 40 of them on borders, conversions and gaps', () => {
  expect(readingTables.flatMap(({ table }) => table).length).toBeGreaterThanOrEqual(120);
  expect(readingTables.map(({ file }) => file).sort()).toEqual(
    [
      'borders',
      'borders-americas',
      'borders-apac',
      'borders-europe',
      'borders-standards',
      'conditions',
      'content',
      'conversions',
      'lids',
      'missing',
      'non-detects',
      'retests',
      'rims',
    ].sort(),
  );
});
