import { describe, expect, test } from 'vitest';
import { answersInput } from '@/lib/checks/schema';
import type { LoadedLine } from '@/lib/checks/domain/checklist';
import { isRunOtherwise, methodFor } from '@/lib/readings/domain/conditions';
import type { Reading } from '@/lib/readings/domain/reading';
import { regionVerdicts } from '@/lib/readings/domain/region-verdicts';
import type { Verdict } from '@/lib/readings/domain/verdict';
import { verdictInput } from '@/lib/readings/schema';
import type { LimitPayload, MethodPayload, Rule } from '@/lib/regions/domain/rule';
import { aReading, answersOf, aReport } from '../../builders/report';
import { aDate, seedLine } from '../../builders/seed-sheets';

const DAY = aDate('2026-12-01');
const bowl = {
  use: 'food',
  form: 'bowl',
  'holds-liquid': true,
  'depth-mm': 60,
  'capacity-ml': 600,
  'packaging-or-storage': false,
  'for-children': false,
  employees: 1,
};
const EU = seedLine('eu', DAY);

/** The line with some limits changed. */
const withLimits = (line: LoadedLine, change: (payload: LimitPayload, id: string) => LimitPayload): LoadedLine => ({
  ...line,
  layers: line.layers.map((layer) => ({
    ...layer,
    sheet: {
      ...layer.sheet,
      rules: layer.sheet.rules.map((rule) => (rule.payload.topic === 'limit' ? { ...rule, payload: change(rule.payload, rule.id) } : rule)),
    },
  })),
});

const fromMemory = (...ids: readonly string[]): LoadedLine =>
  withLimits(EU, (payload, id) => (ids.includes(id) ? { ...payload, amount: { ...payload.amount, evidence: 'memory' } } : payload));

const lead = (line: LoadedLine, answers: object, ...readings: readonly Reading[]): Verdict | undefined =>
  regionVerdicts(line, answersOf(answers), aReport({ readings }), DAY).verdicts.find(({ substance }) => substance === 'Pb');

describe('READ-7 a limit from memory', () => {
  const open = fromMemory('eu-pb-cat2');
  test.each([
    [1, 'within'],
    [5, 'test-more'],
    [7, 'over'],
  ])('%s mg/L: cannot be told, and what would follow', (value, ifConfirmed) => {
    const verdict = lead(open, { ...bowl, 'cooked-in': false }, aReading({ value }));
    expect(verdict).toMatchObject({ status: 'cannot-tell', reason: 'unconfirmed', ifConfirmed, evidence: 'memory', rule: 'eu-pb-cat2' });
    expect(verdict?.compared).toEqual({ value: String(value), unit: 'mg/L' });
  });
  test('one from memory among limits that agree', () => {
    expect(lead(open, bowl, aReading({ value: 1 }))).toMatchObject({ reason: 'unconfirmed', ifConfirmed: 'within', rule: 'eu-pb-cat3' });
  });
  test('one from memory among limits that differ: nothing would follow', () => {
    const verdict = lead(open, bowl, aReading({ value: 2 }));
    expect(verdict).toMatchObject({ status: 'cannot-tell', reason: 'category-open' });
    expect(verdict).not.toHaveProperty('ifConfirmed');
  });
  test('what could not be told anyway keeps its own reason', () => {
    expect(lead(open, { ...bowl, 'cooked-in': false })).toMatchObject({ reason: 'not-measured' });
    expect(lead(open, { ...bowl, 'cooked-in': false }, aReading({ value: 5, below: true }))).toMatchObject({ reason: 'too-coarse' });
    expect(lead(open, { ...bowl, 'changed-since-test': true }, aReading({ value: 1 }))).toMatchObject({ reason: 'not-covered' });
    expect(lead(open, bowl, aReading({ value: 1 }))).toHaveProperty('ifConfirmed');
    expect(lead(EU, bowl, aReading({ value: 1 }))).not.toHaveProperty('ifConfirmed');
  });
  test('a sampling rule from memory is judged, and the doubt is told', () => {
    const line = withLimits(EU, (payload) => ({ ...payload, decision: { ...payload.decision, evidence: 'memory' } }));
    expect(lead(line, bowl, aReading({ value: 1 }))).toMatchObject({ status: 'within', decisionEvidence: 'memory', evidence: 'read' });
  });
});

describe('READ-8 limits that differ', () => {
  test('the strictest is told, the others are named, and so is what is still to be answered', () => {
    const verdict = lead(EU, bowl, aReading({ value: 2 }));
    expect(verdict).toMatchObject({ reason: 'category-open', rule: 'eu-pb-cat3', alsoPossible: ['eu-pb-cat2'], assuming: ['cooked-in'] });
    expect(verdict?.limit).toEqual({ value: 1.5, unit: 'mg/L' });
  });
  test('of two limits alike the one that every piece has to meet is the stricter', () => {
    const { 'depth-mm': _, ...answers } = bowl;
    const { verdicts } = regionVerdicts(seedLine('us', DAY), answersOf({ ...answers, 'drinking-rim': false }), aReport({}), DAY);
    const cadmium = verdicts.find(({ substance }) => substance === 'Cd');
    expect(cadmium).toMatchObject({ rule: 'us-cd-small-hollowware', alsoPossible: ['us-cd-flatware'] });
  });
  test('a limit on the glaze is not held against the whole piece, and one on metal is never read', () => {
    const glaze = withLimits(EU, (payload) => ({
      ...payload,
      part: 'glaze',
      per: 'kg',
      amount: { value: 100, unit: 'mg/kg', evidence: 'read' },
    }));
    const read = aReading({ value: 1, unit: 'mg/kg', part: 'content' });
    expect(lead(glaze, { ...bowl, 'cooked-in': true }, read)).toMatchObject({
      part: 'content',
      status: 'cannot-tell',
      reason: 'needs-conversion',
    });
    const metal = withLimits(EU, (payload) => ({ ...payload, part: 'metal-part' }));
    expect(lead(metal, { ...bowl, 'cooked-in': true }, aReading({ value: 1 }))).toMatchObject({
      part: 'metal-part',
      reason: 'not-measured',
    });
  });
  test('where the figure itself counts as over, a first piece on it calls for three more', () => {
    const strict = withLimits(EU, (payload) => ({ ...payload, decision: { ...payload.decision, atLimit: 'over' } }));
    const casserole = { ...bowl, 'cooked-in': true };
    expect(lead(strict, casserole, aReading({ value: '1.5' }))).toMatchObject({ status: 'test-more' });
    expect(lead(strict, casserole, aReading({ value: '1.5', below: true }))).toMatchObject({ status: 'within' });
  });
});

describe('READ-9 READ-10 possible limits', () => {
  const california = (answers: object) =>
    regionVerdicts(seedLine('us-ca', DAY), answersOf({ ...bowl, 'drinking-rim': false, ...answers }), aReport({}), DAY).verdicts;
  test('law and advice of one line stand apart while both are possible', () => {
    const keys = california({}).map(({ region, strength, substance, part, per }) => [region, strength, substance, part, per].join(' '));
    expect(new Set(keys).size).toBe(keys.length);
    expect(keys).toContain('us-ca must Pb vessel L');
    expect(keys).toContain('us should Pb vessel L');
  });
  test('what a replacement silences is not possible', () => {
    const glazed = california({ inside: 'glazed' }).flatMap(({ rule, alsoPossible }) => [rule, ...alsoPossible]);
    expect(glazed).toContain('us-ca-pb-small-hollowware');
    expect(glazed).not.toContain('us-pb-small-hollowware');
    const unglazed = california({ inside: 'unglazed', 'outside-glazed': false }).flatMap(({ rule }) => rule ?? []);
    expect(unglazed).toContain('us-pb-small-hollowware');
    expect(unglazed).not.toContain('us-ca-pb-small-hollowware');
  });
});

test('READ-18 a lid added to its vessel has no entry of its own; any other lid has', () => {
  const lids = (region: string, answers: object, lidOf = 'A') => {
    const readings = [aReading({ value: 1 }), aReading({ value: 1, part: 'lid', specimen: lidOf })];
    const { verdicts } = regionVerdicts(seedLine(region, DAY), answersOf(answers), aReport({ readings }), DAY);
    return verdicts.filter(({ part }) => part === 'lid').map(({ substance, reason }) => `${substance} ${String(reason)}`);
  };
  expect(lids('eu', bowl)).toEqual([]);
  expect(lids('dk', bowl)).toEqual([]);
  expect(lids('eu', bowl, 'B')).toEqual(['Pb no-limit']);
  expect(lids('eu', { use: 'decorative', 'could-hold-food': false })).toEqual(['Pb no-limit']);
  expect(lids('us', bowl)).toEqual(['Pb no-limit']);
});

test('READ-13 the entries stand by strength, sheet, substance and part, whatever the order of the request', () => {
  const readings = ['Zn', 'Pb', 'Cd'].flatMap((substance) =>
    (['vessel', 'rim', 'content'] as const).map((part) =>
      aReading({ substance, part, value: 1, unit: part === 'content' ? 'mg/kg' : 'mg/L' }),
    ),
  );
  const judge = (list: readonly Reading[]) =>
    regionVerdicts(seedLine('us-ca', DAY), answersOf({ ...bowl, 'for-children': true, employees: 20 }), aReport({ readings: list }), DAY);
  const { verdicts } = judge(readings);
  expect(judge(readings.toReversed())).toEqual(judge(readings));
  const order = { must: 0, should: 1, may: 2, note: 3 };
  const keys = verdicts.map(({ strength, region, substance, part }) =>
    [strength === null ? 9 : order[strength], region === 'us-ca' ? 0 : 1, substance, part].join(' '),
  );
  expect(keys).toEqual(keys.toSorted());
  expect(verdicts.filter(({ reason }) => reason === 'no-limit').map(({ substance, part }) => `${substance} ${part}`)).toEqual([
    'Cd content',
    'Cd rim',
    'Pb rim',
    'Zn content',
    'Zn rim',
    'Zn vessel',
  ]);
});

test('READ-16 every verdict says why in one sentence, without a word that calls a piece harmless', () => {
  const readings = [
    aReading({ value: 0.31 }),
    aReading({ substance: 'Cd', value: 0.01, below: true }),
    aReading({ substance: 'Co', value: 3 }),
  ];
  for (const region of ['eu', 'dk', 'us', 'us-ca', 'ca', 'jp'])
    for (const answers of [{}, bowl, { ...bowl, 'changed-since-test': true }, { ...bowl, form: 'mug', lidded: true }])
      for (const { why, limit, status } of regionVerdicts(seedLine(region, DAY), answersOf(answers), aReport({ readings }), DAY).verdicts) {
        expect(why).toMatch(/^\S.*\.$/);
        expect(why).not.toMatch(/safe|compliant|certified|approved|guarantee|legal|pass|fail|\{|undefined/i);
        if (limit !== null && status !== 'cannot-tell') expect(why).toContain(String(limit.value));
      }
});

describe('READ-12 order of the reasons', () => {
  const told = (body: object): unknown => {
    const report = verdictInput(answersInput.default({})).parse({ regions: ['eu'], ...body });
    return regionVerdicts(EU, report.answers, report, DAY).verdicts.map(({ substance, reason }) => `${substance} ${String(reason)}`);
  };
  const answers = { ...bowl, 'cooked-in': false };
  const read = { specimen: 'A', substance: 'Pb', value: 5, unit: 'mg/article' };
  const odd = { conditions: { temperatureC: 60 } };
  test('each comes before the next', () => {
    expect(told({ answers: { ...answers, 'changed-since-test': true }, ...odd })).toEqual(['Cd not-covered', 'Pb not-covered']);
    expect(told({ answers, ...odd })).toEqual(['Cd not-measured', 'Pb not-measured']);
    expect(told({ answers, readings: [read], ...odd })).toEqual(['Cd not-measured', 'Pb conditions-differ']);
    expect(told({ answers, readings: [read] })).toEqual(['Cd not-measured', 'Pb needs-conversion']);
    expect(told({ answers, readings: [read], extracts: [{ part: 'vessel', volumeMl: 5000 }] })).toEqual(['Cd not-measured', 'Pb null']);
  });
  test('a reason stands exactly where it cannot be told', () => {
    const readings = [aReading({ value: 5 }), aReading({ substance: 'Cd', value: 2, below: true })];
    for (const region of ['eu', 'us-ca', 'ca', 'jp'])
      for (const { status, reason } of regionVerdicts(seedLine(region, DAY), answersOf(bowl), aReport({ readings }), DAY).verdicts)
        expect(reason === null).toBe(status !== 'cannot-tell');
  });
});

describe('READ-17 methods', () => {
  const rule = (when: Rule['when'], payload: MethodPayload, region = 'cn'): Rule => ({
    id: 'a-method',
    region,
    kind: 'adds',
    targets: [],
    alongside: [],
    when,
    from: null,
    to: null,
    order: 1,
    firm: false,
    strength: 'must',
    standing: 'law',
    title: 'A method',
    says: 'Test it so.',
    payload,
    sources: [],
    facts: [],
    lookAgainBy: DAY,
  });
  const cold = rule({ term: 'food-ware' }, { topic: 'method', hot: false, hours: { value: 24, plusMinus: 1 } });
  const hot = rule(
    { all: [{ term: 'food-ware' }, { term: 'cn-cooking' }] },
    { topic: 'method', hot: true, hours: { value: 2, plusMinus: 0 } },
  );
  const cooking = methodFor({ region: 'cn', when: { all: [{ term: 'cn-cooking' }] } }, [cold, hot], ['cn']);
  const table = methodFor({ region: 'cn', when: { not: { term: 'cn-cooking' } } }, [cold, hot], ['cn']);

  test('ware that is tested hot is asked only that', () => {
    expect(isRunOtherwise(cooking, { hot: true, hours: 2, temperatureC: 98, dark: false }, true)).toBe(false);
    expect(isRunOtherwise(cooking, {}, true)).toBe(false);
    expect(isRunOtherwise(cooking, { hot: false }, true)).toBe(true);
  });
  test('other ware is not bound by the hot test', () => {
    expect(isRunOtherwise(table, { hot: false, hours: 25 }, false)).toBe(false);
    expect(isRunOtherwise(table, { hot: true }, false)).toBe(true);
    expect(isRunOtherwise(table, { hours: 2 }, false)).toBe(true);
  });
  test('a sheet without a method goes by the nearest layer above that has one; what nobody says is the usual', () => {
    const here = methodFor({ region: 'part', when: true }, [rule(true, { topic: 'method', light: 'dark' }, 'whole')], ['whole', 'part']);
    expect(here).toMatchObject({ light: 'dark', hours: [{ value: 24, plusMinus: 0.5 }], temperaturesC: [{ value: 22, plusMinus: 2 }] });
    expect(isRunOtherwise(methodFor({ region: 'part', when: true }, [], ['part']), { dark: false }, true)).toBe(true);
  });
});
