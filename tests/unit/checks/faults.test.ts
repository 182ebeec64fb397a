import { describe, expect, test } from 'vitest';
import type { CompileFault, EngineRule } from '@/lib/checks/domain/line';
import { compileLine } from '@/lib/checks/domain/line';
import type { Question } from '@/lib/checks/domain/questions';
import type { Condition } from '@/lib/regions/domain/condition';
import { aLine, aRule, aTerm, choice, day, faultOf, region, yesno } from './lines';

const depth: Question = { id: 'depth', topic: 'form', kind: 'amount', unit: 'mm' };
const price: Question = { id: 'price', topic: 'scale', kind: 'money' };
const questions = [yesno('a'), choice('c', ['x', 'y']), depth, price, region('seller')];

test.each<[string, Condition]>([
  ['a choice asked for a yes', { question: 'c', is: true }],
  ['an option that is not offered', { question: 'c', is: 'z' }],
  ['one strange option among others', { question: 'c', in: ['x', 'z'] }],
  ['yes or no asked for a text', { question: 'a', is: 'yes' }],
  ['yes or no compared', { question: 'a', lt: { value: 1, unit: 'mm' } }],
  ['a length compared with a volume', { question: 'depth', lt: { value: 1, unit: 'mL' } }],
  ['a length in no known unit', { question: 'depth', lt: { value: 1, unit: 'furlong' } }],
  ['a length that is no number', { question: 'depth', lt: { value: Number.NaN, unit: 'mm' } }],
  ['money compared with a length', { question: 'price', lt: { value: 1, unit: 'mm' } }],
  ['a length asked where it lies', { question: 'depth', within: 'dk' }],
  ['a place compared', { question: 'seller', is: 'dk' }],
])('CHECK-17 refused: %s', (_, when) => {
  expect(faultOf({ questions, rules: [aRule('r', when)] })).toMatchObject({ kind: 'bad-test', in: 'r' });
});

test('CHECK-17 names that lead nowhere are refused where they stand', () => {
  expect(faultOf({ questions, rules: [aRule('r', { question: 'gone', is: true })] })).toEqual({
    kind: 'unknown-question',
    in: 'r',
    about: 'gone',
  });
  expect(faultOf({ questions, rules: [aRule('r', { term: 'gone' })] })).toEqual({ kind: 'unknown-term', in: 'r', about: 'gone' });
  const ended = aTerm('t', true, { to: day('2026-12-01') });
  expect(faultOf({ questions, terms: [ended], rules: [aRule('r', { term: 't' })] })).toEqual({ kind: 'unknown-term', in: 'r', about: 't' });
});

test('CHECK-17 terms that run in a circle are refused, whatever hangs on them', () => {
  const terms = [aTerm('above', { term: 'one' }), aTerm('one', { not: { term: 'two' } }), aTerm('two', { all: [{ term: 'one' }] })];
  expect(faultOf({ questions, terms, rules: [] }).kind).toBe('term-cycle');
  expect(['one', 'two']).toContain(faultOf({ questions, terms, rules: [] }).in);
  expect(faultOf({ terms: [aTerm('self', { term: 'self' })] })).toEqual({ kind: 'term-cycle', in: 'self' });
});

test('CHECK-17 gates that run in a circle are refused', () => {
  const one: Question = { ...choice('one', ['x', 'y']), askIf: { question: 'two', in: ['x'] } };
  const two: Question = { ...choice('two', ['x', 'y']), askIf: { question: 'one', in: ['x'] } };
  expect(faultOf({ questions: [one, two], rules: [aRule('r', { question: 'one', is: 'x' })] }).kind).toBe('bad-test');
});

describe('attacks', () => {
  const duty = aRule('duty', true, { order: 5 });
  const attack = (rest: Partial<EngineRule>): EngineRule => aRule('attack', true, { kind: 'excepts', targets: ['duty'], ...rest });
  const layers = (attacker: EngineRule, target: EngineRule) => [
    { region: 'qq', rules: [target], terms: [] },
    { region: 'qq-x', rules: [attacker], terms: [] },
  ];
  const upwards: CompileFault = { kind: 'attack-not-downwards', in: 'attack', about: 'duty' };

  test('CHECK-17 an attack goes down in rank', () => {
    expect(faultOf({ rules: [duty, attack({ order: 4 })] })).toEqual(upwards);
    expect(faultOf({ rules: [duty, attack({ order: 5 })] })).toEqual(upwards);
    expect(faultOf({ rules: [attack({ targets: ['attack'] })] })).toMatchObject({ kind: 'attack-not-downwards' });
    expect(aLine({ rules: [duty, attack({ order: 6 })] }).rules).toHaveLength(2);
    expect(aLine({ layers: layers(attack({ order: 0 }), duty) }).rules).toHaveLength(2);
  });

  test('CHECK-17 a firm rule is attacked in its own layer only', () => {
    expect(faultOf({ layers: layers(attack({}), { ...duty, firm: true }) })).toEqual({
      kind: 'attack-on-firm',
      in: 'attack',
      about: 'duty',
    });
    expect(aLine({ rules: [{ ...duty, firm: true }, attack({ order: 6 })] }).rules).toHaveLength(2);
  });

  test('CHECK-9 an attack on or by a rule that is not active does nothing', () => {
    const line = aLine({ rules: [duty, attack({ order: 4, from: day('2026-12-02') })] });
    expect(line.rules.map(({ id, attackers }) => [id, attackers])).toEqual([['duty', []]]);
    expect(aLine({ rules: [duty, attack({ order: 4 })], except: ['duty'] }).rules).toHaveLength(1);
  });
});

describe('budgets', () => {
  const comparing = (count: number): Condition => ({
    any: Array.from({ length: count }, (_, at) => ({ question: 'depth', lt: { value: at, unit: 'mm' } })),
  });

  test('CHECK-17 an amount is cut at fourteen places at most', () => {
    expect(aLine({ questions, rules: [aRule('r', comparing(14))] }).rules).toHaveLength(1);
    expect(faultOf({ questions, rules: [aRule('r', comparing(15))] })).toEqual({ kind: 'too-many-cells', in: 'r', about: 'depth' });
  });

  test('CHECK-17 money is cut at fourteen places in each currency', () => {
    const priced = (unit: string, least: number): Condition => ({
      any: Array.from({ length: 14 }, (_, at) => ({ question: 'price', lt: { value: least + at, unit } })),
    });
    expect(aLine({ questions, rules: [aRule('r', { any: [priced('EUR', 0), priced('DKK', 100)] })] }).rules).toHaveLength(1);
  });

  const many = Array.from({ length: 40 }, (_, at) => yesno(`q${at}`));
  const asking = (list: readonly Question[]): readonly Condition[] => list.map(({ id }) => ({ question: id, is: true }));

  test('CHECK-17 a rule rests on fourteen questions at most, those of its attackers included', () => {
    expect(aLine({ questions: many, rules: [aRule('r', { all: asking(many.slice(0, 14)) })] }).rules).toHaveLength(1);
    expect(faultOf({ questions: many, rules: [aRule('r', { all: asking(many.slice(0, 15)) })] })).toEqual({
      kind: 'too-many-questions',
      in: 'r',
    });
  });

  test('CHECK-17 diagrams that grow beyond all bounds are given up', () => {
    // Pairs far apart in the order of asking: the diagram must remember one half before it sees the other.
    const pairs = many.slice(0, 20).map(({ id }, at): Condition => ({
      any: [
        {
          all: [
            { question: id, is: true },
            { question: `q${at + 20}`, is: true },
          ],
        },
        {
          all: [
            { question: id, is: false },
            { question: `q${at + 20}`, is: false },
          ],
        },
      ],
    }));
    expect(faultOf({ questions: many, rules: [aRule('r', { all: pairs })] })).toEqual({ kind: 'too-many-nodes', in: 'r' });
  });

  test('CHECK-17 neither a deep condition nor a long chain of terms exhausts the stack', () => {
    let deep: Condition = true;
    for (let level = 0; level < 20_000; level += 1) deep = { not: deep };
    expect(faultOf({ rules: [aRule('r', deep)] })).toEqual({ kind: 'bad-test', in: 'r' });
    expect(faultOf({ terms: [aTerm('t', deep)] })).toEqual({ kind: 'bad-test', in: 't' });
    const chain = Array.from({ length: 5000 }, (_, at) =>
      aTerm(`t${at}`, at === 0 ? { question: 'a', is: true } : { not: { term: `t${at - 1}` } }),
    );
    expect(aLine({ questions, terms: chain, rules: [aRule('r', { term: 't4999' })] }).rules).toHaveLength(1);
  });
});

test('CHECK-17 a line without any rule compiles', () => {
  expect(compileLine({ questions, layers: [], except: [], on: day('2026-12-01'), places: [] }).ok).toBe(true);
});
