import { expect, test } from 'vitest';
import type { EngineRule, EngineTerm, LineInput, Place } from '@/lib/checks/domain/line';
import { compareMeaning, type RuleMeaning } from '@/lib/checks/domain/meaning';
import { QUESTIONS } from '@/lib/checks/domain/questions';
import type { Condition } from '@/lib/regions/domain/condition';
import { aRule, aTerm, day, PLACES } from './lines';

type Parts = { readonly rules: readonly EngineRule[]; readonly terms?: readonly EngineTerm[]; readonly places?: readonly Place[] };

const line = ({ rules, terms = [], places = PLACES }: Parts): LineInput => ({
  questions: QUESTIONS,
  layers: [{ region: 'qq', rules, terms }],
  except: [],
  on: day('2026-12-01'),
  places,
});

const compared = (before: Parts, after: Parts): readonly RuleMeaning[] => {
  const found = compareMeaning({ before: line(before), after: line(after) });
  if (!found.ok) throw new Error(JSON.stringify(found.error));
  return found.value;
};

const deeper = (value: number, unit = 'mm'): Condition => ({ question: 'depth-mm', gt: { value, unit } });
const bowl: Condition = { question: 'form', is: 'bowl' };

test('CHECK-80 other words, another unit and another order keep the meaning', () => {
  const before = { rules: [aRule('a', { all: [bowl, deeper(25)] }), aRule('b', { not: { any: [bowl, deeper(25)] } })] };
  const after = {
    rules: [aRule('a', { all: [deeper(2.5, 'cm'), bowl] }), aRule('b', { all: [{ not: deeper(25) }, { not: bowl }] })],
  };
  expect(compared(before, after).map(({ rule, kind, example }) => [rule, kind, example])).toEqual([
    ['a', 'same', null],
    ['b', 'same', null],
  ]);
});

test('CHECK-81 CHECK-82 a moved border tells a piece between the two, and the share of both cuts', () => {
  const [meaning] = compared({ rules: [aRule('a', { all: [bowl, deeper(25)] })] }, { rules: [aRule('a', { all: [bowl, deeper(40)] })] });
  // Cells of depth: under 25, 25, between, 40, over 40. Between and 40 differ, for one form of 20.
  expect(meaning).toEqual({
    rule: 'a',
    kind: 'changed',
    example: { answers: { form: 'bowl', 'depth-mm': 30 }, before: 'applies', after: 'does-not-apply' },
    share: { cases: '2', of: '100', percent: '2' },
  });
});

test('CHECK-80 a rule that nobody edited changes with its term and with what attacks it', () => {
  const pot = (value: number): EngineTerm => aTerm('pot', deeper(value));
  const rules = (when: Condition): readonly EngineRule[] => [
    aRule('target', bowl),
    aRule('named', { term: 'pot' }),
    aRule('other', { question: 'lidded', is: true }),
    aRule('except', when, { kind: 'excepts', targets: ['target'], order: 1 }),
  ];
  const found = compared({ rules: rules(deeper(25)), terms: [pot(25)] }, { rules: rules(deeper(30)), terms: [pot(30)] });
  expect(found.map(({ rule, kind }) => [rule, kind])).toEqual([
    ['named', 'changed'],
    ['other', 'same'],
    ['target', 'changed'],
    ['except', 'changed'],
  ]);
});

test('CHECK-82 a rule that comes or goes is told with a piece it applies to, one that never applies with none', () => {
  const before = { rules: [aRule('gone', bowl)] };
  const after = { rules: [aRule('fresh', { question: 'contact', is: 'acidic' }), aRule('idle', false)] };
  expect(compared(before, after)).toEqual([
    {
      rule: 'fresh',
      kind: 'added',
      example: { answers: { contact: ['acidic'] }, before: null, after: 'applies' },
      share: { cases: '1', of: '2', percent: '50' },
    },
    { rule: 'idle', kind: 'added', example: null, share: { cases: '0', of: '1', percent: '0' } },
    {
      rule: 'gone',
      kind: 'withdrawn',
      example: { answers: { form: 'bowl' }, before: 'applies', after: null },
      share: { cases: '1', of: '20', percent: '5' },
    },
  ]);
});

test('CHECK-80 CHECK-82 a disagreement that begins is a change, told by a piece on which both apply', () => {
  const rules = (alongside: readonly string[]): readonly EngineRule[] => [
    aRule('target', true),
    aRule('one', bowl, { kind: 'replaces', targets: ['target'], order: 1 }),
    aRule('two', deeper(25), { kind: 'replaces', targets: ['target'], order: 2, alongside }),
  ];
  const found = compared({ rules: rules([]) }, { rules: rules(['one']) });
  expect(found.find(({ rule }) => rule === 'one')?.example).toEqual({
    answers: { form: 'bowl', 'depth-mm': 50 },
    before: 'applies',
    after: 'sources-disagree',
  });
});

test('CHECK-82 amounts that nobody can give make no example: below zero, between two millionths, a part of a person', () => {
  const none = (before: Condition, after: Condition): void => {
    const [meaning] = compared({ rules: [aRule('a', before)] }, { rules: [aRule('a', after)] });
    expect([meaning?.kind, meaning?.example]).toEqual(['changed', null]);
  };
  const people = (value: number): Condition => ({ question: 'employees', gt: { value, unit: 'people' } });
  none({ question: 'depth-mm', lt: { value: 0, unit: 'mm' } }, false);
  none(deeper(25), { question: 'depth-mm', ge: { value: 25.000001, unit: 'mm' } });
  none({ all: [people(9.2), { not: people(9.8) }] }, { all: [people(9.2), { question: 'employees', le: { value: 9.2, unit: 'people' } }] });
});

test('CHECK-82 a bloc stands for no one place; a member of it does', () => {
  const within = (code: string): Condition => ({ question: 'seller-region', within: code });
  const [meaning] = compared({ rules: [aRule('a', within('eu'))] }, { rules: [aRule('a', { any: [within('eu'), within('us')] })] });
  expect(meaning?.example).toEqual({ answers: { 'seller-region': 'us' }, before: 'does-not-apply', after: 'applies' });
  const [member] = compared({ rules: [aRule('a', within('eu'))] }, { rules: [aRule('a', within('dk'))] });
  expect(member?.example?.answers).toEqual({ 'seller-region': 'se' });
});

test('CHECK-80 a version that does not compile is refused with the rule at fault', () => {
  const found = compareMeaning({ before: line({ rules: [] }), after: line({ rules: [aRule('a', { term: 'nowhere' })] }) });
  expect(found).toEqual({ ok: false, error: { kind: 'unknown-term', about: 'nowhere', in: 'a' } });
});
