import fc from 'fast-check';
import { expect, test } from 'vitest';
import { compare, quotient, whole, type Fraction } from '@/lib/kernel/fraction';
import { spanOf, type Span } from '@/lib/readings/domain/amount';
import { decide, type Status } from '@/lib/readings/domain/decision';

const RUNS = { numRuns: 3000, seed: 20261201 };

/** Few denominators, so that figures often meet each other and the limits exactly. */
const amount = fc.tuple(fc.integer({ min: 0, max: 40 }), fc.constantFrom(1, 2, 4, 3)).map(([top, bottom]) => fraction(top, bottom));
const fraction = (top: number, bottom: number): Fraction => quotient(BigInt(top), BigInt(bottom)) ?? whole(0n);
const limit = fc.tuple(fc.integer({ min: 1, max: 20 }), fc.constantFrom(1, 2)).map(([top, bottom]) => fraction(top, bottom));
const span = fc.record({ value: amount, below: fc.boolean() }).map(spanOf);
const rule = fc.record({
  kind: fc.constantFrom('each', 'mean-of', 'first-then-three'),
  specimens: fc.integer({ min: 1, max: 6 }),
  atLimit: fc.constantFrom('within', 'over', 'unclear'),
});
const figures = fc.record({ first: fc.array(span, { minLength: 1, maxLength: 5 }), further: fc.array(span, { maxLength: 5 }) });

const BADNESS: readonly Status[] = ['within', 'cannot-tell', 'test-more', 'over'];
const badness = ({ status }: { readonly status: Status }): number => BADNESS.indexOf(status);

test('READ-4 a stricter limit never turns over into within: over stays over', () => {
  const seen = new Set<Status>();
  fc.assert(
    fc.property(rule, figures, limit, limit, (held, read, a, b) => {
      const [strict, mild] = compare(a, b) < 0 ? [a, b] : [b, a];
      const before = decide({ ...held, limit: mild }, read).status;
      seen.add(before);
      if (before === 'over') expect(decide({ ...held, limit: strict }, read).status).toBe('over');
    }),
    RUNS,
  );
  expect(seen.size).toBe(4);
});

test('READ-4 a milder limit never turns within into over', () => {
  fc.assert(
    fc.property(rule, figures, limit, limit, (held, read, a, b) => {
      const [strict, mild] = compare(a, b) < 0 ? [a, b] : [b, a];
      if (decide({ ...held, limit: strict }, read).status === 'within')
        expect(decide({ ...held, limit: mild }, read).status).toBe('within');
    }),
    RUNS,
  );
});

test('READ-5 one more reading never turns over into within where every piece counts', () => {
  fc.assert(
    fc.property(rule, figures, limit, span, (held, { first, further }, at, more) => {
      const each = { ...held, kind: 'each', limit: at } as const;
      if (decide(each, { first, further }).status !== 'over') return;
      expect(decide(each, { first: [...first, more], further }).status).toBe('over');
      expect(decide(each, { first, further: [more, ...further] }).status).toBe('over');
    }),
    RUNS,
  );
});

test('READ-6 "below" a smaller value never gives a worse verdict', () => {
  fc.assert(
    fc.property(rule, figures, limit, fc.nat(9), amount, (held, read, at, place, lower) => {
      const all = [...read.first, ...read.further];
      const chosen = all[place % all.length];
      if (chosen === undefined) return;
      const most = compare(lower, chosen.most) < 0 ? lower : chosen.most;
      const swap = (value: Span) => (list: readonly Span[]) => list.map((one) => (one === chosen ? value : one));
      const told = (value: Span) => decide({ ...held, limit: at }, { first: swap(value)(read.first), further: swap(value)(read.further) });
      const seen = told({ least: whole(0n), most: chosen.most });
      expect(badness(told({ least: whole(0n), most }))).toBeLessThanOrEqual(badness(seen));
    }),
    RUNS,
  );
});

test('READ-12 a decision carries a reason exactly where it cannot tell, and always the figure compared', () => {
  fc.assert(
    fc.property(rule, figures, limit, (held, read, at) => {
      const { status, reason, compared } = decide({ ...held, limit: at }, read);
      expect(reason !== null).toBe(status === 'cannot-tell');
      expect(compared).not.toBeNull();
    }),
    RUNS,
  );
});

/** The rules once more over measured figures alone, in plain numbers: quarters of small numbers are exact in them. */
function byHand(kind: string, n: number, at: number, first: readonly number[], further: readonly number[]): Status {
  const all = [...first, ...further];
  const mean = (list: readonly number[]) => list.reduce((sum, one) => sum + one, 0) / list.length;
  if (kind === 'each') return all.some((one) => one > at) ? 'over' : all.length < n ? 'test-more' : 'within';
  if (kind === 'mean-of') {
    if (all.length < n) return mean(all) * all.length > at * n ? 'over' : 'test-more';
    return mean(all) * all.length > at * all.length ? 'over' : 'within';
  }
  const one = (figure: number): Status => {
    if (figure <= at) return 'within';
    if (figure > 1.5 * at || further.some((more) => more > 1.5 * at)) return 'over';
    if (further.length < 3) return 'test-more';
    return mean(further) * further.length > at * further.length ? 'over' : 'within';
  };
  const statuses = first.map(one);
  return BADNESS.toReversed().find((status) => statuses.includes(status)) ?? 'within';
}

test('READ-3 over measured figures the three rules come out as they do by hand', () => {
  const quarters = fc.integer({ min: 0, max: 64 });
  const list = fc.array(quarters, { minLength: 1, maxLength: 6 });
  fc.assert(
    fc.property(
      rule,
      fc.integer({ min: 1, max: 40 }),
      list,
      fc.array(quarters, { maxLength: 5 }),
      ({ kind, specimens }, at, first, further) => {
        const spans = (values: readonly number[]) => values.map((value) => spanOf({ value: fraction(value, 4), below: false }));
        const held = { kind, specimens, atLimit: 'within', limit: fraction(at, 4) } as const;
        const status = byHand(kind, specimens, at, first, further);
        expect(decide(held, { first: spans(first), further: spans(further) }).status).toBe(status);
      },
    ),
    RUNS,
  );
});
