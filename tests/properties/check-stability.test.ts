import fc from 'fast-check';
import { expect, test } from 'vitest';
import { judge, statusOfTerm } from '@/lib/checks/domain/judge';
import type { AnswerValue, Answers } from '@/lib/checks/domain/knowledge';
import type { LineInput } from '@/lib/checks/domain/line';
import { nextQuestion, stillMatters } from '@/lib/checks/domain/next-question';
import { canonicalJson } from '@/lib/kernel/canonical-json';
import type { Condition } from '@/lib/regions/domain/condition';
import { isInForce } from '@/lib/regions/domain/rule';
import { compiled } from './compiled';
import { cases, day, DAYS, Draws, RUNS, type Case } from './systems';

type Piece = Pick<Case, 'answers' | 'declined'>;

/** All that the engine says of a piece, as one text. */
function reply(input: LineInput, { answers, declined }: Piece): string {
  const line = compiled(input);
  return canonicalJson({
    outcomes: judge(line, answers, declined),
    next: nextQuestion(line, answers, declined),
    matters: stillMatters(line, answers, declined),
    terms: ['t0', 't1', 't2'].map((term) => statusOfTerm(line, answers, term)),
  });
}

/** The same members written in another order. */
const withKeysShuffled = <T extends object>(object: T, draws: Draws): T => Object.fromEntries(draws.shuffled(Object.entries(object))) as T;

function reordered(condition: Condition, draws: Draws): Condition {
  if (typeof condition === 'boolean') return condition;
  if ('all' in condition) return { all: draws.shuffled(condition.all.map((part) => reordered(part, draws))) };
  if ('any' in condition) return { any: draws.shuffled(condition.any.map((part) => reordered(part, draws))) };
  if ('not' in condition) return { not: reordered(condition.not, draws) };
  if ('in' in condition) return { in: draws.shuffled(condition.in), question: condition.question };
  return withKeysShuffled(condition, draws);
}

function shuffledInput(input: LineInput, draws: Draws): LineInput {
  const layers = input.layers.map(({ region, rules, terms }) => ({
    terms: draws.shuffled(terms).map((term) => withKeysShuffled({ ...term, when: reordered(term.when, draws) }, draws)),
    rules: draws
      .shuffled(rules)
      .map((rule) =>
        withKeysShuffled(
          { ...rule, when: reordered(rule.when, draws), targets: draws.shuffled(rule.targets), alongside: draws.shuffled(rule.alongside) },
          draws,
        ),
      ),
    region,
  }));
  return { ...withKeysShuffled(input, draws), layers, places: draws.shuffled(input.places), except: draws.shuffled(input.except) };
}

const isList = (value: AnswerValue): value is Extract<AnswerValue, readonly unknown[]> => Array.isArray(value);

test('CHECK-8 the order of rules, terms, places, answers, declined questions and object members makes no difference', () => {
  fc.assert(
    fc.property(cases, ({ input, answers, strange, declined, draws }) => {
      const dealt = new Draws(draws);
      const other = shuffledInput(input, dealt);
      for (const said of [answers, strange]) {
        const shuffled = withKeysShuffled(said, dealt);
        expect(reply(other, { answers: shuffled, declined: dealt.shuffled(declined) })).toBe(reply(input, { answers: said, declined }));
      }
    }),
    RUNS,
  );
});

test('CHECK-8 the order within an answer of several options or currencies makes no difference to any verdict', () => {
  fc.assert(
    fc.property(cases, ({ input, whole }) => {
      const turned: Answers = Object.fromEntries(
        Object.entries(whole).map(([id, answer]) => [id, isList(answer) ? answer.toReversed() : answer]),
      );
      const verdicts = (said: Answers): readonly unknown[] =>
        judge(compiled(input), said, []).map(({ id, status, because }) => [id, status, because.map(({ question }) => question)]);
      expect(verdicts(turned)).toEqual(verdicts(whole));
    }),
    RUNS,
  );
});

const BETWEEN = ['1900-01-01', '2019-12-31', '2024-02-28', '2024-03-01', '2026-11-30', '2027-05-05', '2030-07-14', '2099-12-31'];

test('CHECK-12 between two days on which something begins or ends nothing changes, and only what is in force counts', () => {
  const days = [...DAYS, ...BETWEEN.map(day)].sort();
  fc.assert(
    fc.property(cases, ({ input, answers, declined }) => {
      const spans = new Map<number, string>();
      for (const on of days) {
        const span = DAYS.filter((boundary) => boundary <= on).length;
        const said = reply({ ...input, on }, { answers, declined });
        expect(said).toBe(spans.get(span) ?? said);
        spans.set(span, said);
        const layers = input.layers.map(({ region, rules, terms }) => ({
          region,
          rules: rules.filter((rule) => isInForce(rule, on)).map((rule) => ({ ...rule, from: null, to: null })),
          terms: terms.filter((term) => isInForce(term, on)).map((term) => ({ ...term, from: null, to: null })),
        }));
        expect(reply({ ...input, layers }, { answers, declined })).toBe(said);
      }
    }),
    RUNS,
  );
});

test('CHECK-13 a replay is equal byte by byte, also after a way through JSON, and leaves its input as it was', () => {
  fc.assert(
    fc.property(cases, ({ input, answers, strange, declined }) => {
      const before = canonicalJson({ ...input, answers, strange });
      for (const said of [answers, strange]) {
        const first = reply(input, { answers: said, declined });
        expect(reply(input, { answers: said, declined })).toBe(first);
        const again = structuredClone({ input, said, declined });
        expect(reply(again.input, { answers: again.said, declined: again.declined })).toBe(first);
        const line = compiled(input);
        expect(canonicalJson(judge(line, said, declined))).toBe(canonicalJson(judge(line, said, declined)));
      }
      expect(canonicalJson({ ...input, answers, strange })).toBe(before);
    }),
    RUNS,
  );
});
