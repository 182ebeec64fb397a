import fc from 'fast-check';
import { expect, test } from 'vitest';
import type { Condition } from '@/lib/regions/domain/condition';
import { sayCondition, type SaidCondition } from '@/lib/regions/domain/condition-words';

type Values = ReadonlyMap<string, boolean>;
const TERMS = ['a', 'b', 'c', 'd'];

const tree = fc.letrec<{ tree: Condition }>((tie) => ({
  tree: fc.oneof(
    { depthSize: 'small' },
    fc.constantFrom(...TERMS).map((term) => ({ term })),
    fc.boolean(),
    tie('tree').map((inner) => ({ not: inner })),
    fc.array(tie('tree'), { minLength: 1, maxLength: 3 }).map((all) => ({ all })),
    fc.array(tie('tree'), { minLength: 1, maxLength: 3 }).map((any) => ({ any })),
  ),
})).tree;

function holds(condition: Condition, values: Values): boolean {
  if (typeof condition === 'boolean') return condition;
  if ('all' in condition) return condition.all.every((part) => holds(part, values));
  if ('any' in condition) return condition.any.some((part) => holds(part, values));
  if ('not' in condition) return !holds(condition.not, values);
  return 'term' in condition && values.get(condition.term) === true;
}

/** What a reader takes the words to mean. */
function reads(said: SaidCondition, values: Values): boolean {
  if (said.kind === 'always' || said.kind === 'never') return said.kind === 'always';
  if (said.kind === 'line') return said.term !== undefined && values.get(said.term) === true;
  const parts = said.parts.map((part) => reads(part, values));
  const held = { all: parts.every(Boolean), any: parts.some(Boolean), none: !parts.some(Boolean), 'not-all': !parts.every(Boolean) }[
    said.join
  ];
  return held && !said.unless.some((part) => reads(part, values));
}

test('the words of a condition mean what the condition means', () => {
  const values = fc
    .array(fc.boolean(), { minLength: 4, maxLength: 4 })
    .map((picks) => new Map(TERMS.map((term, at) => [term, picks[at] === true])));
  fc.assert(
    fc.property(tree, values, (condition, known) => {
      expect(reads(sayCondition(condition, { terms: new Map(), regions: new Map() }), known)).toBe(holds(condition, known));
    }),
    { numRuns: 500, seed: 7 },
  );
});
