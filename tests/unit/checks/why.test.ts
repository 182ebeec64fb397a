import { describe, expect, test } from 'vitest';
import { cheapestFacts } from '@/lib/checks/domain/cheapest-fact';
import { knowledgeOf, type Answers } from '@/lib/checks/domain/knowledge';
import type { CompiledLine } from '@/lib/checks/domain/line';
import { nearestOutcome } from '@/lib/checks/domain/nearest-outcome';
import type { Question } from '@/lib/checks/domain/questions';
import { boundariesOf, timelineOf } from '@/lib/checks/domain/timeline';
import { QUESTIONS } from '@/lib/checks/domain/questions';
import { traceRules, type RuleTrace } from '@/lib/checks/domain/trace';
import { factsOver, whysOf } from '@/lib/checks/domain/why';
import { addMonths } from '@/lib/kernel/calendar-date';
import { NO, UNKNOWN, YES } from '@/lib/kernel/tri';
import { aDate, seedLine } from '../../builders/seed-sheets';
import { aLine, aRule, aTerm, choice, yesno } from './lines';

const depth: Question = { id: 'depth-mm', topic: 'form', kind: 'amount', unit: 'mm' };
const questions = [yesno('a'), yesno('b'), depth, choice('c', ['red', 'green', 'blue'])];
const deep = { question: 'depth-mm', gt: { value: 25, unit: 'mm' } } as const;
const is = (question: string) => ({ question, is: true }) as const;

const traced = (line: CompiledLine, answers: Answers): readonly RuleTrace[] => traceRules(line, knowledgeOf(line, answers));

describe('a trace', () => {
  test('CHECK-60 names the first true part of an `any` and the first false part of an `all`', () => {
    const line = aLine({
      questions,
      rules: [aRule('one', { any: [is('a'), is('b'), deep] }), aRule('two', { all: [is('b'), is('a'), deep] })],
    });
    const [one, two] = traced(line, { a: false, b: true, 'depth-mm': 30 });
    expect(one?.when).toMatchObject({ kind: 'any', value: YES, parts: [{ question: 'b', value: YES }] });
    expect(two?.when).toMatchObject({ kind: 'all', value: NO, parts: [{ question: 'a', value: NO }] });
  });

  test('CHECK-60 names what is not known while a rule is open, and all of it where only together it decides', () => {
    const line = aLine({ questions, rules: [aRule('one', { all: [is('a'), deep] }), aRule('two', { any: [is('b'), { not: is('b') }] })] });
    const [one, two] = traced(line, { a: true });
    expect(one?.when).toMatchObject({ value: UNKNOWN, parts: [{ question: 'depth-mm', value: UNKNOWN }] });
    expect(two?.when).toMatchObject({ value: YES, parts: [{ value: UNKNOWN }, { kind: 'not', value: UNKNOWN }] });
  });

  test('CHECK-60 tells terms from the inside, and a shut gate instead of the question behind it', () => {
    const gated: Question = { ...yesno('g'), askIf: { question: 'c', in: ['red'] } };
    const line = aLine({
      questions: [...questions, gated],
      terms: [aTerm('t', is('a'))],
      rules: [aRule('one', { term: 't' }), aRule('two', is('g'))],
    });
    const [one, two] = traced(line, { a: true, c: 'blue' });
    expect(one?.when).toMatchObject({ kind: 'term', id: 't', why: { question: 'a', value: YES } });
    expect(two?.when).toMatchObject({ question: 'g', value: NO, gate: { question: 'c', value: NO } });
  });

  test('CHECK-60 names the rule that one gives way to, and not its own condition', () => {
    const line = aLine({
      questions,
      rules: [aRule('one', is('a')), aRule('two', is('b'), { kind: 'excepts', targets: ['one'], order: 1 })],
    });
    expect(traced(line, { a: true, b: true })[0]).toEqual({ id: 'one', value: NO, when: null, attackers: [{ id: 'two', value: YES }] });
    expect(traced(line, { a: true, b: false })[0]).toMatchObject({ value: YES, attackers: [{ id: 'two', value: NO }] });
    expect(traced(line, { a: false, b: true })[0]).toMatchObject({ value: NO, when: { question: 'a' }, attackers: [] });
  });
});

describe('what would change it', () => {
  test('CHECK-61 is told as a range of answers, the fewest there are', () => {
    const line = aLine({ questions, rules: [aRule('one', { all: [deep, { any: [is('a'), is('b')] }] })] });
    const nearest = nearestOutcome(line, 0, knowledgeOf(line, { a: true, b: true, 'depth-mm': 95 }));
    const range = { from: null, to: { amount: 25, included: true } };
    expect(nearest).toMatchObject({ changes: [{ question: 'depth-mm', cells: { kind: 'amount', range } }], besides: [], becomes: NO });
  });

  test('CHECK-61 says what the other outcome also needs, and nothing of what no answers change', () => {
    const line = aLine({
      questions,
      rules: [aRule('one', { all: [is('a'), { question: 'c', in: ['red', 'green'] }] }), aRule('two', true)],
    });
    const nearest = nearestOutcome(line, 0, knowledgeOf(line, { a: false }));
    expect(nearest).toMatchObject({ changes: [{ question: 'a' }], becomes: UNKNOWN });
    expect(nearest?.besides).toEqual([{ question: 'c', cells: { kind: 'choice', options: ['red', 'green'] } }]);
    expect(nearestOutcome(line, 1, knowledgeOf(line, {}))).toBeNull();
    expect(nearestOutcome(line, 0, knowledgeOf(line, {}))).toBeNull();
  });
});

test('CHECK-62 the fact that settles most comes first, then the cheaper one', () => {
  const rules = [aRule('one', is('a')), aRule('two', deep), aRule('three', { all: [is('a'), is('b')] })];
  const facts = cheapestFacts([{ compiled: aLine({ questions, rules }), duties: ['one', 'two', 'three'] }], {});
  expect(facts).toEqual([
    { question: 'a', means: 'known', settles: ['one'], atBest: 2 },
    { question: 'depth-mm', means: 'ruler', settles: ['two'], atBest: 1 },
    { question: 'b', means: 'known', settles: [], atBest: 1 },
  ]);
});

describe('on the founding sheets', () => {
  const on = aDate('2026-12-01');
  const answers: Answers = { use: 'food', form: 'mug', 'holds-liquid': true };

  test.each(['eu', 'dk', 'us', 'us-ca', 'ca', 'jp'])(
    'CHECK-63 every coming day in %s is looked at once, and told only with a change',
    (code) => {
      const loaded = seedLine(code, on);
      const days = boundariesOf(loaded, on);
      expect(days.every((day) => on < day && day <= addMonths(on, 24))).toBe(true);
      const steps = timelineOf({ loaded, questions: QUESTIONS, places: [], answers, declined: [], on });
      for (const step of steps) {
        expect(days).toContain(step.on);
        expect(step.changes?.length).not.toBe(0);
      }
    },
  );

  test('CHECK-63 a line that ends within two years is told with its day', () => {
    const loaded = seedLine('dk', on);
    const layers = loaded.layers.map((layer) => ({
      ...layer,
      sheet: {
        ...layer.sheet,
        rules: layer.sheet.rules.map((rule) => (rule.id === 'dk-register' ? { ...rule, to: aDate('2027-07-01') } : rule)),
      },
    }));
    const steps = timelineOf({ loaded: { ...loaded, layers }, questions: QUESTIONS, places: [], answers, declined: [], on });
    const step = steps.find((one) => one.on === '2027-07-01');
    expect(step?.changes).toContainEqual(expect.objectContaining({ rule: 'dk-register', after: null }));
  });

  test('CHECK-60 CHECK-61 CHECK-62 every line of a list is explained', () => {
    const loaded = seedLine('dk', on);
    expect([...whysOf(loaded, answers).keys()]).toEqual(loaded.compiled.rules.map(({ id }) => id));
    expect(factsOver([loaded], answers).length).toBeGreaterThan(3);
  });
});
