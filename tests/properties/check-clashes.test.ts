import fc from 'fast-check';
import { expect, test } from 'vitest';
import { constantRules } from '@/lib/checks/domain/check-dead-rules';
import { clashesIn } from '@/lib/checks/domain/clashes';
import type { EngineRule, LineInput } from '@/lib/checks/domain/line-input';
import { compiled } from './compiled';
import { oracleOf } from './oracle';
import { cases, Draws, RUNS } from './systems';

/** The invented lines have few pairs to quarrel and mark most of them as standing beside each other: here targets are shared and marks go. */
function quarrelsome(input: LineInput, draws: Draws): LineInput {
  const replacing = input.layers.flatMap(({ rules }) => rules.filter(({ kind }) => kind === 'replaces'));
  const provoked = (rule: EngineRule): EngineRule => {
    const plain = { ...rule, firm: false, alongside: draws.chance(60) ? [] : rule.alongside };
    const model = draws.from(replacing.filter(({ order }) => order < rule.order));
    return rule.kind === 'adds' || model === undefined || draws.chance(40) ? plain : { ...plain, kind: 'replaces', targets: model.targets };
  };
  return { ...input, layers: input.layers.map((layer) => ({ ...layer, rules: layer.rules.map(provoked) })) };
}

test('CHECK-72 two rules clash exactly if trying every world finds one in which both apply', () => {
  let found = 0;
  let apart = 0;
  fc.assert(
    fc.property(cases, ({ input, draws }) => {
      const line = quarrelsome(input, new Draws(draws));
      const truth = oracleOf(line).clashes();
      expect(clashesIn(compiled(line), line)).toEqual(truth);
      if (truth.length > 0) found += 1;
      else if (line.layers.some(({ rules }) => rules.filter(({ kind }) => kind === 'replaces').length > 1)) apart += 1;
    }),
    RUNS,
  );
  // A generator that makes no quarrels, or nothing else, would prove nothing.
  expect(found).toBeGreaterThan(RUNS.numRuns / 20);
  expect(apart).toBeGreaterThan(RUNS.numRuns / 20);
});

test('CHECK-73 a rule is told as never or always applying exactly if every world says so', () => {
  const seen = { never: 0, always: 0, open: 0 };
  fc.assert(
    fc.property(cases, ({ input }) => {
      const oracle = oracleOf(input);
      const { never, always } = constantRules(compiled(input));
      const truths = oracle.rules.map((rule) => ({ rule, truth: oracle.truthOf(rule, {}) }));
      expect(never).toEqual(truths.filter(({ truth }) => truth === 'no').map(({ rule }) => rule));
      expect(always).toEqual(truths.filter(({ truth }) => truth === 'yes').map(({ rule }) => rule));
      seen.never += never.length;
      seen.always += always.length;
      seen.open += truths.length - never.length - always.length;
    }),
    RUNS,
  );
  const all = seen.never + seen.always + seen.open;
  expect(seen.never).toBeGreaterThan(all / 100);
  expect(seen.always).toBeGreaterThan(all / 100);
  expect(seen.open).toBeGreaterThan(all / 4);
});
