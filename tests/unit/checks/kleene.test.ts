import { describe, expect, test } from 'vitest';
import { exactOf, kleeneOf } from '@/lib/checks/domain/judge';
import { knowledgeOf, type Answers } from '@/lib/checks/domain/knowledge';
import { NO, UNKNOWN, YES, type Tri } from '@/lib/kernel/tri';
import type { Condition } from '@/lib/regions/domain/condition';
import { aLine, aRule, yesno } from './lines';

const VALUES: readonly Tri[] = [YES, UNKNOWN, NO];
const NAMES: Readonly<Record<Tri, string>> = { 0: 'no', 1: 'not known', 2: 'yes' };
const a: Condition = { question: 'a', is: true };
const b: Condition = { question: 'b', is: true };

function kleene(when: Condition, values: Readonly<Record<string, Tri>>): Tri | undefined {
  const line = aLine({ questions: [yesno('a'), yesno('b')], rules: [aRule('r', when)] });
  const said: Answers = Object.fromEntries(
    Object.entries(values).flatMap(([id, value]) => (value === UNKNOWN ? [] : [[id, value === YES]])),
  );
  return kleeneOf(line, knowledgeOf(line, said))[0];
}

describe('CHECK-1 the tables of strong Kleene logic', () => {
  for (const left of VALUES) {
    test(`CHECK-1 not ${NAMES[left]}`, () => {
      expect(kleene({ not: a }, { a: left })).toBe(2 - left);
    });
    for (const right of VALUES) {
      test(`CHECK-1 ${NAMES[left]} with ${NAMES[right]}`, () => {
        expect(kleene({ all: [a, b] }, { a: left, b: right })).toBe(Math.min(left, right));
        expect(kleene({ any: [a, b] }, { a: left, b: right })).toBe(Math.max(left, right));
      });
    }
  }

  test('CHECK-1 all of nothing holds, any of nothing does not', () => {
    expect(kleene({ all: [] }, {})).toBe(YES);
    expect(kleene({ any: [] }, {})).toBe(NO);
  });
});

test('CHECK-2 the exact status sees what the tables cannot: lead or no lead is one of the two', () => {
  const line = aLine({ questions: [yesno('a')], rules: [aRule('r', { any: [a, { question: 'a', is: false }] })] });
  expect(kleeneOf(line, knowledgeOf(line, {}))).toEqual([UNKNOWN]);
  expect(exactOf(line, knowledgeOf(line, {}))).toEqual([YES]);
});
