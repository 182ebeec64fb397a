import { beforeAll, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { findEdition } from '@/db/editions';
import { listRegions } from '@/db/regions';
import type { Finding } from '@/lib/checks/domain/finding';
import { sayFinding } from '@/lib/checks/domain/finding-words';
import { checkProposal } from '@/lib/regions/check-proposal';
import type { Condition } from '@/lib/regions/domain/condition';
import type { Rule } from '@/lib/regions/domain/rule';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { aDate } from '../builders/seed-sheets';
import { foundSheets } from './founding';

const TODAY = aDate('2026-12-01');
const ctx = { db, now: new Date('2026-12-01T10:00:00Z') };

beforeAll(foundSheets);

async function sheetOf(code: string): Promise<Sheet> {
  const edition = await findEdition(db, code, 1);
  if (edition === null) throw new Error(`No sheet of ${code}`);
  return edition.sheet;
}

async function findingsOf(code: string, document: unknown, base: number | null = 1): Promise<readonly Finding[]> {
  const checked = await checkProposal(ctx, { code, document, base, on: TODAY });
  if (!checked.ok) throw new Error(checked.error.kind);
  return checked.value.findings;
}

/** The Danish sheet with its first rule otherwise. */
async function danish(change: (rule: Rule, sheet: Sheet) => Partial<Sheet>): Promise<Sheet> {
  const sheet = await sheetOf('dk');
  const [first] = sheet.rules;
  if (first === undefined) throw new Error('No rules');
  return { ...sheet, ...change(first, sheet) };
}

const withRules = (sheet: Sheet, ...rules: readonly Rule[]): Partial<Sheet> => ({ rules: [...sheet.rules, ...rules] });
const quoted = (rule: Rule): Rule => ({
  ...rule,
  kind: 'adds',
  targets: [],
  strength: 'note',
  sources: rule.sources.map((cited) => ({ ...cited, passage: 'Varerne skal mærkes.', passageLang: 'da' })),
  order: 900,
});
const replacing = (rule: Rule, id: string, rest: Partial<Rule> = {}): Rule => ({
  ...quoted(rule),
  id,
  kind: 'replaces',
  targets: ['eu-pb-cat1'],
  ...rest,
});
const food: Condition = { question: 'use', is: 'food' };
const depths: Condition = { any: Array.from({ length: 15 }, (_, at) => ({ question: 'depth-mm', lt: { value: 200 + at, unit: 'mm' } })) };

test('CHECK-70 the sheets that are shipped pass their own checks without an error', async () => {
  const regions = await listRegions(db);
  const codes = regions.filter(({ edition }) => edition !== null).map(({ code }) => code);
  expect(codes).toEqual(expect.arrayContaining(['care', 'eu', 'dk', 'us', 'us-ca', 'ca', 'jp']));
  const errors: string[] = [];
  for (const code of codes) {
    const findings = await findingsOf(code, await sheetOf(code));
    errors.push(
      ...findings.filter(({ level }) => level === 'error').map((finding) => `${code} ${finding.check} ${sayFinding(finding).where}`),
    );
  }
  expect(errors).toEqual([]);
});

type Plant = readonly [check: string, kind: string, field: string, change: (rule: Rule, sheet: Sheet) => Partial<Sheet>];

const plants: readonly Plant[] = [
  [
    'CHECK-70',
    'unknown-term',
    'rules/planted/when',
    (rule, sheet) => withRules(sheet, { ...quoted(rule), id: 'planted', when: { term: 'dk-gone' } }),
  ],
  [
    'CHECK-71',
    'target-unknown',
    'rules/planted/targets',
    (rule, sheet) => withRules(sheet, replacing(rule, 'planted', { targets: ['eu-gone'] })),
  ],
  [
    'CHECK-72',
    'clash',
    'rules/planted-two/alongside',
    (rule, sheet) =>
      withRules(sheet, replacing(rule, 'planted-one', { when: food }), replacing(rule, 'planted-two', { when: food, order: 901 })),
  ],
  [
    'CHECK-73',
    'never-applies',
    'rules/planted/when',
    (rule, sheet) => withRules(sheet, { ...quoted(rule), id: 'planted', when: { all: [food, { not: food }] } }),
  ],
  [
    'CHECK-74',
    'question-idle',
    'rules/planted/when',
    (rule, sheet) =>
      withRules(sheet, {
        ...quoted(rule),
        id: 'planted',
        when: {
          any: [
            food,
            {
              all: [
                { question: 'inside', is: 'unglazed' },
                { question: 'crazed', is: true },
              ],
            },
          ],
        },
      }),
  ],
  [
    'CHECK-75',
    'gap-between',
    'rules/planted-two/from',
    (rule, sheet) => {
      const { note: _, ...bare } = rule;
      return withRules(
        sheet,
        replacing(bare, 'planted-one', { when: food, to: aDate('2027-01-01') }),
        replacing(bare, 'planted-two', { when: food, from: aDate('2027-02-01'), order: 901 }),
      );
    },
  ],
  [
    'CHECK-76',
    'no-passage',
    'rules/planted/sources/0/passage',
    (rule, sheet) =>
      withRules(sheet, {
        ...quoted(rule),
        id: 'planted',
        sources: rule.sources.map(({ passage: _, passageLang: __, ...cited }) => ({ ...cited, standing: 'law', evidence: 'read' })),
        standing: 'law',
      }),
  ],
  [
    'CHECK-77',
    'trial-otherwise',
    'trials/planted/expected/eu-pb-cat2',
    (_, sheet) => ({
      trials: [
        ...sheet.trials,
        {
          id: 'planted',
          title: 'A flat plate',
          on: TODAY,
          answers: { use: 'food', 'holds-liquid': false, 'cooked-in': false, 'packaging-or-storage': false },
          declined: [],
          expected: { 'eu-pb-cat2': 'applies' },
        },
      ],
    }),
  ],
  ['CHECK-78', 'meaning-added', 'rules/planted/when', (rule, sheet) => withRules(sheet, { ...quoted(rule), id: 'planted', when: food })],
  ['CHECK-79', 'too-many-cells', 'rules/planted/when', (rule, sheet) => withRules(sheet, { ...quoted(rule), id: 'planted', when: depths })],
];

test.each(plants)('%s a planted fault is found where it stands: %s at %s', async (_, kind, field, change) => {
  const findings = await findingsOf('dk', await danish(change));
  expect(findings.map((finding) => `${finding.kind} ${finding.at.list}/${finding.at.id}/${finding.at.field}`)).toContain(
    `${kind} ${field}`,
  );
});

test('CHECK-78 a change of the layer above is told with the places below that it reaches', async () => {
  const eu = await sheetOf('eu');
  const rules = eu.rules.map((rule) =>
    rule.id === 'eu-pb-cat2' ? { ...rule, when: { all: [rule.when, { question: 'lidded', is: false }] } } : rule,
  );
  const findings = await findingsOf('eu', { ...eu, rules });
  const changed = findings.find(({ kind, at }) => kind === 'meaning-changed' && at.id === 'eu-pb-cat2');
  expect(changed?.example).toMatchObject({ lidded: true });
  const below = findings.find(({ kind, at }) => kind === 'meaning-changed-below' && at.id === 'eu-pb-cat2');
  expect(String(below?.values['regions']).split(', ')).toContain('dk');
});

test('CHECK-70 a term that a sheet below rests on cannot be taken away unseen', async () => {
  const care = await sheetOf('care');
  const findings = await findingsOf('care', { ...care, terms: care.terms.filter(({ id }) => id !== 'food-ware') });
  const broken = findings.filter(({ kind }) => kind === 'breaks-below').map(({ values }) => values['region']);
  expect(broken).toEqual(expect.arrayContaining(['eu', 'dk']));
});

test('CHECK-70 a document that is no sheet, one of another place, and a base that is not there', async () => {
  const dk = await sheetOf('dk');
  expect(await findingsOf('dk', { ...dk, name: '' })).toMatchObject([
    { check: 'C1', kind: 'document', at: { list: 'sheet', field: 'name' } },
  ]);
  expect(await findingsOf('dk', await sheetOf('eu'))).toMatchObject([
    { check: 'C1', kind: 'document', at: { list: 'sheet', field: 'code' } },
  ]);
  expect(await checkProposal(ctx, { code: 'dk', document: dk, base: 99, on: TODAY })).toEqual({
    ok: false,
    error: { kind: 'no-such-edition' },
  });
});

test('CHECK-76 a first sheet of a new place needs a passage for each of its claims', async () => {
  const dk = await sheetOf('dk');
  const rules = dk.rules.map((rule): Rule => ({ ...rule, id: `nn-${rule.id}`, region: 'nn', kind: 'adds', targets: [] }));
  const findings = await findingsOf('nn', { ...dk, code: 'nn', rules, terms: [], trials: [] }, null);
  expect(findings.some(({ kind }) => kind === 'no-passage')).toBe(true);
  expect(findings.filter(({ level, check }) => level === 'error' && check !== 'C7')).toEqual([]);
});
