import { expect, test } from 'vitest';
import type { Condition } from '@/lib/regions/domain/condition';
import { aLine, aRule, choice } from './lines';

/** Seven pairs of questions that must be answered alike, the halves of each pair far apart in the order of asking. */
const OPTIONS = ['x', 'y', 'z'];
const questions = Array.from({ length: 14 }, (_, at) => choice(`q${at}`, OPTIONS));
const pairs = questions.slice(0, 7).map(({ id }, at): readonly [string, string] => [id, `q${at + 7}`]);

const alike = ([one, other]: readonly [string, string]): Condition => ({
  any: OPTIONS.map((option) => ({
    all: [
      { question: one, is: option },
      { question: other, is: option },
    ],
  })),
});
const notApart = ([one, other]: readonly [string, string]): Condition => ({
  not: {
    any: OPTIONS.map((option) => ({
      all: [{ question: one, is: option }, { not: { question: other, in: [option] } }],
    })),
  },
});

test('CHECK-10 thousands of nodes large, two wordings of one condition still share one diagram', () => {
  const line = aLine({
    questions,
    rules: [
      aRule('alike', { all: pairs.map(alike) }),
      aRule('not apart', { all: pairs.toReversed().map(notApart) }),
      aRule('other', { all: pairs.slice(1).map(alike) }),
    ],
  });
  const [one, two, three] = line.rules.map(({ node }) => node);
  expect(line.diagram.size).toBeGreaterThan(2000);
  expect(two).toBe(one);
  expect(three).not.toBe(one);
});
