import fc from 'fast-check';
import { expect, test } from 'vitest';
import { judge } from '@/lib/checks/domain/judge';
import type { Answers } from '@/lib/checks/domain/knowledge';
import { UNKNOWN } from '@/lib/kernel/tri';
import { compiled, inWords } from './compiled';
import { oracleOf, type Oracle } from './oracle';
import { cases, RUNS } from './systems';

const keeping = (answers: Answers, ids: readonly string[]): Answers =>
  Object.fromEntries(Object.entries(answers).filter(([id]) => ids.includes(id)));

/** Dropped from the last question to the first, while what is left still settles the rule. */
function reasonByHand(oracle: Oracle, rule: string, answers: Answers, order: readonly string[]): readonly string[] {
  return order
    .filter((id) => Object.hasOwn(answers, id))
    .reduceRight<readonly string[]>(
      (kept, id) => {
        const without = kept.filter((other) => other !== id);
        return oracle.truthOf(rule, keeping(answers, without)) === 'open' ? kept : without;
      },
      order.filter((id) => Object.hasOwn(answers, id)),
    );
}

test('CHECK-11 the reason given settles the rule by itself, and no answer in it can be spared', () => {
  fc.assert(
    fc.property(cases, ({ input, answers, strange, whole, declined }) => {
      const oracle = oracleOf(input);
      const line = compiled(input);
      const order = input.questions.map(({ id }) => id);
      for (const said of [answers, strange, whole]) {
        for (const { id, exact, because } of judge(line, said, declined)) {
          const reason = because.map(({ question }) => question);
          if (exact === UNKNOWN) {
            expect(because).toEqual([]);
            continue;
          }
          expect(oracle.truthOf(id, keeping(said, reason))).toBe(inWords(exact));
          for (const spared of reason) {
            const rest = reason.filter((question) => question !== spared);
            expect(oracle.truthOf(id, keeping(said, rest))).toBe('open');
          }
          expect(reason).toEqual(reasonByHand(oracle, id, said, order));
          for (const { question, answer } of because) expect(answer).toBe(said[question]);
        }
      }
    }),
    RUNS,
  );
});
