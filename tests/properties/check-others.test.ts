import fc from 'fast-check';
import { expect, test } from 'vitest';
import { exactOf, kleeneOf } from '@/lib/checks/domain/judge';
import { knowledgeOf, type Answers } from '@/lib/checks/domain/knowledge';
import { compiledLogic, interpretedLogic } from '@/scripts/bench/json-logic';
import { rulesEngine } from '@/scripts/bench/json-rules';
import { readPlain } from '@/scripts/bench/plain-kleene';
import { codesIn, effective, plainFacts, plainRules, type PlainFacts, type PlainRule } from '@/scripts/bench/plain-rules';
import { publicodesRules } from '@/scripts/bench/publicodes-rules';
import { compiled } from './compiled';
import { cases, RUNS, type Case } from './systems';

type Translated = { readonly rules: readonly PlainRule[]; readonly facts: (answers: Answers) => PlainFacts };

function translated({ input }: Case): Translated {
  const rules = plainRules(input);
  const codes = codesIn(rules);
  return { rules, facts: (answers) => plainFacts(input, codes, answers) };
}

/** Counts of what was compared, so that agreement is not agreement about nothing. */
class Tally {
  readonly counts = [0, 0, 0];

  add(values: readonly number[]): void {
    for (const value of values) this.counts[value] = (this.counts[value] ?? 0) + 1;
  }

  share(value: number): number {
    return (this.counts[value] ?? 0) / this.counts.reduce((sum, count) => sum + count, 0);
  }

  expectAll(): void {
    for (const value of [0, 1, 2]) expect(this.share(value), `share of ${value}`).toBeGreaterThan(0.05);
  }
}

test('CHECK-21 of complete answers two rule libraries, compiled and interpreted, say what the engine says', async () => {
  const tally = new Tally();
  await fc.assert(
    fc.asyncProperty(cases, async (piece) => {
      const { rules, facts } = translated(piece);
      const line = compiled(piece.input);
      const known = facts(piece.whole);
      const own = exactOf(line, knowledgeOf(line, piece.whole));
      tally.add(own);
      expect(line.rules.map(({ id }) => id)).toEqual(rules.map(({ id }) => id));
      expect(effective(rules, compiledLogic(rules)(known))).toEqual(own);
      expect(effective(rules, interpretedLogic(rules)(known))).toEqual(own);
      expect(effective(rules, await rulesEngine(rules)(known))).toEqual(own);
    }),
    RUNS,
  );
  expect(tally.share(0)).toBeGreaterThan(0.2);
  expect(tally.share(1)).toBe(0);
  expect(tally.share(2)).toBeGreaterThan(0.2);
});

test('CHECK-21 of half the answers publicodes says what the tape says, and leaves open what it leaves open', () => {
  const tally = new Tally();
  fc.assert(
    fc.property(cases, (piece) => {
      const { rules, facts } = translated(piece);
      const line = compiled(piece.input);
      const judge = publicodesRules(rules);
      for (const said of [piece.answers, piece.whole]) {
        const own = kleeneOf(line, knowledgeOf(line, said));
        if (said === piece.answers) tally.add(own);
        expect(effective(rules, judge(facts(said)))).toEqual(own);
      }
    }),
    RUNS,
  );
  tally.expectAll();
});

test('CHECK-22 the tape says what nested functions say, and the diagrams say it too once everything is known', () => {
  const tally = new Tally();
  fc.assert(
    fc.property(cases, (piece) => {
      const { rules, facts } = translated(piece);
      const line = compiled(piece.input);
      const readings = rules.map(({ when }) => readPlain(when));
      const plainly = (said: Answers): readonly number[] => {
        const known = facts(said);
        return effective(
          rules,
          readings.map((reading) => reading(known)),
        );
      };
      for (const said of [{}, piece.answers]) {
        const tape = kleeneOf(line, knowledgeOf(line, said));
        tally.add(tape);
        expect(tape).toEqual(plainly(said));
      }
      const knowledge = knowledgeOf(line, piece.whole);
      expect(kleeneOf(line, knowledge)).toEqual(plainly(piece.whole));
      expect(exactOf(line, knowledge)).toEqual(plainly(piece.whole));
    }),
    RUNS,
  );
  tally.expectAll();
});
