import fc from 'fast-check';
import { expect, test } from 'vitest';
import { cheapestFacts } from '@/lib/checks/domain/cheapest-fact';
import { exactOf } from '@/lib/checks/domain/judge';
import { knowledgeOf, type Answers, type AnswerValue } from '@/lib/checks/domain/knowledge';
import { nearestOutcome } from '@/lib/checks/domain/nearest-outcome';
import type { Question } from '@/lib/checks/domain/questions';
import { traceRules, type RuleTrace, type Trace } from '@/lib/checks/domain/trace';
import { compiled, inWords } from './compiled';
import { oracleOf } from './oracle';
import { cases, RUNS } from './systems';

const keeping = (answers: Answers, ids: readonly string[]): Answers =>
  Object.fromEntries(Object.entries(answers).filter(([id]) => ids.includes(id)));

function named(trace: Trace | null): readonly string[] {
  if (trace === null) return [];
  switch (trace.kind) {
    case 'always':
      return [];
    case 'leaf':
      return [trace.question, ...named(trace.gate)];
    case 'term':
      return named(trace.why);
    case 'all':
    case 'any':
    case 'not':
      return trace.parts.flatMap(named);
  }
}

test('CHECK-60 the answers that a trace names give the same status by themselves', () => {
  fc.assert(
    fc.property(cases, ({ input, answers, strange, whole }) => {
      const oracle = oracleOf(input);
      const line = compiled(input);
      for (const said of [answers, strange, whole]) {
        const traces = traceRules(line, knowledgeOf(line, said));
        const byId = new Map(traces.map((trace) => [trace.id, trace]));
        const none: RuleTrace = { id: '', value: 1, when: null, attackers: [] };
        const isShared = (trace: RuleTrace): boolean =>
          (trace.value !== 1 && trace.attackers.some(({ value }) => value === 1)) ||
          trace.attackers.some(({ id }) => isShared(byId.get(id) ?? none));
        const all = (trace: RuleTrace): readonly string[] => [
          ...named(trace.when),
          ...trace.attackers.flatMap(({ id }) => all(byId.get(id) ?? none)),
        ];
        expect(traces.map(({ id }) => id)).toEqual(oracle.rules);
        for (const trace of traces) {
          const truth = oracle.truthOf(trace.id, said);
          expect(inWords(trace.value)).toBe(truth);
          if (!isShared(trace)) expect(oracle.truthOf(trace.id, keeping(said, all(trace)))).toBe(truth);
          for (const attacker of trace.attackers) expect(inWords(attacker.value)).toBe(oracle.truthOf(attacker.id, said));
        }
      }
    }),
    RUNS,
  );
});

test('CHECK-61 the nearest other outcome is one, and no smaller number of other answers leads to one', () => {
  fc.assert(
    fc.property(cases, ({ input, answers, strange, whole }) => {
      const oracle = oracleOf(input);
      const line = compiled(input);
      for (const said of [answers, strange, whole]) {
        const knowledge = knowledgeOf(line, said);
        for (const [rank, { id }] of line.rules.entries()) {
          const nearest = nearestOutcome(line, rank, knowledge);
          const truth = oracle.truthOf(id, said);
          const fewest = truth === 'open' ? null : oracle.fewestChanges(id, said, truth === 'no');
          expect(nearest?.changes.length ?? null).toBe(fewest);
          if (nearest === null) continue;
          expect(inWords(nearest.becomes)).not.toBe(truth);
          expect(exactOf(line, nearest)[rank]).toBe(nearest.becomes);
          expect(nearest.besides.length > 0).toBe(inWords(nearest.becomes) === 'open');
        }
      }
    }),
    RUNS,
  );
});

/** Answers that fall on, just under and just over every border the invented rules draw. */
function everyAnswer(question: Question): readonly AnswerValue[] {
  switch (question.kind) {
    case 'yesno':
      return [true, false];
    case 'choice':
      return question.options;
    case 'several':
      return question.options.reduce<readonly (readonly string[])[]>((sets, one) => [...sets, ...sets.map((set) => [...set, one])], [[]]);
    case 'amount':
      return [24, 25, 30, 40, 50, 1099, 1100, 2000, 3000, 4000, 0.4, 0.5, 0.6, 0.8, 0.9];
    case 'money':
      return ['49', '50', '51'].flatMap((eur) =>
        ['399', '400', '401'].map((dkk) => [
          { amount: eur, currency: 'EUR' },
          { amount: dkk, currency: 'DKK' },
        ]),
      );
    case 'region':
      return ['aa', 'bb', 'cc', 'cc-n', 'zz', 'yy'];
  }
}

test('CHECK-62 a single answer settles what the facts say, by trying every answer', () => {
  fc.assert(
    fc.property(cases, ({ input, answers }) => {
      const oracle = oracleOf(input);
      const line = compiled(input);
      const facts = cheapestFacts([{ compiled: line, duties: oracle.rules }], answers);
      const open = oracle.rules.filter((rule) => oracle.truthOf(rule, answers) === 'open');
      const matter = new Set(open.flatMap((rule) => oracle.relevant(rule, answers)));
      const askable = [...matter].filter((id) => oracle.gateOf(id, answers) === 'yes');
      expect(new Set(facts.map(({ question }) => question))).toEqual(new Set(askable));
      for (const { question, settles, atBest } of facts) {
        // Money said in one currency stays said.
        if (Object.hasOwn(answers, question)) continue;
        const asked = input.questions.find(({ id }) => id === question);
        const settledBy = (asked === undefined ? [] : everyAnswer(asked)).map((value) =>
          open.filter((rule) => oracle.truthOf(rule, { ...answers, [question]: value }) !== 'open'),
        );
        expect(settles).toEqual(open.filter((rule) => settledBy.every((settled) => settled.includes(rule))));
        expect(atBest).toBe(Math.max(...settledBy.map(({ length }) => length)));
      }
      const counts = facts.map(({ settles }) => settles.length);
      expect(counts).toEqual(counts.toSorted((a, b) => b - a));
    }),
    RUNS,
  );
});
