import { expect, test } from 'vitest';
import { parseCalendarDate } from '@/lib/kernel/calendar-date';
import { limitRows } from '@/lib/regions/domain/limit-rows';
import type { Rule } from '@/lib/regions/domain/rule';
import { neighboursOf } from '@/lib/regions/domain/rule-neighbours';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { namesOf } from '@/lib/regions/domain/sheet-names';
import { tellLayer } from '@/lib/regions/domain/told-sheet';

const ON = parseCalendarDate('2026-12-01');
if (ON === null) throw new Error('not a day');
const DAY = ON;

const aRule = (rule: Partial<Rule> & Pick<Rule, 'id' | 'region'>): Rule => ({
  kind: 'adds',
  targets: [],
  alongside: [],
  when: { all: [{ term: 'flat' }, { not: { term: 'cup' } }] },
  from: null,
  to: null,
  order: 1,
  firm: false,
  strength: 'must',
  standing: 'law',
  title: `Title of ${rule.id}`,
  says: 'Do it.',
  payload: {
    topic: 'limit',
    substance: 'Pb',
    part: 'inside',
    per: 'L',
    amount: { value: 4, unit: 'mg/L', evidence: 'read' },
    decision: { kind: 'each', specimens: 1, evidence: 'read', atLimit: 'within' },
  },
  sources: [],
  facts: [],
  lookAgainBy: DAY,
  ...rule,
});

const aSheet = (sheet: Partial<Sheet> & Pick<Sheet, 'code'>): Sheet => ({
  name: sheet.code.toUpperCase(),
  kind: 'country',
  languages: [],
  memberships: [],
  text: 'Text.',
  textFacts: [],
  trials: [],
  authorities: [],
  accreditation: [],
  gaps: [],
  sources: [],
  terms: [],
  rules: [],
  leftOut: [],
  ...sheet,
});

const term = (id: string, category: boolean) =>
  ({
    id,
    region: 'eu',
    name: `Name of ${id}`,
    says: 'It is.',
    category,
    when: true,
    from: null,
    to: null,
    sources: [],
    facts: [],
  }) as const;

const EU = aSheet({
  code: 'eu',
  rules: [aRule({ id: 'eu-lead', region: 'eu' }), aRule({ id: 'eu-other', region: 'eu' })],
  terms: [term('flat', true), term('cup', true)],
});
const DE = aSheet({ code: 'de', rules: [aRule({ id: 'de-lead', region: 'de', kind: 'replaces', targets: ['eu-lead'] })] });
const NO = aSheet({
  code: 'no',
  memberships: [{ parent: 'eu', from: null, to: null, except: [{ rule: 'eu-lead', why: 'Not taken over.' }] }],
});

test('a rule knows what takes its place in the sheets below, and where it does not reach', () => {
  const found = neighboursOf(aRule({ id: 'eu-lead', region: 'eu' }), [EU, DE, NO]);
  expect(found.attackers).toEqual([{ id: 'de-lead', title: 'Title of de-lead', kind: 'replaces', region: 'de', regionName: 'DE' }]);
  expect(found.leftOutIn).toEqual([{ region: 'no', regionName: 'NO', why: 'Not taken over.' }]);
  expect(neighboursOf(aRule({ id: 'de-lead', region: 'de', targets: ['eu-lead'] }), [EU, DE]).targets).toMatchObject([
    { id: 'eu-lead', region: 'eu' },
  ]);
});

test('two rules that stand beside each other know of it from either side', () => {
  const one = aRule({ id: 'a', region: 'eu', alongside: ['b'] });
  const other = aRule({ id: 'b', region: 'eu' });
  const sheets = [aSheet({ code: 'eu', rules: [one, other] })];
  expect(neighboursOf(one, sheets).alongside).toMatchObject([{ id: 'b' }]);
  expect(neighboursOf(other, sheets).alongside).toMatchObject([{ id: 'a' }]);
});

test('the table of limits holds the whole line, own rules first, without what was not taken over', () => {
  const told = (sheet: Sheet) => tellLayer({ sheet, number: 1, inUseFrom: new Date(0) }, DAY);
  const above = [told(EU)];
  const sheet = { ...told(DE), on: DAY, line: ['eu', 'de'], notInherited: [{ rule: 'eu-other', why: 'No.' }], above, caution: '' };
  const rows = limitRows(sheet, namesOf([sheet, ...above]));
  expect(rows.map(({ rule, silencedBy }) => [rule.id, silencedBy.map(({ id }) => id)])).toEqual([
    ['de-lead', []],
    ['eu-lead', ['de-lead']],
  ]);
  // A kind of ware that a rule leaves out is not one it names.
  expect(rows[0]?.categories).toEqual([{ id: 'flat', name: 'Name of flat', region: 'eu' }]);
});
