import { describe, expect, test } from 'vitest';
import { z } from 'zod';
import { checklistOf } from '@/lib/checks/domain/checklist';
import type { Answers } from '@/lib/checks/domain/knowledge';
import { answersInput } from '@/lib/checks/schema';
import { measuredAnswers } from '@/lib/pieces/domain/measured-answers';
import type { Vessel } from '@/lib/pieces/domain/vessel';
import { aDate, seedLine } from '../../builders/seed-sheets';
import { aCylinder, aVessel } from './vessels';
import { workedExample } from './worked-examples';

const DAY = aDate('2026-12-01');
const LINES = new Map(['dk', 'us', 'ca', 'jp'].map((code) => [code, seedLine(code, DAY)]));

/** The categories of a place that stay possible for a piece, by what its profile and a few more answers say. */
function categoriesOf(code: string, vessel: Vessel | null, more: Readonly<Record<string, unknown>>): readonly string[] {
  const line = LINES.get(code);
  if (line === undefined) throw new Error(`No line ${code}`);
  const measured = vessel === null ? {} : measuredAnswers(vessel, line.line.layers);
  const answers: Answers = answersInput.parse({ ...measured, ...more });
  return checklistOf(line, answers, [], DAY).categories.flatMap(({ term, possible }) => (possible ? [term] : []));
}

const FILLED = { 'holds-liquid': true, 'cooked-in': false, 'packaging-or-storage': false, form: 'bowl', 'drinking-rim': false };

type Row = readonly [name: string, code: string, vessel: Vessel, categories: readonly string[]];
const ROWS: readonly Row[] = [
  ['exactly 25 mm deep', 'dk', aCylinder(25, 600), ['eu-flat']],
  ['a little over 25 mm deep', 'dk', aCylinder(25.1, 600), ['eu-hollow']],
  ['25 mm as the difference of two heights', 'dk', aVessel([[80, 9.1], [80, 34.1]]), ['eu-flat']],
  ['exactly 25 mm deep', 'us', aCylinder(25, 600), ['us-flat']],
  ['deep and small', 'us', aCylinder(80, 1099.99), ['us-small-hollow']],
  ['deep, exactly 1.1 L', 'us', aCylinder(80, 1100), ['us-large-hollow']],
  ['exactly 25 mm deep', 'ca', aCylinder(25, 600), ['ca-flat']],
  ['deep and small', 'ca', aCylinder(26, 600), ['ca-small-hollow']],
  ['deep, exactly 1.1 L', 'ca', aCylinder(80, 1100), ['ca-large-hollow']],
  ['27 mm to the rim, a notch 3 mm lower', 'us', aVessel([[60, 0], [60, 27]], 3), ['us-small-hollow']],
  ['27 mm to the rim, a notch 3 mm lower', 'ca', aVessel([[60, 0], [60, 27]], 3), ['ca-flat']],
  ['just under 25 mm deep', 'jp', aCylinder(24.9, 600), ['jp-shallow']],
  ['exactly 25 mm deep', 'jp', aCylinder(25, 600), ['jp-deep-small']],
  ['deep, exactly 1.1 L', 'jp', aCylinder(80, 1100), ['jp-deep-medium']],
  ['deep, exactly 3 L', 'jp', aCylinder(150, 3000), ['jp-deep-large']],
]; // prettier-ignore

describe('categories from a profile', () => {
  test.each(ROWS)('PIECE-8 %s, %s', (_, code, vessel, categories) => {
    expect(categoriesOf(code, vessel, FILLED)).toEqual(categories);
  });

  test('PIECE-8 a profile answers depth and capacity, and nothing from its form', () => {
    expect(Object.keys(measuredAnswers(aCylinder(95, 350), ['eu', 'dk'])).sort()).toEqual(['capacity-ml', 'depth-mm']);
  });

  test('PIECE-5 where a place says nothing of depth and the two ways differ, depth stays open', () => {
    expect(measuredAnswers(aVessel([[60, 0], [60, 27]], 3), ['xx'])).not.toHaveProperty('depth-mm'); // prettier-ignore
    expect(measuredAnswers(aVessel([[60, 0], [60, 27]]), ['xx'])).toHaveProperty('depth-mm', 27); // prettier-ignore
  });
});

const euPieces = workedExample(
  'we-lt-10',
  z.object({
    pieces: z.array(z.object({ id: z.string(), depth_mm: z.number().nullable(), capacity_L: z.number().nullable(), use: z.string() })),
  }),
  z.object({ category: z.record(z.string(), z.number()) }),
);
const EU_CATEGORY: Readonly<Record<number, string>> = { 1: 'eu-flat', 2: 'eu-hollow', 3: 'eu-cooking-storage' };

test.each(euPieces.inputs.pieces)(`PIECE-8 EU category of $id (${euPieces.by})`, ({ id, depth_mm: depth, capacity_L: litres, use }) => {
  const vessel = depth === null || litres === null ? null : aCylinder(depth, litres * 1000);
  const told = { ...FILLED, 'holds-liquid': use !== 'unfillable', 'cooked-in': use === 'cook', 'packaging-or-storage': use === 'store' };
  const category = EU_CATEGORY[euPieces.expected.category[id] ?? 0] ?? '';
  expect(categoriesOf('dk', vessel, told).filter((term) => Object.values(EU_CATEGORY).includes(term))).toEqual([category]);
});

const usPieces = workedExample(
  'we-lt-11',
  z.object({ pieces: z.array(z.object({ id: z.string(), depth_mm: z.number(), capacity_L: z.number() })) }),
  z.object({ category: z.record(z.string(), z.string()) }),
);
const US_CATEGORY: Readonly<Record<string, string>> = {
  flatware: 'us-flat',
  'small hollowware': 'us-small-hollow',
  'large hollowware': 'us-large-hollow',
};

test.each(usPieces.inputs.pieces)(`PIECE-8 US category of piece $id (${usPieces.by})`, ({ id, depth_mm: depth, capacity_L: litres }) => {
  const category = US_CATEGORY[usPieces.expected.category[id] ?? ''];
  expect(categoriesOf('us', aCylinder(depth, litres * 1000), FILLED)).toEqual([category]);
});
