import { describe, expect, test } from 'vitest';
import { judge, statusOfTerm } from '@/lib/checks/domain/judge';
import type { Answers } from '@/lib/checks/domain/knowledge';
import type { CompiledLine } from '@/lib/checks/domain/line';
import { nextQuestion, questionsOpenFor, stillMatters } from '@/lib/checks/domain/next-question';
import type { Question } from '@/lib/checks/domain/questions';
import { NO, UNKNOWN, YES } from '@/lib/kernel/tri';
import { aLine, aRule, aTerm, choice, day, PLACES, region, yesno } from './lines';

const statuses = (line: CompiledLine, answers: Answers, declined: readonly string[] = []): Readonly<Record<string, string>> =>
  Object.fromEntries(judge(line, answers, declined).map(({ id, status }) => [id, status]));

describe('gates', () => {
  const inside = choice('inside', ['glazed', 'unglazed']);
  const crazed: Question = { ...yesno('crazed'), askIf: { question: 'inside', in: ['glazed'] } };
  const line = aLine({
    questions: [inside, crazed],
    rules: [aRule('said no', { question: 'crazed', is: false }), aRule('not said yes', { not: { question: 'crazed', is: true } })],
  });

  test('CHECK-18 "crazed: no" is false of an unglazed pot, "not crazed" is true of it', () => {
    expect(statuses(line, { inside: 'unglazed' })).toEqual({ 'said no': 'does-not-apply', 'not said yes': 'applies' });
    expect(statuses(line, { inside: 'unglazed', crazed: true })).toEqual({ 'said no': 'does-not-apply', 'not said yes': 'applies' });
    expect(statuses(line, { inside: 'glazed', crazed: false })).toEqual({ 'said no': 'applies', 'not said yes': 'applies' });
  });

  test('CHECK-5 a gated question waits for its gate, unless the gate was declined', () => {
    const gatedFirst = aLine({ questions: [crazed, inside], rules: [aRule('r', { question: 'crazed', is: true })] });
    expect(nextQuestion(gatedFirst, {}, [])).toBe('inside');
    expect(nextQuestion(gatedFirst, {}, ['inside'])).toBe('crazed');
    expect(nextQuestion(gatedFirst, { inside: 'unglazed' }, [])).toBeNull();
    expect(nextQuestion(gatedFirst, {}, ['inside', 'crazed'])).toBeNull();
  });
});

describe('exceptions', () => {
  const line = aLine({
    questions: [yesno('small'), yesno('sold')],
    rules: [
      aRule('duty', true),
      aRule('relief', { question: 'small', is: true }, { kind: 'excepts', targets: ['duty'], order: 1 }),
      aRule('no relief', { question: 'sold', is: true }, { kind: 'excepts', targets: ['relief'], order: 2 }),
    ],
  });

  test('CHECK-9 an exception to an exception brings the target back', () => {
    expect(statuses(line, { small: true, sold: false })).toMatchObject({ duty: 'does-not-apply', relief: 'applies' });
    expect(statuses(line, { small: true, sold: true })).toMatchObject({ duty: 'applies', relief: 'does-not-apply' });
  });

  test('CHECK-15 the target names the exceptions that silence it, and the answers that did it', () => {
    expect(judge(line, { small: true, sold: false }, []).find(({ id }) => id === 'duty')).toEqual({
      id: 'duty',
      region: 'qq',
      status: 'does-not-apply',
      exact: NO,
      silencedBy: ['relief'],
      because: [
        { question: 'small', answer: true },
        { question: 'sold', answer: false },
      ],
    });
  });

  test('CHECK-7 an open rule is to be treated as applying once all it rests on was declined', () => {
    expect(statuses(line, { small: true }, [])).toMatchObject({ duty: 'not-settled' });
    expect(statuses(line, { small: true }, ['sold'])).toMatchObject({ duty: 'treat-as-applying' });
    expect(statuses(line, {}, ['sold'])).toMatchObject({ duty: 'not-settled' });
    expect(questionsOpenFor(line, {}, ['small'], 'duty')).toEqual(['sold', 'small']);
  });
});

describe('rules that replace the same rule', () => {
  const replacing = (id: string, order: number, alongside: readonly string[]) =>
    aRule(id, true, { kind: 'replaces', targets: ['old'], order, alongside });

  test('CHECK-15 sources disagree when either names the other, and only where both replace something active', () => {
    const pair = [replacing('one', 1, []), replacing('two', 2, ['one'])];
    expect(statuses(aLine({ rules: [aRule('old', true), ...pair] }), {})).toEqual({
      old: 'does-not-apply',
      one: 'sources-disagree',
      two: 'sources-disagree',
    });
    expect(statuses(aLine({ rules: pair }), {})).toEqual({ one: 'applies', two: 'applies' });
    const unmarked = [aRule('old', true), replacing('one', 1, []), replacing('two', 2, [])];
    expect(statuses(aLine({ rules: unmarked }), {})).toMatchObject({ one: 'applies', two: 'applies' });
  });
});

describe('amounts', () => {
  const questions: readonly Question[] = [
    { id: 'capacity-ml', topic: 'form', kind: 'amount', unit: 'mL' },
    { id: 'depth-mm', topic: 'form', kind: 'amount', unit: 'mm' },
  ];
  const line = aLine({
    questions,
    rules: [
      aRule('large', { question: 'capacity-ml', gt: { value: 3, unit: 'L' } }),
      aRule('at least', { question: 'capacity-ml', ge: { value: 3000, unit: 'mL' } }),
      aRule('flat', { question: 'depth-mm', le: { value: 25, unit: 'mm' } }),
    ],
  });

  test('CHECK-14 exactly 3 L is not more than 3 L', () => {
    expect(statuses(line, { 'capacity-ml': 3000 })).toMatchObject({ large: 'does-not-apply', 'at least': 'applies' });
    expect(statuses(line, { 'capacity-ml': '3000.000001' })).toMatchObject({ large: 'applies', 'at least': 'applies' });
    expect(statuses(line, { 'capacity-ml': 2999.999999 })).toMatchObject({ large: 'does-not-apply', 'at least': 'does-not-apply' });
  });

  test('CHECK-14 25 mm is still flat', () => {
    expect(statuses(line, { 'depth-mm': 25 })).toMatchObject({ flat: 'applies' });
    expect(statuses(line, { 'depth-mm': 25.000001 })).toMatchObject({ flat: 'does-not-apply' });
  });
});

describe('money', () => {
  const turnover: Question = { id: 'turnover', topic: 'scale', kind: 'money' };
  const line = aLine({
    questions: [turnover, yesno('other')],
    rules: [
      aRule('danish', { question: 'turnover', ge: { value: 50_000, unit: 'DKK' } }),
      aRule('euro', { question: 'turnover', ge: { value: 1000, unit: 'EUR' } }),
    ],
  });
  const euros = { amount: '999.99', currency: 'EUR' };

  test('CHECK-16 an amount in another currency leaves the question open and it is asked again', () => {
    expect(statuses(line, { turnover: euros })).toEqual({ danish: 'not-settled', euro: 'does-not-apply' });
    expect(nextQuestion(line, { turnover: euros }, [])).toBe('turnover');
    expect(statuses(line, { turnover: euros }, ['turnover'])).toEqual({ danish: 'treat-as-applying', euro: 'does-not-apply' });
  });

  test('CHECK-16 a list gives one answer a currency', () => {
    const both = [euros, { amount: '50000', currency: 'DKK' }];
    expect(statuses(line, { turnover: both })).toEqual({ danish: 'applies', euro: 'does-not-apply' });
    expect(stillMatters(line, { turnover: both }, [])).toEqual([]);
    expect(statuses(line, { turnover: [euros, euros] })).toEqual({ danish: 'not-settled', euro: 'not-settled' });
  });
});

describe('several options', () => {
  const contact: Question = { id: 'contact', topic: 'food', kind: 'several', options: ['dry', 'wet', 'acidic'] };
  const line = aLine({
    questions: [contact],
    rules: [aRule('acidic', { question: 'contact', is: 'acidic' }), aRule('liquid', { question: 'contact', in: ['wet', 'acidic'] })],
  });

  test('CHECK-16 the list is complete: what is not in it is a no', () => {
    expect(statuses(line, { contact: ['wet'] })).toEqual({ acidic: 'does-not-apply', liquid: 'applies' });
    expect(statuses(line, { contact: [] })).toEqual({ acidic: 'does-not-apply', liquid: 'does-not-apply' });
    expect(statuses(line, { contact: ['none'] })).toEqual({ acidic: 'does-not-apply', liquid: 'does-not-apply' });
    expect(statuses(line, { contact: ['none', 'wet'] })).toEqual({ acidic: 'not-settled', liquid: 'not-settled' });
  });
});

describe('places', () => {
  const line = aLine({
    questions: [region('seller')],
    places: PLACES,
    rules: [
      aRule('in eu', { question: 'seller', within: 'eu' }),
      aRule('in dk', { question: 'seller', within: 'dk' }),
      aRule('in us', { question: 'seller', within: 'us' }),
      aRule('in br', { question: 'seller', within: 'br' }),
    ],
  });

  test('CHECK-19 a place lies within itself and its line; a part that is not listed counts as its country', () => {
    expect(statuses(line, { seller: 'dk' })).toMatchObject({ 'in eu': 'applies', 'in dk': 'applies', 'in us': 'does-not-apply' });
    expect(statuses(line, { seller: 'us-tx' })).toMatchObject({ 'in us': 'applies', 'in eu': 'does-not-apply' });
    expect(statuses(line, { seller: 'jp' })).toMatchObject({ 'in us': 'does-not-apply', 'in eu': 'does-not-apply' });
    expect(statuses(line, { seller: 'br' })).toMatchObject({ 'in br': 'applies', 'in eu': 'does-not-apply' });
  });

  test('CHECK-19 a bloc leaves open which of its members is meant', () => {
    expect(statuses(line, { seller: 'eu' })).toMatchObject({ 'in eu': 'applies', 'in dk': 'not-settled', 'in us': 'does-not-apply' });
    expect(nextQuestion(line, { seller: 'eu' }, [])).toBe('seller');
  });
});

describe('terms', () => {
  const layers = [
    { region: 'qq', rules: [aRule('general', { term: 'flat' })], terms: [aTerm('flat', { question: 'a', is: true })] },
    {
      region: 'qq-x',
      rules: [aRule('local', { term: 'flat' }, { region: 'qq-x' }), aRule('borrowed', { term: 'early' }, { region: 'qq-x' })],
      terms: [
        aTerm('flat', { not: { term: 'early' } }, { region: 'qq-x' }),
        aTerm('early', { question: 'a', is: true }, { region: 'qq-x', to: day('2026-12-01') }),
        aTerm('early', { question: 'b', is: true }, { region: 'qq-x', from: day('2026-12-01') }),
      ],
    },
  ];
  const line = aLine({ questions: [yesno('a'), yesno('b')], layers });

  test('CHECK-20 a term is read in the layer it is used in, in the version in force', () => {
    expect(statuses(line, { a: true, b: true })).toEqual({ general: 'applies', local: 'does-not-apply', borrowed: 'applies' });
    const before = aLine({ questions: [yesno('a'), yesno('b')], layers, on: day('2026-11-30') });
    expect(statuses(before, { a: false, b: true })).toEqual({ general: 'does-not-apply', local: 'applies', borrowed: 'does-not-apply' });
  });

  test('CHECK-2 the status of a term is that of the most local layer; of no such term it is not known', () => {
    expect(statusOfTerm(line, { b: true }, 'flat')).toBe(NO);
    expect(statusOfTerm(line, { b: false }, 'flat')).toBe(YES);
    expect(statusOfTerm(line, { b: true }, 'steep')).toBe(UNKNOWN);
  });
});
