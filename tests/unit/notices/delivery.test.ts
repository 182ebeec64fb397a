import fc from 'fast-check';
import { expect, test } from 'vitest';
import { MAIL_PATIENCE, MOST_TRIES, afterHandover, waitBefore, type Handover } from '@/lib/notices/domain/delivery';

const after = (kind: Handover['kind'], tries: number) => afterHandover({ kind, answer: 'said' }, tries, 0.5, MAIL_PATIENCE);

test('OUT-5 what follows from an attempt', () => {
  expect(after('taken', 3)).toEqual({ state: 'sent', lastAnswer: 'said' });
  expect(after('refused', 1)).toEqual({ state: 'bounced', lastAnswer: 'said' });
  expect(after('later', 1)).toEqual({ state: 'waiting', lastAnswer: 'said', afterMs: 30_000, counts: true });
  expect(after('later', MOST_TRIES - 1)).toMatchObject({ state: 'waiting' });
  expect(after('later', MOST_TRIES)).toEqual({ state: 'parked', lastAnswer: 'said' });
  expect(after('away', MOST_TRIES)).toMatchObject({ state: 'waiting', counts: false });
});

test('OUT-5 waits lie between nothing and a doubling bound that ends at an hour', () => {
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 60 }), fc.double({ min: 0, max: 1, maxExcluded: true, noNaN: true }), (tries, chance) => {
      const ms = waitBefore(tries, chance, MAIL_PATIENCE);
      return ms >= 0 && ms <= Math.min(3_600_000, 30_000 * 2 ** tries);
    }),
  );
});
