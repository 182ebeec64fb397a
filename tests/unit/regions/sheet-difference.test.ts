import { expect, test } from 'vitest';
import { changedUnedited } from '@/lib/regions/domain/compared-editions';
import type { Rule } from '@/lib/regions/domain/rule';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { sheetDifference, type ItemDifference } from '@/lib/regions/domain/sheet-difference';
import { ok } from '@/lib/kernel/result';
import { sheetDocument } from '@/lib/regions/schema';

type Json = null | boolean | number | string | Json[] | { [key: string]: Json };
type Path = readonly (string | number)[];

/** A sheet of an invented place with something in every field. */
const aSheet = (): Sheet =>
  sheetDocument.parse({
    code: 'qq',
    name: 'Quarryland',
    kind: 'country',
    languages: ['en', 'da'],
    memberships: [
      { parent: 'eu', from: '2000-01-01', to: null, except: [{ rule: 'eu-hs', why: 'It has a tariff of its own.' }] },
      { parent: 'anz', from: null, to: '2030-01-01' },
    ],
    text: 'The first paragraph.\n\nThe second one.',
    textFacts: ['fact-a', 'fact-b'],
    authorities: [
      { name: 'Office A', url: 'https://a.example.test/', role: 'Supervises', evidence: 'read' },
      { name: 'Office B', url: null, role: 'Advises', evidence: 'memory' },
    ],
    accreditation: [{ name: 'Body', url: null, role: 'Accredits', evidence: 'read' }],
    gaps: ['No fee was found.', 'No form was found.'],
    sources: [
      {
        id: 'law',
        title: 'Act 7',
        publisher: 'Parliament',
        identifier: '7/2020',
        url: 'https://law.example.test/',
        versionDate: '2020',
        seenOn: '2026-11-01',
      },
      { id: 'other', title: 'Guide', publisher: 'Office A', seenVia: 'a copy' },
    ],
    terms: [
      {
        id: 'qq-pot',
        region: 'qq',
        name: 'Pot',
        says: 'A deep one.',
        category: true,
        when: { question: 'depth-mm', gt: { value: 25, unit: 'mm' } },
        from: '2020-01-01',
        sources: [{ source: 'law', locator: '1', standing: 'law', evidence: 'read' }],
        facts: ['fact-c'],
      },
      { id: 'qq-lid', region: 'qq', name: 'Lid', says: 'With a lid.', when: { question: 'lidded', is: true } },
    ],
    rules: [
      {
        id: 'qq-lead',
        region: 'qq',
        kind: 'replaces',
        targets: ['eu-pb-cat1', 'eu-pb-cat2'],
        alongside: ['qq-note'],
        when: { all: [{ term: 'qq-pot' }, { question: 'use', in: ['food', 'decorative'] }] },
        from: '2020-01-01',
        to: '2031-01-01',
        order: 1,
        firm: true,
        strength: 'must',
        standing: 'law',
        title: 'Lead limit',
        says: 'Keep the lead low.',
        note: 'A note.',
        payload: {
          topic: 'limit',
          substance: 'Pb',
          part: 'inside',
          per: 'L',
          amount: { value: 4, unit: 'mg/L', evidence: 'read' },
          decision: { kind: 'each', specimens: 4, evidence: 'read', atLimit: 'within' },
        },
        sources: [{ source: 'law', locator: '2', passage: 'Højst 4 mg/L.', passageLang: 'da', standing: 'law', evidence: 'read' }],
        facts: ['fact-d'],
        lookAgainBy: '2027-11-01',
      },
      {
        id: 'qq-note',
        region: 'qq',
        kind: 'adds',
        when: true,
        order: 2,
        strength: 'note',
        standing: 'guidance',
        title: 'Papers',
        says: 'Ask for papers.',
        payload: {
          topic: 'paper',
          document: 'Declaration',
          fields: ['name', 'address'],
          heldBy: 'the maker',
          stage: 'at sale',
          yearsKept: 5,
        },
        sources: [{ source: 'other', standing: 'guidance', evidence: 'memory' }],
        facts: ['fact-e'],
        lookAgainBy: '2027-11-01',
      },
    ],
    trials: [
      {
        id: 'mug',
        title: 'Mug',
        on: '2026-12-01',
        answers: { form: 'mug', 'depth-mm': 95, contact: ['wet'] },
        declined: ['lidded'],
        expected: { 'qq-lead': 'applies' },
      },
    ],
    leftOut: [{ fact: 'fact-f', why: 'It is about glass.' }],
  });

function leavesOf(value: Json, path: Path = []): readonly Path[] {
  if (value === null || typeof value !== 'object') return [path];
  return Object.entries(value).flatMap(([key, inner]) => leavesOf(inner, [...path, Array.isArray(value) ? Number(key) : key]));
}

function withLeaf(value: Json, [key, ...rest]: Path, change: (leaf: Json) => Json): Json {
  if (key === undefined) return change(value);
  const copy = structuredClone(value) as Record<string | number, Json>;
  copy[key] = withLeaf(copy[key] ?? null, rest, change);
  return copy;
}

function other(leaf: Json): Json {
  if (typeof leaf === 'number') return leaf + 1;
  if (typeof leaf === 'boolean') return !leaf;
  if (leaf === null) return '2029-05-05';
  const text = JSON.stringify(leaf).slice(1, -1);
  if (/^\d{4}-\d\d-\d\d$/.test(text)) return '2028-02-03';
  return OTHER[text] ?? `${text}x`;
}

/** Where only some words are allowed, another of them. */
const OTHER: Readonly<Record<string, string>> = {
  country: 'part',
  read: 'memory',
  memory: 'read',
  law: 'standard',
  guidance: 'lab',
  must: 'may',
  note: 'should',
  adds: 'excepts',
  replaces: 'excepts',
  Pb: 'Cd',
  inside: 'rim',
  L: 'dm2',
  each: 'mean-of',
  within: 'over',
  paper: 'other',
  limit: 'limit',
  applies: 'not-settled',
  da: 'de',
  en: 'fr',
};

/** Places of the document that no reader meets: whose sheet it is, and numbers that only sort. */
const isSilent = (path: Path): boolean =>
  path.at(-1) === 'region' || path.at(-1) === 'order' || path.join('.') === 'code' || path.at(-1) === 'topic';

test('REG-30 every single change of a sheet is told, whatever the field, and nothing where nothing changed', () => {
  const sheet = aSheet();
  const document = JSON.parse(JSON.stringify(sheet)) as Json;
  const silent = leavesOf(document)
    .filter((path) => !isSilent(path))
    .filter((path) => sheetDifference(sheet, withLeaf(document, path, other) as unknown as Sheet).length === 0);
  expect(silent).toEqual([]);
  expect(sheetDifference(sheet, JSON.parse(JSON.stringify(sheet)) as Sheet)).toEqual([]);
});

const withRule = (sheet: Sheet, id: string, change: Partial<Rule>): Sheet => ({
  ...sheet,
  rules: sheet.rules.map((rule) => (rule.id === id ? { ...rule, ...change } : rule)),
});

test('REG-30 a changed rule is told with its changed fields alone, each with both values', () => {
  const before = aSheet();
  const [item, ...rest] = sheetDifference(
    before,
    withRule(before, 'qq-lead', { strength: 'should', to: null, says: 'Keep the lead very low.' }),
  );
  expect(rest).toEqual([]);
  expect(item).toMatchObject({ list: 'rules', id: 'qq-lead', title: 'Lead limit', change: 'changed', moved: false });
  expect(item?.fields.map(({ field, kind }) => [field, kind])).toEqual([
    ['says', 'wording'],
    ['dates', 'values'],
    ['strength', 'values'],
  ]);
  expect(item?.fields[2]).toMatchObject({ before: { text: 'Must' }, after: { text: 'Should' } });
});

test('REG-30 what is new or gone is told with everything it says', () => {
  const before = aSheet();
  const after = {
    ...before,
    rules: before.rules.slice(0, 1),
    authorities: [...before.authorities, { name: 'Office C', url: null, role: 'Tests', evidence: 'read' as const }],
  };
  const told = sheetDifference(before, after);
  expect(told.map(({ list, id, change }) => [list, id, change])).toEqual([
    ['rules', 'qq-note', 'withdrawn'],
    ['authorities', 'Office C', 'added'],
  ]);
  expect(told[0]?.fields.every((field) => field.kind === 'values' && field.before !== null && field.after === null)).toBe(true);
});

const ruleNamed = (id: string, order: number): Rule => ({ ...aRuleOf(), id, order });
const aRuleOf = (): Rule => {
  const [, rule] = aSheet().rules;
  if (rule === undefined) throw new Error('no rule');
  return rule;
};

test('REG-31 of five rules of which one goes to the end, that one is told as moved', () => {
  const sheet = (ids: readonly string[]): Sheet => ({ ...aSheet(), rules: ids.map((id, place) => ruleNamed(id, place * 10)) });
  const told = sheetDifference(sheet(['a', 'b', 'c', 'd', 'e']), sheet(['a', 'c', 'd', 'e', 'b']));
  expect(told.map(({ id, change, fields }) => [id, change, fields.length])).toEqual([['b', 'moved', 0]]);
  // Other numbers with the same order are no move, nor is another place in the document.
  const renumbered = { ...sheet(['a', 'b']), rules: [ruleNamed('b', 7), ruleNamed('a', 3)] };
  expect(sheetDifference(sheet(['a', 'b']), renumbered)).toEqual([]);
});

test('REG-31 parts of a condition and items of a list in another order are told as the same in another order', () => {
  const before = aSheet();
  const after = withRule(before, 'qq-lead', {
    when: { all: [{ question: 'use', in: ['decorative', 'food'] }, { term: 'qq-pot' }] },
    targets: ['eu-pb-cat2', 'eu-pb-cat1'],
  });
  const [item] = sheetDifference(before, after);
  expect(item?.fields.map((field) => [field.field, field.kind === 'values' && field.moved])).toEqual([
    ['when', true],
    ['targets', true],
  ]);
});

test('REG-35 only what decides when a rule applies takes it out of the rules that nobody edited', () => {
  const meaning = { rule: 'qq-lead', kind: 'changed', example: null, share: { cases: '1', of: '2', percent: '50' } } as const;
  const meanings = ok([meaning]);
  const before = aSheet();
  const unedited = (items: readonly ItemDifference[]): number => changedUnedited(meanings, items).length;
  expect(unedited(sheetDifference(before, withRule(before, 'qq-lead', { says: 'Otherwise.' })))).toBe(1);
  expect(unedited(sheetDifference(before, withRule(before, 'qq-lead', { when: true })))).toBe(0);
});
