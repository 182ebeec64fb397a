import { describe, expect, test } from 'vitest';
import type { Condition } from '@/lib/regions/domain/condition';
import { sayCondition, type SaidCondition } from '@/lib/regions/domain/condition-words';
import type { SheetNames } from '@/lib/regions/domain/sheet-names';

const NAMES: SheetNames = {
  terms: new Map([['eu-flat', { name: 'Flat ware', region: 'eu', category: true }]]),
  regions: new Map([['dk', 'Denmark']]),
};

const say = (condition: Condition): SaidCondition => sayCondition(condition, NAMES);
const textOf = (condition: Condition): string => {
  const said = say(condition);
  return said.kind === 'line' ? said.text : JSON.stringify(said);
};
const mm = (value: number): { value: number; unit: string } => ({ value, unit: 'mm' });

describe('one question', () => {
  test('a yes or a no is said as its answer', () => {
    expect(textOf({ question: 'drinking-rim', is: true })).toBe('Made to be drunk from');
    expect(textOf({ question: 'drinking-rim', is: false })).toBe('Not made to be drunk from');
  });

  test('a choice names its question and its options', () => {
    expect(textOf({ question: 'form', is: 'jar' })).toBe('Form: “Jar”');
    expect(textOf({ question: 'form', in: ['cup', 'jar', 'bowl'] })).toBe('Form: “Cup”, “Jar” or “Bowl”');
  });

  test('a border says on which side the figure itself lies', () => {
    expect(textOf({ question: 'depth-mm', gt: mm(25) })).toBe('Inside depth: more than 25\u00a0mm');
    expect(textOf({ question: 'depth-mm', le: mm(25) })).toBe('Inside depth: at most 25\u00a0mm');
    expect(textOf({ question: 'depth-mm', lt: mm(25) })).toBe('Inside depth: less than 25\u00a0mm');
    expect(textOf({ question: 'depth-mm', ge: mm(25.5) })).toBe('Inside depth: at least 25.5\u00a0mm');
  });

  test('money keeps the currency of the rule', () => {
    expect(textOf({ question: 'turnover-a-year', le: { value: 50_000, unit: 'DKK' } })).toBe('Turnover a year: at most DKK\u00a050,000');
  });

  test('a place is named by its sheet, else by its ISO name, else by its code', () => {
    expect(textOf({ question: 'seller-region', within: 'dk' })).toBe('Where you are established: in Denmark');
    expect(textOf({ question: 'seller-region', within: 'se' })).toBe('Where you are established: in Sweden');
    expect(textOf({ question: 'seller-region', within: 'us-ny' })).toBe('Where you are established: in US-NY');
  });

  test('a term is named and keeps its id, so that it can lead to its definition', () => {
    expect(say({ term: 'eu-flat' })).toEqual({ kind: 'line', text: 'It counts as “Flat ware”', term: 'eu-flat' });
  });
});

describe('denials', () => {
  test('a denied yes is the no, a denied border the other side', () => {
    expect(textOf({ not: { question: 'drinking-rim', is: true } })).toBe('Not made to be drunk from');
    expect(textOf({ not: { question: 'depth-mm', gt: mm(25) } })).toBe('Inside depth: at most 25\u00a0mm');
    expect(textOf({ not: { question: 'depth-mm', lt: mm(25) } })).toBe('Inside depth: at least 25\u00a0mm');
  });

  test('two denials are none', () => {
    expect(say({ not: { not: { term: 'eu-flat' } } })).toEqual(say({ term: 'eu-flat' }));
  });

  test('in a list of which all must be true, denials stand together under "unless"', () => {
    const said = say({
      all: [
        { question: 'use', is: 'food' },
        { not: { term: 'eu-flat' } },
        {
          not: {
            any: [
              { question: 'form', is: 'tile' },
              { question: 'form', is: 'vase' },
            ],
          },
        },
      ],
    });
    expect(said).toMatchObject({
      join: 'all',
      parts: [{ text: 'What it is sold for: “Food or drink”' }],
      unless: [{ term: 'eu-flat' }, { text: 'Form: “Tile”' }, { text: 'Form: “Vase”' }],
    });
  });

  test('a list of denials alone says "none of these"', () => {
    expect(say({ all: [{ not: { term: 'eu-flat' } }, { not: { question: 'form', is: 'tile' } }] })).toMatchObject({
      join: 'none',
      parts: [{ term: 'eu-flat' }, { text: 'Form: “Tile”' }],
    });
  });

  test('a denied list of which all must be true says "not all", not "none"', () => {
    const both: Condition = {
      all: [
        { question: 'cooked-in', is: true },
        { question: 'lidded', is: true },
      ],
    };
    expect(say({ not: both })).toMatchObject({ join: 'not-all', parts: [{ text: 'Food is cooked in it' }, { text: 'Has a ceramic lid' }] });
    expect(say({ any: [{ not: both }, { term: 'eu-flat' }] })).toMatchObject({
      join: 'any',
      parts: [{ join: 'not-all' }, { term: 'eu-flat' }],
    });
  });
});

test('always and never, plain or denied', () => {
  expect(say(true)).toEqual({ kind: 'always' });
  expect(say({ not: true })).toEqual({ kind: 'never' });
  expect(say({ not: false })).toEqual({ kind: 'always' });
});

test('a list of one that must be true is that one', () => {
  expect(say({ all: [{ term: 'eu-flat' }] })).toEqual(say({ term: 'eu-flat' }));
});
