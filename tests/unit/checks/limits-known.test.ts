import { expect, test } from 'vitest';
import { judge } from '@/lib/checks/domain/judge';
import { limitsOfList } from '@/lib/checks/domain/limits-known';
import { aDate, seedLine } from '../../builders/seed-sheets';

const DAY = aDate('2026-12-01');
const MUG = { use: 'food', form: 'mug', 'holds-liquid': true, 'depth-mm': 95 };

/** What the list of a place says of limits, for a mug. */
function saidIn(code: string) {
  const { compiled, layers } = seedLine(code, DAY);
  const rules = new Map(layers.flatMap(({ sheet }) => sheet.rules.map((rule) => [rule.id, rule])));
  return limitsOfList(
    judge(compiled, MUG, []).flatMap(({ id }) => {
      const rule = rules.get(id);
      return rule === undefined ? [] : [{ topic: rule.payload.topic, strength: rule.strength }];
    }),
  );
}

// Each as its sheet stands: the EU's limits were read, China's are from memory, and Hong Kong, Australia and Norway give no figure that we read.
test.each([
  ['dk', 'some'],
  ['us-il', 'some'],
  ['cn', 'unconfirmed'],
  ['gb-wls', 'unconfirmed'],
  ['hk', 'not-found'],
  ['au', 'not-found'],
  ['no', 'not-found'],
])('CHECK-24 the list of %s says of limits: %s', (code, expected) => {
  expect(saidIn(code)).toBe(expected);
});
