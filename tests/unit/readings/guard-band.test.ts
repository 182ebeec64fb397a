import { describe, expect, test } from 'vitest';
import { z } from 'zod';
import { guardedComparison, normalShare, type UncertainFigure } from '@/lib/readings/domain/guard-band';
import { workedExample } from '../pieces/worked-examples';

const example = workedExample(
  'we-st-06',
  z.object({ TL: z.number(), U: z.number(), k: z.number(), x: z.array(z.number()) }),
  z.object({ AL: z.number(), guard_pass: z.array(z.boolean()), conformance_prob: z.array(z.number()) }),
);
const { inputs, expected } = example;
const FIGURE: UncertainFigure = { value: 3, expandedUncertainty: inputs.U, coverageFactor: inputs.k, limit: inputs.TL };

const clearanceOf = (figure: Partial<UncertainFigure>): string => {
  const compared = guardedComparison({ ...FIGURE, ...figure });
  return compared.ok ? compared.value.clearance : compared.error;
};

describe('guard band', () => {
  test.each(inputs.x.map((value, at) => ({ value, under: expected.guard_pass[at], chance: expected.conformance_prob[at] ?? 0 })))(
    `PIECE-16 $value beside the limit (${example.by})`,
    ({ value, under, chance }) => {
      const compared = guardedComparison({ ...FIGURE, value });
      if (!compared.ok) throw new Error(compared.error);
      expect(compared.value.acceptanceLimit).toBe(expected.AL);
      expect(compared.value.clearance === 'clearly-under').toBe(under);
      expect(compared.value.chanceUnder).toBeCloseTo(chance, 5);
    },
  );

  test('PIECE-16 the borders, exactly', () => {
    const at = ['3.5', '3.5000000001', '4.5', '4.5000000001'].map((value) => clearanceOf({ value }));
    expect(at).toEqual(['clearly-under', 'too-close-to-tell', 'too-close-to-tell', 'clearly-over']);
  });

  test('PIECE-16 0.1 and 0.2 make 0.3, as they do not in floating point', () => {
    expect(clearanceOf({ value: 0.1, expandedUncertainty: 0.2, limit: 0.3 })).toBe('clearly-under');
  });

  test('PIECE-16 a method as coarse as the limit itself cannot tell under', () => {
    const coarse = guardedComparison({ ...FIGURE, value: 0.01, expandedUncertainty: 4 });
    expect(coarse).toMatchObject({ ok: true, value: { canTellUnder: false, clearance: 'too-close-to-tell', acceptanceLimit: 0 } });
  });

  test.each([
    [{ value: Number.NaN }, 'not-an-amount'],
    [{ value: -1 }, 'not-an-amount'],
    [{ value: '1,5' }, 'not-an-amount'],
    [{ limit: '1e309' }, 'not-an-amount'],
    [{ expandedUncertainty: -0.5 }, 'not-an-amount'],
    [{ expandedUncertainty: 0 }, 'no-uncertainty'],
    [{ coverageFactor: 0 }, 'not-a-factor'],
    [{ coverageFactor: 'two' }, 'not-a-factor'],
  ])('PIECE-16 %o is refused', (figure, fault) => {
    expect(clearanceOf(figure)).toBe(fault);
  });

  test('PIECE-16 shares of the normal distribution (standard table, from memory)', () => {
    const known = [[0, 0.5], [1, 0.841344746], [1.96, 0.975002105], [-1.96, 0.024997895], [3, 0.998650102], [-6, 9.866e-10]] as const; // prettier-ignore
    for (const [z, share] of known) expect(normalShare(z)).toBeCloseTo(share, 8);
    expect([normalShare(40), normalShare(-40), normalShare(7.99) <= 1, normalShare(-7.99) >= 0]).toEqual([1, 0, true, true]);
  });
});
