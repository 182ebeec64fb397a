import { describe, expect, test } from 'vitest';
import { z } from 'zod';
import type { Rule } from '@/lib/regions/domain/rule';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { factsByRegion, type Fact } from '../../builders/fact-packs';
import { aDate, seedLine, seedSheets } from '../../builders/seed-sheets';

const sheets = [...seedSheets.values()];
const factsOf = (sheet: Sheet) => factsByRegion.get(sheet.code) ?? [];
const all = new Map([...factsByRegion.values()].flat().map((fact) => [fact.id, fact]));
const carriedBy = (rule: Rule) => rule.facts.flatMap((id) => all.get(id) ?? []);

/** The figures a fact gives for a substance, "0.5 mg/L": alone or in a list. */
function figuresOf(values: Fact['values'], substance: string): readonly string[] {
  const list = z.array(z.record(z.string(), z.unknown())).safeParse(values['limits']);
  return [values, ...(list.success ? list.data : [])].flatMap((one) =>
    'limit' in one && [one['symbol'], one['substance']].includes(substance)
      ? [`${String(one['limit'])} ${String(one['unit']).replace(' total content', '')}`]
      : [],
  );
}

/** A rule that makes another's limit its own law carries that figure. */
function targetOf(sheet: Sheet, id: string): string {
  const [target] = sheet.rules.find((rule) => rule.id === id)?.targets ?? [];
  const payload = sheets.flatMap(({ rules }) => rules).find((rule) => rule.id === target)?.payload;
  return payload?.topic === 'limit' ? `${String(payload.amount.value)} ${payload.amount.unit}` : `no figure behind ${id}`;
}

describe.each(sheets.map((sheet) => [sheet.code, sheet] as const))('%s', (code, sheet) => {
  test('REG-10 every researched fact is carried or left out with a reason, never both', () => {
    const carried = new Set([...sheet.rules, ...sheet.terms].flatMap(({ facts }) => facts).concat(sheet.textFacts));
    const leftOut = sheet.leftOut.map(({ fact }) => fact);
    expect([...carried, ...leftOut].sort()).toEqual(
      factsOf(sheet)
        .map(({ id }) => id)
        .sort(),
    );
    expect(leftOut.filter((id) => carried.has(id))).toEqual([]);
  });

  test('REG-11 no fact that may never bind, and nothing from memory, becomes a must', () => {
    const wrong = sheet.rules.filter(
      (rule) =>
        rule.strength === 'must' && carriedBy(rule).some(({ evidence, never_must }) => evidence !== 'read' || never_must.length > 0),
    );
    expect(wrong.map(({ id }) => id)).toEqual([]);
  });

  test('REG-12 a rule whose facts are all from memory is never shown as read', () => {
    const wrong = sheet.rules.filter((rule) => {
      const facts = carriedBy(rule);
      return facts.length > 0 && facts.every(({ evidence }) => evidence === 'memory') && rule.sources[0]?.evidence === 'read';
    });
    expect(wrong.map(({ id }) => id)).toEqual([]);
  });

  test('REG-13 a limit has the figure and unit that its fact gives for the substance', () => {
    const rules = sheet.rules.flatMap(({ id, payload, facts }) => (payload.topic === 'limit' ? [{ id, payload, facts }] : []));
    for (const { id, payload, facts } of rules) {
      const figures = facts.flatMap((fact) => figuresOf(all.get(fact)?.values ?? {}, payload.substance));
      const expected = figures.length > 0 ? figures : [targetOf(sheet, id)];
      expect([id, ...new Set(expected)]).toEqual([id, `${String(payload.amount.value)} ${payload.amount.unit}`]);
    }
  });

  test('REG-14 what is said in the trade has no source, binds nobody and is never left out for want of an answer', () => {
    const said = factsOf(sheet).filter(({ evidence }) => evidence === 'common-practice');
    for (const { id } of said) {
      const rule = sheet.rules.find(({ facts }) => facts.includes(id));
      expect(rule).toMatchObject({ standing: 'common-practice', strength: 'note', when: true });
    }
    for (const rule of sheet.rules.filter(({ standing }) => standing === 'common-practice')) {
      const titles = rule.sources
        .filter((cited) => cited.standing === 'common-practice')
        .map(({ source }) => sheet.sources.find(({ id }) => id === source)?.title);
      expect(titles[0]).toBe('Common practice, no source');
    }
  });

  test('REG-15 the line of the place compiles: known questions and terms, exceptions that point downwards, no circle', () => {
    if (code === 'care') return;
    expect(seedLine(code, aDate('2026-12-01')).compiled.rules.length).toBeGreaterThan(20);
  });

  test('REG-16 a rule is looked at again within 18 months of being seen, a limit within 12', () => {
    const latest = (rule: Rule): string => (rule.payload.topic === 'limit' ? '2027-12-01' : '2028-06-01');
    expect(sheet.rules.filter((rule) => rule.lookAgainBy > latest(rule)).map(({ id }) => id)).toEqual([]);
  });
});

test('REG-17 rule and term ids are of one sheet each', () => {
  const ids = sheets.flatMap(({ rules, terms }) => [...rules, ...terms].map(({ id }) => id));
  expect(ids.filter((id, place) => ids.indexOf(id) !== place)).toEqual([]);
});

test('REG-18 the not-for-food marking has its letter height: 3.2 mm in the USA, 3 mm in two languages in Canada', () => {
  const payload = (id: string) => sheets.flatMap(({ rules }) => rules).find((rule) => rule.id === id)?.payload;
  // 21 CFR 109.16(b)(1): letters of not less than 3.2 mm. SOR/2016-175 s. 6: capitals of at least 3 mm, English and French.
  expect(payload('us-decor-sticker')).toMatchObject({ topic: 'label', leastLetterMm: 3.2 });
  expect(payload('ca-nonfood-warning')).toMatchObject({
    topic: 'label',
    leastLetterMm: 3,
    words: { en: expect.any(String) as string, fr: expect.any(String) as string },
  });
});
