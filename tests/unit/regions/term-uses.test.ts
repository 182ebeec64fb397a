import { expect, test } from 'vitest';
import { namesTerm, usesOfTerm } from '@/lib/regions/domain/term-uses';
import { seedSheets } from '@/tests/builders/seed-sheets';

const SHEETS = [...seedSheets.values()];
const TERMS = SHEETS.flatMap(({ terms }) => terms.map(({ id }) => id));

/** By the letters of the condition, not by walking it. */
const isSaidIn = (when: unknown, term: string): boolean => JSON.stringify(when).includes(`"term":"${term}"`);

test('REG-50 every rule and word of any sheet that names a word stands among its uses, and no other', () => {
  const some = TERMS.map((id) => usesOfTerm(SHEETS, id));
  expect(some.some(({ rules }) => rules.length > 1)).toBe(true);
  expect(some.some(({ terms }) => terms.length > 0)).toBe(true);
  for (const [place, id] of TERMS.entries()) {
    expect([id, some[place]?.rules.map((rule) => rule.id).sort()]).toEqual([
      id,
      SHEETS.flatMap(({ rules }) => rules.flatMap((rule) => (isSaidIn(rule.when, id) ? [rule.id] : []))).sort(),
    ]);
    expect([id, some[place]?.terms.map((term) => term.id).sort()]).toEqual([
      id,
      SHEETS.flatMap(({ terms }) => terms.flatMap((term) => (isSaidIn(term.when, id) ? [term.id] : []))).sort(),
    ]);
  }
});

test.each([
  [true, false],
  [{ term: 'cup' }, true],
  [{ not: { term: 'cup' } }, true],
  [{ all: [true, { any: [false, { not: { term: 'cup' } }] }] }, true],
  [{ all: [{ term: 'bowl' }, { question: 'form', is: 'cup' }] }, false],
])('REG-50 %j names the word: %s', (condition, names) => {
  expect(namesTerm(condition, 'cup')).toBe(names);
});
