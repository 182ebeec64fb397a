import { describe, expect, test } from 'vitest';
import { z } from 'zod';
import type { LimitPayload, Rule } from '@/lib/regions/domain/rule';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { factsByRegion, type Fact } from '../../builders/fact-packs';
import { aDate, seedLine, seedSheets } from '../../builders/seed-sheets';

const sheets = [...seedSheets.values()];
const factsOf = (sheet: Sheet) => factsByRegion.get(sheet.code) ?? [];
const all = new Map([...factsByRegion.values()].flat().map((fact) => [fact.id, fact]));
type LimitRule = Pick<Rule, 'from'> & { readonly payload: LimitPayload };
const carriedBy = (rule: Rule) => rule.facts.flatMap((id) => all.get(id) ?? []);

/** A fact's unit without the words that say what is weighed, which a rule says by its part. */
const unitOf = (unit: unknown): string =>
  String(unit)
    .replace(/ (total content|total weight|released)$/, '')
    .replace(/^% by weight of .*$/, 'percent');

const figures = z.record(z.string(), z.number());

/**
 * The figures a fact gives for a limit's substance, "0.5 mg/L": alone, by substance, or in a list, whose dated steps go by the
 * rule's first day.
 */
function figuresOf(values: Fact['values'], { payload, from }: LimitRule): readonly string[] {
  const list = z.array(z.record(z.string(), z.unknown())).safeParse(values['limits']);
  const steps = list.success ? list.data.filter((one) => !('from' in one) || one['from'] === from) : [];
  const told = [values, ...steps].flatMap((found: Fact['values']) => {
    const one = 'substance' in found || 'symbol' in found ? found : { ...values, ...found };
    return 'limit' in one && [one['symbol'], one['substance']].includes(payload.substance)
      ? [`${String(one['limit'])} ${unitOf(one['unit'])}`]
      : [];
  });
  const bySubstance = [
    { by: values['substances'], unit: values['unit'] },
    { by: values['values_ug_per_dm2'], unit: 'ug/dm2' },
  ].flatMap(({ by, unit }) => {
    const figure = figures.safeParse(by).data?.[payload.substance];
    return figure === undefined ? [] : [`${String(figure)} ${unitOf(unit)}`];
  });
  return [...told, ...bySubstance];
}

/** The figure of a fact that has one for each kind of ware: the one the rule names, else all of them. */
function figuresByWare(values: Fact['values'], { payload }: LimitRule): readonly string[] {
  const byWare = values['substance'] === payload.substance ? figures.safeParse(values['limits']).data : undefined;
  const all = Object.values(byWare ?? {});
  const named = all.filter((figure) => figure === payload.amount.value);
  return (named.length > 0 ? named : all).map((figure) => `${String(figure)} ${unitOf(values['unit'])}`);
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
    const rules = sheet.rules.flatMap(({ id, payload, facts, from }) => (payload.topic === 'limit' ? [{ id, payload, facts, from }] : []));
    for (const { id, payload, facts, from } of rules) {
      const values = facts.map((fact) => all.get(fact)?.values ?? {});
      const told = values.flatMap((one) => figuresOf(one, { payload, from }));
      const found = told.length > 0 ? told : values.flatMap((one) => figuresByWare(one, { payload, from }));
      const expected = found.length > 0 ? found : [targetOf(sheet, id)];
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

test('REG-10 every place and standard of the fact packs has a sheet', () => {
  expect([...factsByRegion.keys()].filter((code) => !seedSheets.has(code))).toEqual([]);
});

test('REG-25 a place with limits of its own keeps eight trial pieces at least, any other place three', () => {
  const few = sheets.filter(({ code, rules, trials }) => {
    const least = rules.some(({ payload }) => payload.topic === 'limit') ? 8 : 3;
    return code !== 'care' && trials.length < least;
  });
  expect(few.map(({ code, trials }) => `${code}: ${String(trials.length)}`)).toEqual([]);
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
