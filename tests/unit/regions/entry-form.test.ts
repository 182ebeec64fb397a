import { describe, expect, test } from 'vitest';
import { blankItem, formOf } from '@/lib/regions/blank-form';
import { readCondition, writeCondition } from '@/lib/regions/condition-form';
import type { Condition } from '@/lib/regions/domain/condition';
import { conditionIn, linesOf } from '@/lib/regions/domain/condition-entry';
import { rowsIn, type Entry } from '@/lib/regions/domain/entry';
import { applyDo, placeOfDo } from '@/lib/regions/domain/entry-do';
import { keyIn } from '@/lib/regions/domain/sheet-items';
import { freshId } from '@/lib/regions/domain/fresh-id';
import { readItem } from '@/lib/regions/item-form';
import { seedSheets } from '../../builders/seed-sheets';

const line = (path: string, question: string, rest: Entry = {}): Entry => ({
  [`${path}.question`]: question,
  ...Object.fromEntries(Object.entries(rest).map(([name, value]) => [`${path}.${name}`, value])),
});
const two: Entry = {
  'when.join': 'all',
  ...line('when.0', 'lidded', { by: 'yes' }),
  ...line('when.1', 'depth-mm', { by: 'gt', value: '25', unit: 'mm' }),
};

describe('REG-101 a condition is written as blocks and lines, and read as what they say', () => {
  const leaf: Condition = { question: 'lidded', is: true };
  test.each<[string, Condition]>([
    ['always', true],
    ['one line', leaf],
    ['a word', { term: 'food-ware' }],
    ['not a word', { not: { term: 'food-ware' } }],
    ['a list with a denied line', { all: [leaf, { not: { question: 'seller-region', within: 'eu' } }] }],
    ['none of several', { not: { any: [leaf, { term: 'eu-flat' }] } }],
    ['a denied list', { not: { all: [leaf, { term: 'eu-flat' }] } }],
    ['blocks within blocks', { any: [leaf, { all: [leaf, { any: [{ question: 'form', in: ['cup', 'mug'] }, leaf] }] }] }],
    ['money', { question: 'turnover-a-year', le: { value: 50_000, unit: 'DKK' } }],
    ['a denied yes, which a block says', { not: leaf }],
  ])('%s', (_, condition) => {
    expect(readCondition(writeCondition(condition))).toEqual({ value: condition, faults: {} });
  });

  test('what is not filled in is named at its field, and an empty block at its choice', () => {
    const { faults } = readCondition({
      'when.join': 'any',
      ...line('when.0', ''),
      ...line('when.1', 'depth-mm', { by: 'le', value: 'deep', unit: 'mm' }),
      ...line('when.2', 'form', { by: 'is' }),
      'when.3.join': 'unless',
    });
    expect(Object.keys(faults).toSorted()).toEqual(['when.0.question', 'when.1.value', 'when.2.values', 'when.3.join']);
  });

  test('a number with a comma is the number; one that could be thousands is asked again', () => {
    const typed = (value: string): Entry => ({ 'when.join': 'all', ...line('when.0', 'depth-mm', { by: 'le', value, unit: 'mm' }) });
    expect(readCondition(typed('2,5')).value).toEqual({ question: 'depth-mm', le: { value: 2.5, unit: 'mm' } });
    expect(readCondition(typed('1.100')).faults).toHaveProperty(['when.0.value']);
  });
});

describe('REG-102 buttons inside a form change what they name and nothing else', () => {
  test('add a line, a block, a row; the place to go on is the new one', () => {
    const added = applyDo(two, 'add-block:when:any');
    expect(added).toEqual({ ...two, 'when.2.join': 'any', 'when.2.0.question': '' });
    expect(placeOfDo(added, 'add-block:when:any')).toBe('when.2.join');
    const deeper = applyDo(added, 'add-line:when.2');
    expect(deeper).toEqual({ ...added, 'when.2.1.question': '' });
    expect(placeOfDo(deeper, 'add-line:when.2')).toBe('when.2.1.question');
    expect(rowsIn(applyDo({ title: 'kept' }, 'add:sources'), 'sources')).toBe(1);
    expect(placeOfDo(applyDo({}, 'add:targets'), 'add:targets')).toBe('targets.0');
  });

  test('take one out: those after it move up, the others stay', () => {
    expect(applyDo(two, 'remove:when.0')).toEqual({
      'when.join': 'all',
      ...line('when.0', 'depth-mm', { by: 'gt', value: '25', unit: 'mm' }),
    });
    const sources: Entry = { 'sources.0.source': 'a', 'sources.1.source': 'b', 'sources.2.source': 'c', title: 'x' };
    expect(applyDo(sources, 'remove:sources.1')).toEqual({ 'sources.0.source': 'a', 'sources.1.source': 'c', title: 'x' });
    expect(applyDo(sources, 'up:sources.2')).toEqual({
      'sources.0.source': 'a',
      'sources.2.source': 'b',
      'sources.1.source': 'c',
      title: 'x',
    });
  });

  test('no button makes a tree deeper than four or longer than forty lines', () => {
    let deep: Entry = two;
    for (const path of ['when', 'when.2', 'when.2.1', 'when.2.1.1', 'when.2.1.1.1']) deep = applyDo(deep, `add-block:${path}:all`);
    expect(readDepth(deep)).toBeLessThanOrEqual(4);
    let long: Entry = two;
    for (let times = 0; times < 60; times += 1) long = applyDo(long, 'add-line:when');
    expect(linesOf(conditionIn(long).parts)).toBe(40);
  });

  test.each([
    '',
    'save',
    'add:__proto__',
    'add:constructor',
    'add:title',
    'remove:title',
    'add-line:sources',
    'add-block:when:both',
    'up:sources.0',
  ])('what is no such button (%s) leaves all as it is', (act) => {
    expect(applyDo(two, act)).toEqual(two);
  });
});

const writable = (entry: Entry): Record<string, string> =>
  Object.fromEntries(Object.entries(entry).map(([name, value]) => [name, String(value)]));

/** Levels of blocks in the names of fields. */
const readDepth = (entry: Entry): number =>
  Math.max(...Object.keys(entry).flatMap((name) => (name.endsWith('.join') ? [name.split('.').length - 1] : [])));

describe('REG-100 a form that is no item says what is missing, by field', () => {
  const denmark = seedSheets.get('dk');
  if (denmark === undefined) throw new Error('dk');

  test('an empty rule', () => {
    const read = readItem('rules/dk-new', blankItem('rules', denmark), denmark);
    expect(read.ok ? [] : Object.keys(read.error)).toEqual(
      expect.arrayContaining(['title', 'says', 'strength', 'when.0.question', 'payload.topic', 'sources.0.standing', 'lookAgainBy']),
    );
  });

  test('each fault is at its own field: a passage without its language, a broken day, a unit that does not fit; then a must without law', () => {
    const eu = seedSheets.get('eu');
    if (eu === undefined) throw new Error('eu');
    const key = keyIn('rules', 'eu-pb-cat1');
    const limit = formOf(eu, key) ?? {};
    const faultsOf = (more: Entry): readonly string[] => {
      const read = readItem(key, { ...limit, ...writable(more) }, eu);
      return read.ok ? [] : Object.keys(read.error).toSorted();
    };
    expect(faultsOf({ 'sources.0.passage': 'x', from: '2026-02-30', 'payload.amount.unit': 'kg' })).toEqual([
      'from',
      'payload.amount.unit',
      'sources.0.passageLang',
    ]);
    expect(faultsOf({ strength: 'must', 'sources.0.standing': 'guidance' })).toEqual(['strength']);
    expect(faultsOf({ 'payload.amount.value': '' })).toEqual(['payload.amount.value']);
  });

  test('what a form does not show is neither lost nor taken from it', () => {
    const values = { ...formOf(denmark, 'rules/dk-register'), id: 'other', region: 'se', facts: 'made-up' };
    const read = readItem('rules/dk-register', values, denmark);
    const before = denmark.rules.find(({ id }) => id === 'dk-register');
    expect(read).toEqual({ ok: true, value: { list: 'rules', value: before } });
  });
});

test('REG-103 an id is made of a name: plain letters, the place before it, and a number where it is taken', () => {
  const never = (): boolean => false;
  expect(freshId({ name: 'Mærk varen – på dansk!', prefix: 'dk', isTaken: never })).toBe('dk-maerk-varen-pa-dansk');
  expect(freshId({ name: 'DK register', prefix: 'dk', isTaken: never })).toBe('dk-register');
  expect(freshId({ name: '日本', prefix: null, isTaken: never })).toBe('new');
  expect(freshId({ name: 'Plate', prefix: null, isTaken: (id) => ['plate', 'plate-2'].includes(id) })).toBe('plate-3');
});
