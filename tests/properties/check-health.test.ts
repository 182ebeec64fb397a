import fc from 'fast-check';
import { expect, test } from 'vitest';
import { oracleOf } from './oracle';
import { cases, RUNS } from './systems';

test('the invented cases are worth judging', () => {
  const seen = { rules: 0, varying: 0, open: 0, relevant: 0, worlds: 0, cases: 0 };
  fc.assert(
    fc.property(cases, ({ input, answers }) => {
      const oracle = oracleOf(input);
      seen.cases += 1;
      seen.worlds += oracle.worlds;
      for (const rule of oracle.rules) {
        seen.rules += 1;
        if (oracle.truthOf(rule, {}) === 'open') seen.varying += 1;
        if (oracle.truthOf(rule, answers) === 'open') seen.open += 1;
        seen.relevant += oracle.relevant(rule, {}).length;
      }
    }),
    RUNS,
  );
  expect(seen.cases).toBe(RUNS.numRuns);
  expect(seen.varying / seen.rules).toBeGreaterThanOrEqual(0.3);
  expect(seen.open / seen.rules).toBeGreaterThanOrEqual(0.15);
  expect(seen.open / seen.rules).toBeLessThanOrEqual(0.5);
  expect(seen.relevant / seen.rules).toBeGreaterThanOrEqual(1);
});
