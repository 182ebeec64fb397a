import { describe, expect, test } from 'vitest';
import { documentFindings } from '@/lib/checks/domain/document-findings';
import type { Finding } from '@/lib/checks/domain/finding';
import { sayFinding } from '@/lib/checks/domain/finding-words';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { sheetDocument } from '@/lib/regions/schema';
import { MESSAGES } from '@/lib/kernel/words';
import { day } from './lines';
import { above, aSheet, aTrial, found, isA, isB, isCup, partOf, quoted, sheetRule, sheetTerm, TODAY, told } from './sheets';

describe('C6 dates', () => {
  const duty = sheetRule('duty', isA, { order: 0 });
  const early = sheetRule('early', isA, { kind: 'replaces', targets: ['duty'], to: day('2027-01-01') });
  const late = (from: string, rest: Parameters<typeof sheetRule>[2] = {}) =>
    sheetRule('late', isA, { kind: 'replaces', targets: ['duty'], from: day(from), ...rest });

  test('CHECK-75 C6: a span ends after it begins', () => {
    const backwards = { from: day('2027-01-01'), to: day('2027-01-01') };
    expect(told(found(aSheet([sheetRule('r', isA, backwards)])), 'C6')).toEqual(['ends-before-start rules/r/to']);
    expect(told(found(aSheet([], { terms: [sheetTerm('t', isA, { ...backwards, category: true })] })), 'C6')).toEqual([
      'ends-before-start terms/t/to',
    ]);
    const edge = { parent: 'vv', ...backwards, except: [] };
    expect(told(found(aSheet([], { memberships: [edge] }), { around: [above([])] }), 'C6')).toEqual([
      'ends-before-start memberships/vv/to',
    ]);
    expect(told(found(aSheet([sheetRule('r', isA, { from: day('2027-01-01'), to: day('2027-01-02') })])), 'C6')).toEqual([]);
  });

  test('CHECK-75 C6: rules that take a target over from each other leave no day bare, unless a note says so', () => {
    expect(told(found(aSheet([duty, early, late('2027-01-02')])), 'C6')).toEqual(['gap-between rules/late/from']);
    expect(told(found(aSheet([duty, early, late('2027-01-01')])), 'C6')).toEqual([]);
    const between = sheetRule('between', isB, { kind: 'replaces', targets: ['duty'], from: day('2026-06-01'), to: day('2027-02-01') });
    expect(told(found(aSheet([duty, early, between, late('2027-01-02')])), 'C6')).toEqual([]);
    const stated = found(aSheet([duty, early, late('2027-01-02', { note: 'No rule on New Year’s Day.' })]));
    expect(stated.filter(({ check }) => check === 'C6')).toMatchObject([{ level: 'note', kind: 'gap-stated' }]);
    expect(told(found(aSheet([duty, early])), 'C6')).toEqual([]);
  });

  test('CHECK-75 C6: a look that was due is noted from the day after', () => {
    expect(told(found(aSheet([sheetRule('r', isA, { lookAgainBy: day('2026-11-30') })])), 'C6')).toEqual([
      'look-again-passed rules/r/lookAgainBy',
    ]);
    expect(told(found(aSheet([sheetRule('r', isA, { lookAgainBy: TODAY })])), 'C6')).toEqual([]);
  });
});

describe('C7 sources', () => {
  const { passage: _, passageLang: __, ...unquoted } = quoted;
  const bare = aSheet([sheetRule('r', isA, { sources: [unquoted] })]);

  test('CHECK-76 C7: a rule has a source, and what was read has a day', () => {
    expect(told(found(aSheet([sheetRule('r', isA, { sources: [] })])), 'C7')).toEqual(['no-source rules/r/sources']);
    const sources = [{ id: 'act', title: 'Ware Act', publisher: 'Parliament of Quarn' }];
    expect(told(found(aSheet([sheetRule('r', isA)], { sources })), 'C7')).toEqual(['no-seen-date rules/r/sources/0']);
    const recalled = sheetRule('r', isA, { strength: 'should', sources: [{ ...unquoted, evidence: 'memory' }] });
    expect(told(found(aSheet([recalled], { sources })), 'C7')).toEqual([]);
  });

  test('CHECK-76 C7: a claim that is new, or that claims something else, has a passage', () => {
    expect(told(found(bare), 'C7')).toEqual([]);
    expect(told(found(bare, { base: aSheet([]) }), 'C7')).toEqual(['no-passage rules/r/sources/0/passage']);
    expect(told(found(bare, { base: null }), 'C7')).toEqual(['no-passage rules/r/sources/0/passage']);
    const otherClaim = aSheet([sheetRule('r', isB, { sources: [unquoted] })]);
    expect(told(found(otherClaim, { base: bare }), 'C7')).toEqual(['no-passage-changed rules/r/sources/0/passage']);
    const retitled = aSheet([sheetRule('r', isA, { sources: [unquoted], title: 'Mark every piece' })]);
    expect(told(found(retitled, { base: bare }), 'C7')).toEqual([]);
    expect(told(found(aSheet([sheetRule('r', isB)]), { base: bare }), 'C7')).toEqual([]);
  });

  test('CHECK-76 C7: a new term quotes its source; common practice has nothing to quote', () => {
    const terms = [sheetTerm('t', isA, { category: true, sources: [unquoted] })];
    expect(told(found(aSheet([], { terms }), { base: aSheet([]) }), 'C7')).toEqual(['no-passage terms/t/sources/0/passage']);
    const practice = sheetRule('p', true, {
      strength: 'note',
      standing: 'common-practice',
      sources: [{ ...unquoted, standing: 'common-practice' }],
    });
    expect(told(found(aSheet([practice]), { base: aSheet([]) }), 'C7')).toEqual([]);
  });
});

describe('C8 trial pieces', () => {
  const rules = [sheetRule('r', isA), sheetRule('s', isCup)];

  test('CHECK-77 C8: a trial piece comes out as its sheet says, on its own day', () => {
    const right = aTrial('mug', { r: 'applies', s: 'not-settled' });
    expect(found(aSheet(rules, { trials: [right] }))).toEqual([]);
    expect(found(aSheet(rules, { trials: [{ ...right, declined: ['form'], expected: { s: 'treat-as-applying' } }] }))).toEqual([]);
    const wrong = found(aSheet(rules, { trials: [aTrial('mug', { r: 'does-not-apply', s: 'not-settled' })] }));
    expect(wrong).toMatchObject([
      {
        check: 'C8',
        level: 'error',
        at: { list: 'trials', id: 'mug', field: 'expected/r' },
        values: { rule: 'r', expected: 'does-not-apply', found: 'applies' },
      },
    ]);
    const later = [sheetRule('r', isA, { from: day('2027-01-01') })];
    expect(told(found(aSheet(later, { trials: [aTrial('mug', { r: 'applies' })] })), 'C8')).toEqual([
      'trial-no-rule trials/mug/expected/r',
    ]);
    expect(found(aSheet(later, { trials: [aTrial('mug', { r: 'applies' }, { on: day('2027-01-01') })] }))).toEqual([]);
  });

  test.each([
    ['no such question', { gone: true }, [], 'gone'],
    ['a text for yes or no', { a: 'yes' }, [], 'a'],
    ['an option that is not offered', { form: 'vase' }, [], 'form'],
    ['a negative length', { depth: -1 }, [], 'depth'],
    ['a length as a text', { depth: '12' }, [], 'depth'],
    ['answered and declined', { a: true }, ['a'], 'a'],
    ['a declined question that is not there', {}, ['gone'], 'gone'],
  ])('CHECK-77 C8: answers that make no sense are told: %s', (_, answers, declined, question) => {
    const sheet = aSheet(rules, { trials: [aTrial('mug', { r: 'applies' }, { answers, declined })] });
    expect(told(found(sheet), 'C8')).toEqual([`trial-bad-answer trials/mug/answers/${question}`]);
  });

  test('CHECK-77 C8: expectations changed, pieces taken out and pieces below that come out otherwise are listed, not refused', () => {
    const base = aSheet(rules, { trials: [aTrial('mug', { r: 'applies' }), aTrial('bowl', { r: 'applies' })] });
    const changed = aSheet([sheetRule('r', isB), sheetRule('s', isCup)], { trials: [aTrial('mug', { r: 'not-settled' })] });
    const findings = found(changed, { base }).filter(({ check }) => check === 'C8');
    expect(findings).toMatchObject([
      { level: 'note', kind: 'trial-changed', values: { before: 'applies', after: 'not-settled' } },
      { level: 'note', kind: 'trial-withdrawn', at: { id: 'bowl' } },
    ]);
    const vale = above([sheetRule('v', isA)]);
    const below = aSheet([], { memberships: partOf('vv'), trials: [aTrial('mug', { v: 'applies' })] });
    const moved = found(above([sheetRule('v', isB)]), { base: vale, around: [below] });
    expect(moved.filter(({ check }) => check === 'C8')).toMatchObject([
      {
        level: 'note',
        kind: 'trial-below',
        at: { id: 'mug', field: 'expected/v' },
        values: { region: 'qq', expected: 'applies', found: 'not-settled' },
      },
    ]);
    expect(told(found(vale, { base: vale, around: [below] }), 'C8')).toEqual([]);
  });
});

describe('C9 meaning', () => {
  const base = aSheet([sheetRule('r', { all: [isA, isB] })]);

  test('CHECK-78 C9: other words with the same meaning are told apart from another meaning, which is shown by a piece', () => {
    const reworded = aSheet([sheetRule('r', { not: { any: [{ not: isA }, { not: isB }] } })]);
    expect(told(found(reworded, { base }), 'C9')).toEqual(['meaning-same rules/r/when']);
    const [change, ...others] = found(aSheet([sheetRule('r', isA), sheetRule('s', isB)]), { base }).filter(({ check }) => check === 'C9');
    expect(change).toMatchObject({ level: 'note', kind: 'meaning-changed', at: { id: 'r' }, example: { a: true, b: false } });
    expect(others).toMatchObject([{ kind: 'meaning-added', at: { id: 's' } }]);
    expect(told(found(aSheet([]), { base }), 'C9')).toEqual(['meaning-withdrawn rules/r/id']);
    expect(told(found(base, { base }), 'C9')).toEqual([]);
  });

  test('CHECK-78 C9: a change that begins later is found on its day; places below are named', () => {
    const later = aSheet([...base.rules, sheetRule('s', isA, { from: day('2028-01-01') })]);
    const [finding] = found(later, { base }).filter(({ check }) => check === 'C9');
    expect(finding).toMatchObject({ kind: 'meaning-added', values: { rule: 's', on: '2028-01-01' } });
    const vale = above([sheetRule('v', isA)]);
    const below = aSheet([], { memberships: partOf('vv') });
    const findings = found(above([sheetRule('v', isB)]), { base: vale, around: [below] });
    expect(findings.filter(({ kind }) => kind === 'meaning-changed-below')).toMatchObject([
      { values: { rule: 'v', count: 1, regions: 'qq' } },
    ]);
  });
});

test('CHECK-76 CHECK-78 the order of members makes no difference: a kept edition has them sorted', () => {
  const turned = (value: unknown): unknown => {
    if (Array.isArray(value)) return value.map(turned);
    if (typeof value !== 'object' || value === null) return value;
    const members = Object.entries(value).map(([name, member]): [string, unknown] => [name, turned(member)]);
    return Object.fromEntries(members.toReversed());
  };
  const { passage: _, passageLang: __, ...unquoted } = quoted;
  const sheet = aSheet([sheetRule('r', { all: [isA, isB] }, { sources: [unquoted] })]);
  const kept = turned(sheet) as Sheet;
  expect(JSON.stringify(kept)).not.toBe(JSON.stringify(sheet));
  expect(found(sheet, { base: kept })).toEqual([]);
});

describe('documents that are no sheet', () => {
  const findingsOf = (document: object): readonly Finding[] => {
    const parsed = sheetDocument.safeParse(document);
    return parsed.success ? [] : documentFindings(parsed.error.issues, document);
  };
  const text = (value: unknown): object => JSON.parse(JSON.stringify(value)) as object;

  test('CHECK-70 CHECK-75 CHECK-76 each fault of form stands at its item and field, under its check', () => {
    const sheet = aSheet([]);
    expect(findingsOf(text(sheet))).toEqual([]);
    const rule = { ...sheetRule('r', { question: 'use', is: 'food' }), from: '2026-02-30' };
    expect(findingsOf(text({ ...sheet, rules: [rule] }))).toMatchObject([{ check: 'C6', at: { list: 'rules', id: 'r', field: 'from' } }]);
    const must = sheetRule('r', { question: 'use', is: 'food' }, { sources: [{ ...quoted, evidence: 'memory' }] });
    expect(findingsOf(text({ ...sheet, rules: [must] }))).toMatchObject([{ check: 'C7', at: { id: 'r', field: 'strength' } }]);
    expect(findingsOf(text({ ...sheet, name: '' }))).toMatchObject([{ check: 'C1', at: { list: 'sheet', id: 'qq', field: 'name' } }]);
    expect(findingsOf(text({ ...sheet, memberships: [{ parent: 'NO' }] }))).toMatchObject([
      { at: { list: 'memberships', id: 'NO', field: 'parent' } },
    ]);
    expect(findingsOf(text({ ...sheet, gaps: ['x', ''] }))).toMatchObject([{ at: { list: 'gaps', id: '1' } }]);
  });
});

test('CHECK-70 every finding has words: ids as they are, dates and statuses spelled out', () => {
  const late = { check: 'C6', level: 'error', kind: 'gap-between', at: { list: 'rules', id: 'late', field: 'from' } } as const;
  const said = sayFinding({ ...late, values: { target: 'duty', earlier: 'early', from: '2027-01-01', to: '2027-02-01' } });
  expect(said.where).toBe('Rule “late”, from');
  expect(said.text).toContain('between 1 January 2027, when “early” ends, and 1 February 2027');
  const trial = { check: 'C8', level: 'error', kind: 'trial-otherwise', at: { list: 'trials', id: 'mug', field: '' } } as const;
  expect(sayFinding({ ...trial, values: { rule: 'r', expected: 'does-not-apply', found: 'applies' } })).toEqual({
    level: MESSAGES['sheet-checks'].level.error,
    where: 'Trial piece “mug”, as a whole',
    text: 'Mend the rule or the expectation: for this piece “r” should say “does not apply” and says “applies”.',
  });
});
