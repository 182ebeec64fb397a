import fc from 'fast-check';
import { expect, test } from 'vitest';
import { exactOf, judge, kleeneOf, statusOfTerm, type Status } from '@/lib/checks/domain/judge';
import { knowledgeOf } from '@/lib/checks/domain/knowledge';
import { UNKNOWN } from '@/lib/kernel/tri';
import { compiled, inWords } from './compiled';
import { oracleOf, type Oracle } from './oracle';
import { cases, Draws, RUNS } from './systems';

test('CHECK-1 a Kleene value that is definite is what every completion gives', () => {
  fc.assert(
    fc.property(cases, ({ input, answers, strange }) => {
      const oracle = oracleOf(input);
      const line = compiled(input);
      for (const said of [answers, strange]) {
        for (const [rank, value] of kleeneOf(line, knowledgeOf(line, said)).entries()) {
          if (value !== UNKNOWN) expect(inWords(value)).toBe(oracle.truthOf(oracle.rules[rank] ?? '', said));
        }
      }
    }),
    RUNS,
  );
});

test('CHECK-2 the exact status of rules and terms is yes or no if and only if all completions agree', () => {
  fc.assert(
    fc.property(cases, ({ input, answers, strange, whole }) => {
      const oracle = oracleOf(input);
      const line = compiled(input);
      expect(line.rules.map(({ id }) => id)).toEqual(oracle.rules);
      for (const said of [{}, answers, strange, whole]) {
        const truths = oracle.rules.map((rule) => oracle.truthOf(rule, said));
        expect(exactOf(line, knowledgeOf(line, said)).map(inWords)).toEqual(truths);
        for (const term of ['t0', 't1', 't2', 'no-such-term']) {
          expect(inWords(statusOfTerm(line, said, term))).toBe(oracle.truthOfTerm(term, said));
        }
      }
    }),
    RUNS,
  );
});

test('CHECK-3 one more answer never turns a settled verdict round', () => {
  fc.assert(
    fc.property(cases, ({ input, whole, draws }) => {
      const line = compiled(input);
      const order = new Draws(draws).shuffled(Object.entries(whole));
      let settled = line.rules.map(() => [UNKNOWN, UNKNOWN]);
      for (let count = 0; count <= order.length; count += 1) {
        const knowledge = knowledgeOf(line, Object.fromEntries(order.slice(0, count)));
        const [kleene, exact] = [kleeneOf(line, knowledge), exactOf(line, knowledge)];
        settled = settled.map((before, rank) => {
          const now = [kleene[rank] ?? UNKNOWN, exact[rank] ?? UNKNOWN];
          before.forEach((value, which) => {
            if (value !== UNKNOWN) expect(now[which]).toBe(value);
          });
          return now;
        });
      }
    }),
    RUNS,
  );
});

function expectedStatus(oracle: Oracle, rule: string, { answers, declined }: Parameters<typeof expectedOutcome>[1]): Status {
  const truth = oracle.truthOf(rule, answers);
  if (truth === 'no') return 'does-not-apply';
  if (truth === 'yes')
    return oracle.rivals(rule).some((rival) => oracle.truthOf(rival, answers) === 'yes') ? 'sources-disagree' : 'applies';
  return oracle.relevant(rule, answers).every((question) => declined.includes(question)) ? 'treat-as-applying' : 'not-settled';
}

function expectedOutcome(
  oracle: Oracle,
  piece: { readonly answers: Record<string, unknown>; readonly declined: readonly string[] },
): readonly unknown[] {
  return oracle.rules.map((id) => ({
    id,
    status: expectedStatus(oracle, id, piece),
    exact: oracle.truthOf(id, piece.answers),
    silencedBy: oracle.attackers(id).filter((attacker) => oracle.truthOf(attacker, piece.answers) === 'yes'),
  }));
}

test('CHECK-15 a rule is shown as its exact status, its rivals and what was declined demand', () => {
  const seen = new Map<Status, number>();
  fc.assert(
    fc.property(cases, ({ input, answers, strange, whole, declined }) => {
      const oracle = oracleOf(input);
      const line = compiled(input);
      const passed = [...declined, 'no-such-question'];
      for (const said of [answers, strange, whole]) {
        const outcomes = judge(line, said, passed);
        for (const { status } of outcomes) seen.set(status, 1 + (seen.get(status) ?? 0));
        const shown = outcomes.map(({ id, status, exact, silencedBy }) => ({ id, status, exact: inWords(exact), silencedBy }));
        expect(shown).toEqual(expectedOutcome(oracle, { answers: said, declined: passed }));
      }
    }),
    RUNS,
  );
  for (const status of ['applies', 'does-not-apply', 'not-settled', 'treat-as-applying', 'sources-disagree'] as const) {
    expect(seen.get(status) ?? 0, status).toBeGreaterThanOrEqual(Math.floor(RUNS.numRuns / 100));
  }
});

test('CHECK-16 whatever stands in an answer, judging answers; nonsense is no knowledge', () => {
  const junk = fc.oneof(
    fc.boolean(),
    fc.string(),
    fc.double(),
    fc.array(fc.string()),
    fc.record({ amount: fc.string(), currency: fc.constantFrom('EUR', 'eur', '', '__proto__') }),
    fc.array(fc.record({ amount: fc.constantFrom('1', 'x'), currency: fc.constantFrom('EUR', 'DKK') })),
  );
  const ids = fc.constantFrom('q0', 'q1', 'q2', 'q3', 'q4', 'q5', '__proto__', 'constructor');
  fc.assert(
    fc.property(cases, fc.array(fc.tuple(ids, junk), { maxLength: 8 }), ({ input, declined }, said) => {
      const line = compiled(input);
      const answers = Object.fromEntries(said);
      const knowledge = knowledgeOf(line, answers);
      expect(knowledge.masks.every((mask) => mask > 0)).toBe(true);
      expect(judge(line, answers, declined).map(({ exact }) => exact)).toEqual(exactOf(line, knowledge));
    }),
    RUNS,
  );
});
