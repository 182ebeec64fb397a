import fc from 'fast-check';
import { expect, test } from 'vitest';
import { canonicalJson } from '@/lib/kernel/canonical-json';
import { mergeSheets, threeWayRows } from '@/lib/regions/domain/merge-sheets';
import type { Rule } from '@/lib/regions/domain/rule';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { sheetDocument } from '@/lib/regions/schema';
import { seedSheets } from '../../builders/seed-sheets';
import { aRule, aSheet, aSource } from '../../builders/small-world';

const dk = seedSheets.get('dk') ?? aSheet('dk');
type Mend = (sheet: Sheet) => Sheet;

const first =
  (change: Partial<Rule>): Mend =>
  (sheet) => ({
    ...sheet,
    rules: sheet.rules.map((rule, at) => (at === 0 ? { ...rule, ...change } : rule)),
  });

/** Changes that do not touch each other: any of them on one side, the others on the other. */
const MENDS: readonly Mend[] = [
  (sheet) => ({ ...sheet, text: `${sheet.text}\n\nMore.` }),
  (sheet) => ({ ...sheet, gaps: [...sheet.gaps, 'What it costs.'] }),
  (sheet) => ({ ...sheet, name: 'Danmark' }),
  (sheet) => ({ ...sheet, languages: ['da', 'fo'] }),
  first({ title: 'Otherwise' }),
  first({ says: 'Something else.', note: 'A note.' }),
  first({ lookAgainBy: dk.rules[1]?.lookAgainBy ?? aRule('x').lookAgainBy }),
  (sheet) => ({ ...sheet, rules: sheet.rules.filter((_, at) => at !== 1) }),
  (sheet) => ({ ...sheet, rules: [...sheet.rules, aRule('dk-new', { region: 'dk' })] }),
  (sheet) => ({ ...sheet, sources: [...sheet.sources, aSource] }),
  (sheet) => ({
    ...sheet,
    memberships: sheet.memberships.map((edge) => ({ ...edge, except: [{ rule: 'eu-pb-cat1', why: 'Invented.' }] })),
  }),
  (sheet) => ({
    ...sheet,
    authorities: [...sheet.authorities, { name: 'New office', url: null, role: 'Asks', evidence: 'read' as const }],
  }),
  (sheet) => ({ ...sheet, trials: sheet.trials.filter((_, at) => at !== 0) }),
];
const mended = (which: readonly number[]): Sheet => which.reduce((sheet, at) => MENDS[at]?.(sheet) ?? sheet, dk);
const same = (a: Sheet, b: Sheet): void => {
  expect(canonicalJson(a)).toBe(canonicalJson(b));
};
const some = fc.uniqueArray(fc.nat(MENDS.length - 1));

test('REG-55 where one side changed nothing the other stands, and two equal changes are one', () => {
  fc.assert(
    fc.property(some, (which) => {
      const changed = mended(which);
      for (const [now, mine] of [
        [dk, changed],
        [changed, dk],
        [changed, changed],
      ] as const) {
        const { merged, collisions } = mergeSheets({ base: dk, now, mine });
        expect(collisions).toEqual([]);
        same(merged, changed);
      }
    }),
    { numRuns: 40, seed: 20261201 },
  );
});

test('REG-55 changes that do not touch each other are all there, whichever side they come from', () => {
  fc.assert(
    fc.property(some, fc.array(fc.boolean(), { minLength: 13, maxLength: 13 }), (which, sides) => {
      const inOrder = [...which].sort((a, b) => a - b);
      const now = mended(inOrder.filter((at) => sides[at]));
      const mine = mended(inOrder.filter((at) => !sides[at]));
      const { merged, collisions } = mergeSheets({ base: dk, now, mine });
      expect(collisions).toEqual([]);
      same(merged, mended(inOrder));
    }),
    { numRuns: 80, seed: 20261201 },
  );
});

test('REG-55 two changes of one field collide, and the choice decides', () => {
  const now = first({ says: 'Theirs.', title: 'Their title' })(dk);
  const mine = first({ says: 'Mine.', firm: true })(dk);
  const id = dk.rules[0]?.id ?? '';
  const key = `rules/${id} says`;
  const { merged, collisions } = mergeSheets({ base: dk, now, mine }, { [key]: 'now' });
  expect(collisions).toEqual([{ key, item: `rules/${id}`, field: 'says' }]);
  expect(merged.rules[0]).toMatchObject({ says: 'Theirs.', title: 'Their title', firm: true });
  expect(mergeSheets({ base: dk, now, mine }, { [key]: 'mine' }).merged.rules[0]).toMatchObject({ says: 'Mine.' });
  const rows = threeWayRows({ base: dk, now, mine });
  expect(rows.map(({ field, now: theirs, mine: own, collides }) => [field, theirs, own, collides])).toEqual([
    ['Title', 'Their title', dk.rules[0]?.title, false],
    ['What to do', 'Theirs.', 'Mine.', true],
    ['Fixed rule', expect.any(String), expect.any(String), false],
  ]);
});

test('REG-55 what one side withdrew and the other changed collides as a whole', () => {
  const now = { ...dk, rules: dk.rules.slice(1) };
  const mine = first({ says: 'Mine.' })(dk);
  const id = dk.rules[0]?.id ?? '';
  const key = `rules/${id} *`;
  const kept = mergeSheets({ base: dk, now, mine }, { [key]: 'mine' });
  expect(kept.collisions).toEqual([{ key, item: `rules/${id}`, field: '*' }]);
  expect(kept.merged.rules[0]?.says).toBe('Mine.');
  expect(mergeSheets({ base: dk, now, mine }, { [key]: 'now' }).merged.rules).toHaveLength(dk.rules.length - 1);
  expect(threeWayRows({ base: dk, now, mine })).toMatchObject([{ now: null, mine: dk.rules[0]?.title, collides: true, key }]);
});

test('REG-55 two first sheets of one place are put together field by field', () => {
  const now = aSheet('xa', { rules: [aRule('xa-one')], text: 'Theirs.' });
  const mine = aSheet('xa', { rules: [aRule('xa-two')], text: 'Mine.' });
  const { merged, collisions } = mergeSheets({ base: null, now, mine }, { 'text text': 'mine' });
  expect(collisions.map(({ key }) => key)).toEqual(['text text']);
  expect(merged.rules.map(({ id }) => id).sort()).toEqual(['xa-one', 'xa-two']);
  expect(sheetDocument.safeParse(merged).success).toBe(true);
});

test('REG-55 every sheet of the seed can be told in words, three ways', () => {
  for (const sheet of seedSheets.values()) {
    const now = { ...sheet, rules: [], terms: [], sources: [], trials: [], authorities: [], accreditation: [], memberships: [] };
    const rows = threeWayRows({ base: sheet, now, mine: sheet });
    const things = [sheet.rules, sheet.terms, sheet.sources, sheet.trials, sheet.authorities, sheet.accreditation, sheet.memberships];
    expect(rows, sheet.code).toHaveLength(things.reduce((sum, list) => sum + list.length, 0));
    expect(threeWayRows({ base: now, now, mine: sheet }), sheet.code).toHaveLength(rows.length);
  }
});
