import { describe, expect, test } from 'vitest';
import { z } from 'zod';
import type { Result } from '@/lib/kernel/result';
import { chanceOfOneOver, cleanSpecimens, specimensNeeded, spreadOf } from '@/lib/readings/domain/statistics';
import { exampleIds, workedExample } from '../pieces/worked-examples';

const values = z.object({ values_ugmL: z.array(z.number()), limit: z.number() });
const anyOfSix = workedExample('we-st-01', values, z.object({ max: z.number(), mean: z.number(), passes: z.boolean() }));
const meanOfSix = workedExample('we-st-02', values, z.object({ max: z.number(), mean: z.number(), n_over: z.number() }));
const catches = workedExample(
  'we-st-03',
  z.object({ p: z.array(z.number()), n: z.number() }),
  z.object({ P_any_fail: z.array(z.number()) }),
);
const clean = workedExample(
  'we-st-04',
  z.object({ zero_failures_n: z.array(z.number()), target_defect_rate: z.number() }),
  z.object({ p_upper: z.array(z.number()), n_needed: z.number() }),
);
const hidden = workedExample(
  'we-st-05',
  z.object({ values: z.array(z.union([z.string(), z.number()])) }),
  z.object({ LB_mean: z.number(), MB_mean: z.number(), UB_mean: z.number(), n_nondetect: z.number() }),
);

const shareOf = (result: Result<number, string>): number => (result.ok ? result.value : Number.NaN);

test('PIECE-17 every worked example of statistics stands here or beside the guard band', () => {
  expect(exampleIds(['statistics'])).toEqual(['we-st-01', 'we-st-02', 'we-st-03', 'we-st-04', 'we-st-05', 'we-st-06']);
});

describe('what a sample shows', () => {
  test.each(clean.inputs.zero_failures_n.map((count, at) => [count, clean.expected.p_upper[at] ?? 0] as const))(
    `PIECE-17 %s clean specimens (${clean.by})`,
    (count, bound) => {
      const shown = cleanSpecimens(count);
      expect(shown.ok && shown.value.shareOverAtMost).toBeCloseTo(bound, 6);
    },
  );

  test(`PIECE-17 how many are needed (${clean.by})`, () => {
    expect(specimensNeeded(clean.inputs.target_defect_rate)).toEqual({ ok: true, value: clean.expected.n_needed });
  });

  test.each(catches.inputs.p.map((share, at) => [share, catches.expected.P_any_fail[at] ?? 0] as const))(
    `PIECE-17 a share of %s over is caught (${catches.by})`,
    (share, chance) => {
      expect(shareOf(chanceOfOneOver(share, catches.inputs.n))).toBeCloseTo(chance, 6);
    },
  );

  test('PIECE-17 the rule of three stands beside it and is never above one', () => {
    expect(cleanSpecimens(1)).toMatchObject({ ok: true, value: { ruleOfThree: 1 } });
    expect(cleanSpecimens(300)).toMatchObject({ ok: true, value: { ruleOfThree: 0.01 } });
  });

  test('PIECE-17 each specimen more shows more, and catches more', () => {
    for (let count = 1; count < 200; count += 1) {
      const [fewer, more] = [cleanSpecimens(count), cleanSpecimens(count + 1)];
      expect(fewer.ok && more.ok && more.value.shareOverAtMost < fewer.value.shareOverAtMost).toBe(true);
      expect(shareOf(chanceOfOneOver(0.05, count + 1))).toBeGreaterThan(shareOf(chanceOfOneOver(0.05, count)));
    }
  });

  test.each([0, -1, 1.5, Number.NaN, Infinity, 2_000_000])('PIECE-17 %s specimens are refused', (count) => {
    expect(cleanSpecimens(count)).toEqual({ ok: false, error: 'not-a-count' });
    expect(chanceOfOneOver(0.1, count)).toEqual({ ok: false, error: 'not-a-count' });
  });

  test.each([-0.1, 1.1, Number.NaN])('PIECE-17 a share of %s is refused', (share) => {
    expect(chanceOfOneOver(share, 6)).toEqual({ ok: false, error: 'not-a-share' });
    expect(specimensNeeded(share)).toEqual({ ok: false, error: 'not-a-share' });
  });

  test('PIECE-17 no finite sample shows that none is over', () => {
    expect(specimensNeeded(0)).toEqual({ ok: false, error: 'not-a-share' });
    expect(specimensNeeded(1e-9)).toEqual({ ok: false, error: 'not-a-share' });
    expect(specimensNeeded(0.99)).toEqual({ ok: true, value: 1 });
  });
});

describe('the spread of figures', () => {
  test(`PIECE-17 any one of six (${anyOfSix.by})`, () => {
    const { inputs, expected } = anyOfSix;
    const spread = spreadOf(inputs.values_ugmL.map((value) => ({ value })), inputs.limit); // prettier-ignore
    expect([spread?.highest, spread?.mean.middle, (spread?.overCount ?? 0) === 0]).toEqual([expected.max, expected.mean, expected.passes]);
  });

  test(`PIECE-17 mean of six (${meanOfSix.by})`, () => {
    const { inputs, expected } = meanOfSix;
    const spread = spreadOf(inputs.values_ugmL.map((value) => ({ value })), inputs.limit); // prettier-ignore
    expect([spread?.highest, spread?.mean.middle, spread?.overCount]).toEqual([expected.max, expected.mean, expected.n_over]);
  });

  test(`PIECE-17 "less than" figures (${hidden.by})`, () => {
    const figures = hidden.inputs.values.map((value) => {
      const text = String(value);
      return { value: text.replace('<', ''), below: text.startsWith('<') };
    });
    const { expected } = hidden;
    const spread = spreadOf(figures, '0.04');
    expect(spread?.mean.lower).toBeCloseTo(expected.LB_mean, 6);
    expect(spread?.mean.middle).toBeCloseTo(expected.MB_mean, 6);
    expect(spread?.mean.upper).toBeCloseTo(expected.UB_mean, 6);
    expect([spread?.belowCount, spread?.overCount]).toEqual([expected.n_nondetect, 1]);
  });

  test('PIECE-17 nothing, or what is no amount, has no spread', () => {
    expect([spreadOf([], 1), spreadOf([{ value: 'x' }], 1), spreadOf([{ value: -1 }], 1), spreadOf([{ value: 1 }], 'x')]).toEqual([
      null,
      null,
      null,
      null,
    ]);
  });
});
