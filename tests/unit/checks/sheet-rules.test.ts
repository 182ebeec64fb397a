import { describe, expect, test } from 'vitest';
import { MOST_QUESTIONS } from '@/lib/checks/domain/line-input';
import type { Condition } from '@/lib/regions/domain/condition';
import { day, yesno } from './lines';
import { above, aSheet, found, isA, isB, isCup, notA, partOf, QUESTIONS, sheetRule, sheetTerm, told } from './sheets';

const levels = (findings: ReturnType<typeof found>): readonly string[] => findings.map(({ level }) => level);

test('CHECK-70 a sound sheet gives no finding at all', () => {
  const sheet = aSheet([sheetRule('one', { term: 'kind' }), sheetRule('two', isB)], { terms: [sheetTerm('kind', isA)] });
  expect(found(sheet)).toEqual([]);
});

describe('C1 names', () => {
  test.each<[string, Condition, string]>([
    ['a question that is not there', { question: 'gone', is: true }, 'unknown-question rules/r/when'],
    ['a term that is not there', { term: 'gone' }, 'unknown-term rules/r/when'],
    ['a unit that is not of the question', { question: 'depth', lt: { value: 3, unit: 'mL' } }, 'bad-test rules/r/when'],
    ['an option that is not offered', { question: 'form', is: 'vase' }, 'bad-test rules/r/when'],
  ])('CHECK-70 C1: %s', (_, when, at) => {
    expect(told(found(aSheet([sheetRule('r', when)])), 'C1')).toContain(at);
    expect(told(found(aSheet([sheetRule('r', isA)])), 'C1')).toEqual([]);
  });

  test('CHECK-70 C1: terms are checked as rules are, and a circle of them is found', () => {
    const bad = sheetTerm('kind', { question: 'gone', is: true });
    expect(told(found(aSheet([sheetRule('r', { term: 'kind' })], { terms: [bad] })), 'C1')).toContain('unknown-question terms/kind/when');
    const circle = [sheetTerm('x', { term: 'y' }), sheetTerm('y', { term: 'x' })];
    expect(told(found(aSheet([sheetRule('r', { term: 'x' })], { terms: circle })), 'C1')).toEqual(['term-cycle terms/x/when']);
  });

  test('CHECK-70 C1: a term that ends before what uses it is found on the day it is missing', () => {
    const terms = [sheetTerm('kind', isA, { to: day('2027-06-01') })];
    const [finding] = found(aSheet([sheetRule('r', { term: 'kind' })], { terms }));
    expect(finding).toMatchObject({ check: 'C1', kind: 'term-not-in-force', at: { id: 'r' }, values: { term: 'kind', on: '2027-06-01' } });
    expect(found(aSheet([sheetRule('r', { term: 'kind' }, { to: day('2027-06-01') })], { terms }))).toEqual([]);
  });

  test('CHECK-70 C1: an id stands once in a list, and a rule once in the world', () => {
    expect(told(found(aSheet([sheetRule('r', isA), sheetRule('r', isB)])), 'C1')).toContain('twice rules/r/id');
    const elsewhere = above([sheetRule('r', isB)]);
    expect(told(found(aSheet([sheetRule('r', isA)]), { around: [elsewhere] }), 'C1')).toEqual(['rule-elsewhere rules/r/id']);
    expect(told(found(aSheet([sheetRule('q', isA)]), { around: [elsewhere] }), 'C1')).toEqual([]);
  });

  test('CHECK-70 C1: memberships lead to places with a sheet, not in a circle, and leave out rules that are there', () => {
    const vale = above([sheetRule('v', isA)]);
    const sheet = aSheet([], { memberships: [{ parent: 'vv', from: null, to: null, except: [{ rule: 'v', why: 'Its own law' }] }] });
    expect(told(found(sheet, { around: [vale] }), 'C1')).toEqual([]);
    const missing = aSheet([], { memberships: [{ parent: 'vv', from: null, to: null, except: [{ rule: 'w', why: 'Its own law' }] }] });
    expect(told(found(missing, { around: [vale] }), 'C1')).toEqual(['except-unknown memberships/vv/except']);
    expect(told(found(sheet), 'C1')).toEqual(['parent-unknown memberships/vv/parent']);
    const circle = above([sheetRule('v', isA)], { memberships: partOf('qq') });
    expect(told(found(sheet, { around: [circle] }), 'C1')).toContain('membership-circle memberships/vv/parent');
  });

  test('CHECK-70 C1: a change that keeps a line below from being read is found', () => {
    const base = above([sheetRule('v', isA)], { terms: [sheetTerm('kind', isA, { region: 'vv' })] });
    const sheet = aSheet([sheetRule('r', { term: 'kind' })], { memberships: partOf('vv') });
    const without = { ...base, terms: [] };
    const [finding] = found(without, { base, around: [sheet] });
    expect(finding).toMatchObject({
      check: 'C1',
      level: 'error',
      kind: 'breaks-below',
      values: { region: 'qq', rule: 'r', about: 'kind' },
    });
    expect(told(found(base, { base, around: [sheet] }), 'C1')).toEqual([]);
  });
});

describe('C2 attacks', () => {
  const duty = sheetRule('duty', isA, { order: 5 });
  const attack = (rest: Parameters<typeof sheetRule>[2]) =>
    sheetRule('attack', isB, { kind: 'excepts', targets: ['duty'], order: 6, ...rest });

  test('CHECK-71 C2: an attack goes down in rank, on a rule that is there and in force with it', () => {
    expect(found(aSheet([duty, attack({})]))).toEqual([]);
    expect(told(found(aSheet([duty, attack({ order: 4 })])), 'C2')).toEqual(['attack-upwards rules/attack/targets']);
    expect(told(found(aSheet([duty, attack({ targets: ['gone'] })])), 'C2')).toEqual(['target-unknown rules/attack/targets']);
    const ended = { ...duty, to: day('2026-01-01') };
    expect(told(found(aSheet([ended, attack({ from: day('2026-01-01') })])), 'C2')).toEqual(['target-never-together rules/attack/targets']);
    expect(told(found(aSheet([ended, attack({ from: day('2025-12-31') })])), 'C2')).toEqual([]);
  });

  test('CHECK-71 C2: a fixed rule of a layer above is not attacked; one of the same sheet may be', () => {
    const vale = above([{ ...duty, firm: true }]);
    const sheet = aSheet([attack({})], { memberships: partOf('vv') });
    expect(told(found(sheet, { around: [vale] }), 'C2')).toEqual(['attack-on-firm rules/attack/targets']);
    expect(told(found(sheet, { around: [above([duty])] }), 'C2')).toEqual([]);
    expect(told(found(aSheet([{ ...duty, firm: true }, attack({})])), 'C2')).toEqual([]);
  });

  test('CHECK-71 C2: what stands beside a rule must be there; targets left out anyway and targets taken away are noted', () => {
    const beside = attack({ kind: 'replaces', alongside: ['gone'] });
    expect(told(found(aSheet([duty, beside])), 'C2')).toEqual(['alongside-unknown rules/attack/alongside']);
    const vale = above([duty]);
    const memberships = [{ parent: 'vv', from: null, to: null, except: [{ rule: 'duty', why: 'Its own law' }] }];
    const excepted = found(aSheet([attack({})], { memberships }), { around: [vale] });
    expect([told(excepted, 'C2'), levels(excepted)]).toEqual([['target-excepted rules/attack/targets'], ['note']]);
    const gone = found(above([]), { base: vale, around: [aSheet([attack({})], { memberships: partOf('vv') })] });
    expect(told(gone, 'C2')).toEqual(['target-withdrawn rules/duty/id']);
  });
});

describe('C3 clashes', () => {
  const duty = sheetRule('duty', isCup, { order: 0 });
  const one = sheetRule('one', isA, { kind: 'replaces', targets: ['duty'], order: 1 });
  const two = (when: Condition, rest: Parameters<typeof sheetRule>[2] = {}) =>
    sheetRule('two', when, { kind: 'replaces', targets: ['duty'], order: 2, ...rest });

  test('CHECK-72 C3: two rules that take the same place for one piece clash; apart, attacking, or side by side they do not', () => {
    expect(told(found(aSheet([duty, one, two(isB)])), 'C3')).toEqual(['clash rules/two/alongside']);
    expect(told(found(aSheet([duty, one, two(notA)])), 'C3')).toEqual([]);
    expect(told(found(aSheet([duty, one, two(isB, { targets: ['duty', 'one'] })])), 'C3')).toEqual([]);
    expect(told(found(aSheet([duty, one, two(isB, { alongside: ['one'] })])), 'C3')).toEqual([]);
    expect(told(found(aSheet([duty, { ...one, alongside: ['two'] }, two(isB)])), 'C3')).toEqual([]);
    expect(told(found(aSheet([duty, one, two(isB, { kind: 'excepts' })])), 'C3')).toEqual([]);
  });

  test('CHECK-72 C3: rules of different layers clash, and so do rules that meet on a later day only', () => {
    const vale = above([duty, one]);
    const sheet = aSheet([two(isB)], { memberships: partOf('vv') });
    expect(told(found(sheet, { around: [vale] }), 'C3')).toEqual(['clash rules/two/alongside']);
    const [clash] = found(aSheet([duty, one, two(isB, { from: day('2027-03-01') })]));
    expect(clash).toMatchObject({ kind: 'clash', values: { other: 'one', target: 'duty', on: '2027-03-01' } });
  });

  test('CHECK-72 C3: a new rule that clashes with one of a place below is found, at the new rule', () => {
    const base = above([duty]);
    const below = aSheet([two(isB)], { memberships: partOf('vv') });
    const findings = found(above([duty, one]), { base, around: [below] });
    expect(told(findings, 'C3')).toEqual(['clash-below rules/one/alongside']);
    const apart = found(above([duty, { ...one, when: { all: [isA, { not: isB }] } }]), { base, around: [below] });
    expect(told(apart, 'C3')).toEqual([]);
  });
});

describe('C4 rules that never or always apply', () => {
  test('CHECK-73 C4: a condition that contradicts itself, and one that cannot fail', () => {
    expect(told(found(aSheet([sheetRule('r', { all: [isA, notA] })])), 'C4')).toEqual(['never-applies rules/r/when']);
    expect(told(found(aSheet([sheetRule('r', false)])), 'C4')).toEqual(['never-applies rules/r/when']);
    expect(told(found(aSheet([sheetRule('r', { any: [isA, notA] })])), 'C4')).toEqual(['always-applies rules/r/when']);
    expect(told(found(aSheet([sheetRule('r', true), sheetRule('s', isA)])), 'C4')).toEqual([]);
  });

  test('CHECK-73 C4: attackers count: a rule of the sheet that always gives way is dead, unless it has days of its own', () => {
    const dead = sheetRule('r', isA, { order: 0 });
    const over = sheetRule('over', true, { kind: 'replaces', targets: ['r'] });
    expect(told(found(aSheet([dead, over])), 'C4')).toEqual(['never-applies rules/r/when']);
    expect(told(found(aSheet([dead, { ...over, from: day('2027-01-01') }])), 'C4')).toEqual([]);
    expect(told(found(aSheet([dead, { ...over, when: isB }])), 'C4')).toEqual([]);
  });

  test('CHECK-73 C4: an inherited rule that is newly replaced for every piece is a note', () => {
    const vale = above([sheetRule('v', isA, { order: 0 })]);
    const over = sheetRule('over', isA, { kind: 'replaces', targets: ['v'] });
    const sheet = aSheet([over], { memberships: partOf('vv') });
    const findings = found(sheet, { around: [vale], base: { ...sheet, rules: [{ ...over, when: { all: [isA, isB] } }] } });
    expect(told(findings, 'C4')).toEqual(['fully-replaced rules/over/targets']);
    expect(levels(findings.filter(({ check }) => check === 'C4'))).toEqual(['note']);
    expect(told(found(sheet, { around: [vale] }), 'C4')).toEqual([]);
  });
});

describe('C5 questions', () => {
  test('CHECK-74 C5: a question behind a gate that cannot open', () => {
    expect(told(found(aSheet([sheetRule('r', { any: [isA, { question: 'shut', is: true }] })])), 'C5')).toEqual([
      'gate-never rules/r/when',
    ]);
    expect(told(found(aSheet([sheetRule('r', { any: [isA, { question: 'behind', is: true }] })])), 'C5')).toEqual([]);
  });

  test('CHECK-74 C5: a part that cannot hold, and a question that changes nothing', () => {
    const plateAndBehind: Condition = {
      all: [
        { question: 'form', is: 'plate' },
        { question: 'behind', is: true },
      ],
    };
    const findings = found(aSheet([sheetRule('r', { any: [isA, plateAndBehind] })]));
    expect(told(findings, 'C5')).toEqual(['question-idle rules/r/when', 'question-idle rules/r/when', 'part-never rules/r/when']);
    expect(levels(findings)).toEqual(['note', 'note', 'note']);
    expect(told(found(aSheet([sheetRule('r', { any: [isA, { all: [isCup, { question: 'behind', is: true }] }] })])), 'C5')).toEqual([]);
  });

  test('CHECK-74 C5: questions and terms that nothing uses any more', () => {
    const base = aSheet([sheetRule('r', { all: [isA, isB] })]);
    expect(told(found({ ...base, rules: [sheetRule('r', isA)] }, { base }), 'C5')).toEqual(['question-unused sheet/qq/rules']);
    const terms = [sheetTerm('idle', isB), sheetTerm('shown', isB, { category: true }), sheetTerm('used', isA)];
    expect(told(found(aSheet([sheetRule('r', { term: 'used' })], { terms })), 'C5')).toEqual(['term-unused terms/idle/id']);
  });
});

describe('C10 budgets', () => {
  const depths = (count: number): Condition => ({
    any: Array.from({ length: count }, (_, at) => ({ question: 'depth', lt: { value: at + 1, unit: 'mm' } })),
  });
  const many = Array.from({ length: MOST_QUESTIONS + 1 }, (_, at) => yesno(`q${at}`));
  const asked = (count: number): Condition => ({ all: many.slice(0, count).map(({ id }) => ({ question: id, is: true })) });

  test('CHECK-79 C10: too many cells of one question, too many questions of one rule', () => {
    expect(told(found(aSheet([sheetRule('r', depths(15))])), 'C10')).toEqual(['too-many-cells rules/r/when']);
    expect(found(aSheet([sheetRule('r', depths(14))]))).toEqual([]);
    const questions = [...QUESTIONS, ...many];
    expect(told(found(aSheet([sheetRule('r', asked(MOST_QUESTIONS + 1))]), { questions }), 'C10')).toEqual([
      'too-many-questions rules/r/when',
    ]);
    expect(told(found(aSheet([sheetRule('r', asked(MOST_QUESTIONS))]), { questions }), 'C10')).toEqual([]);
  });

  test('CHECK-79 C10: too many nodes', () => {
    const pairs = Array.from({ length: 40 }, (_, at) => yesno(`p${at}`));
    const same = Array.from({ length: 20 }, (_, at): Condition => ({
      any: [true, false].map((is) => ({
        all: [
          { question: `p${at}`, is },
          { question: `p${at + 20}`, is },
        ],
      })),
    }));
    expect(told(found(aSheet([sheetRule('r', { all: same })]), { questions: [...QUESTIONS, ...pairs] }), 'C10')).toEqual([
      'too-many-nodes rules/r/when',
    ]);
  });
});
