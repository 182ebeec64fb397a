import { describe, expect, test } from 'vitest';
import { cheapestFacts } from '@/lib/checks/domain/cheapest-fact';
import { cellsOf } from '@/lib/checks/domain/cell-range';
import { exactOf, kleeneOf } from '@/lib/checks/domain/judge';
import { knowledgeOf } from '@/lib/checks/domain/knowledge';
import { MOST_LEVELS } from '@/lib/checks/domain/line-input';
import { nextQuestion, questionsOpenFor, stillMatters } from '@/lib/checks/domain/next-question';
import { cutRegion } from '@/lib/checks/domain/region-cells';
import { YES } from '@/lib/kernel/tri';
import type { Condition } from '@/lib/regions/domain/condition';
import { aLine, aRule, faultOf, PLACES, yesno } from './lines';

describe('levels', () => {
  const within = (levels: number, wrap: (inner: Condition) => Condition): Condition =>
    Array.from({ length: levels - 1 }).reduce<Condition>(wrap, { question: 'a', is: true });
  const wraps: readonly (readonly [string, (inner: Condition) => Condition])[] = [
    ['all', (inner) => ({ all: [inner] })],
    ['any', (inner) => ({ any: [inner] })],
    ['not', (inner) => ({ not: inner })],
  ];

  test.each(wraps)('CHECK-17 as many levels of %s as allowed are taken, one more is refused', (_, wrap) => {
    const questions = [yesno('a')];
    expect(aLine({ questions, rules: [aRule('r', within(MOST_LEVELS, wrap))] }).rules).toHaveLength(1);
    expect(faultOf({ questions, rules: [aRule('r', within(MOST_LEVELS + 1, wrap))] })).toEqual({ kind: 'bad-test', in: 'r' });
  });

  test.each(wraps)('CHECK-17 a fault inside %s is told as it is', (_, wrap) => {
    const rules = [aRule('r', wrap({ question: 'gone', is: true }))];
    expect(faultOf({ questions: [yesno('a')], rules })).toEqual({ kind: 'unknown-question', in: 'r', about: 'gone' });
  });
});

test('CHECK-22 constants in a row are each kept on the tape', () => {
  const when: Condition = { any: [false, false, { all: [true, true, { any: [false, false, true] }] }] };
  const line = aLine({ rules: [aRule('r', when)] });
  expect(kleeneOf(line, knowledgeOf(line, {}))).toEqual([YES]);
});

test('CHECK-22 a constant before the first test of a group does not leave it', () => {
  const line = aLine({ questions: [yesno('a')], rules: [aRule('r', { all: [true, { question: 'a', is: true }] })] });
  for (const a of [true, false]) {
    const knowledge = knowledgeOf(line, { a });
    expect(kleeneOf(line, knowledge)).toEqual(exactOf(line, knowledge));
  }
});

test('CHECK-4 CHECK-5 more questions than a machine word has bits are told apart', () => {
  const questions = Array.from({ length: 70 }, (_, at) => yesno(`q${at}`));
  const rule = (id: string, at: readonly number[]) => aRule(id, { all: at.map((place) => ({ question: `q${place}`, is: true })) });
  const line = aLine({ questions, rules: [rule('r', [1, 40, 69]), rule('s', [33, 64]), rule('t', [31, 32])] });
  expect(stillMatters(line, {}, [])).toEqual(['q1', 'q31', 'q32', 'q33', 'q40', 'q64', 'q69']);
  expect(questionsOpenFor(line, {}, [], 'r')).toEqual(['q1', 'q40', 'q69']);
  expect(questionsOpenFor(line, { q40: true }, [], 'r')).toEqual(['q1', 'q69']);
  expect(questionsOpenFor(line, {}, [], 's')).toEqual(['q33', 'q64']);
  expect(nextQuestion(line, { q1: false, q31: false }, [])).toBe('q33');
});

test('CHECK-62 a rule that is no duty is not counted', () => {
  const line = aLine({
    questions: [yesno('a')],
    rules: [aRule('r', { question: 'a', is: true }), aRule('s', { question: 'a', is: false })],
  });
  const [fact] = cheapestFacts([{ compiled: line, duties: ['r'] }], {});
  expect(fact?.settles).toEqual(['r']);
  expect(fact?.atBest).toBe(1);
});

test('CHECK-61 cells of places are told by the widest named place that lies wholly in them', () => {
  const cut = cutRegion(new Set(['eu', 'dk', 'us']), PLACES, 0);
  const told = (codes: readonly string[]) => {
    const mask = codes.reduce((sum, code) => sum | (cut.within.get(code) ?? 0), 0);
    return cellsOf(cut, [{ offset: 0, mask }]);
  };
  expect(told(['eu'])).toEqual({ kind: 'region', within: 'eu' });
  expect(told(['dk'])).toEqual({ kind: 'region', within: 'dk' });
  expect(told(['us', 'dk'])).toEqual({ kind: 'region', within: 'dk' });
  expect(cellsOf(cut, [{ offset: 0, mask: cut.elsewhere }])).toEqual({ kind: 'region', within: null });
});
