import { describe, expect, test } from 'vitest';
import lists from '@/content/words/allowed.json';
import { isDeadInForm, reportSheet } from '@/lib/regions/domain/content-report';
import { seedSheets } from '@/tests/builders/seed-sheets';
import { day } from '../checks/lines';
import { aSheet, isA, quoted, sheetRule, TODAY } from '../checks/sheets';

const report = (rest: Parameters<typeof aSheet>[1], rules: Parameters<typeof aSheet>[0] = []) =>
  reportSheet(aSheet(rules, rest), lists, TODAY);
const faults = (...given: Parameters<typeof report>): readonly string[] =>
  report(...given).faults.map(({ kind, at, said }) => `${kind} ${at} ${said}`);
const remarks = (...given: Parameters<typeof report>): readonly string[] => report(...given).remarks.map(({ kind, at }) => `${kind} ${at}`);

describe('REG-48 the content check', () => {
  test('a word of verdict in our own voice is a fault, wherever it stands', () => {
    expect(faults({ text: 'This ware is safe.', gaps: ['Is it legal?'] })).toEqual(['banned-word text safe', 'banned-word gaps/0 legal']);
    const rule = sheetRule('mark', isA, { says: 'Sell it as certified.', payload: { topic: 'other', details: 'It is approved.' } });
    expect(faults({}, [rule])).toEqual(['banned-word rules/mark/says certified', 'banned-word rules/mark/details approved']);
  });

  test('allowed phrases, quotations, label wordings and titles of sources are none', () => {
    expect(faults({ text: 'Instructions for safe use. No glaze is safe. The law says “safe for food”.' })).toEqual([]);
    const label = sheetRule('mark', isA, { payload: { topic: 'label', words: { en: 'Food safe' } } });
    expect(faults({ sources: [{ id: 'act', title: 'Safe Ware Act', publisher: 'Quarn' }] }, [label])).toEqual([]);
  });

  test('a must without law that was read is a fault; advice and a read must are none', () => {
    const memory = sheetRule('mark', isA, { sources: [{ ...quoted, evidence: 'memory' }] });
    const guidance = sheetRule('mark', isA, { sources: [{ ...quoted, standing: 'guidance' }] });
    expect(faults({}, [memory])).toEqual(['unsourced-must rules/mark/sources Mark the ware']);
    expect(faults({}, [guidance])).toEqual(['unsourced-must rules/mark/sources Mark the ware']);
    expect(faults({}, [sheetRule('mark', isA), { ...memory, strength: 'should' }])).toEqual([]);
  });

  test('the sheets as they are have no fault', () => {
    const found = [...seedSheets.values()].flatMap((sheet) =>
      reportSheet(sheet, lists, TODAY).faults.map((fault) => ({ code: sheet.code, ...fault })),
    );
    expect(found).toEqual([]);
  });
});

describe('what the content check remarks', () => {
  const words = (count: number): string => `${Array.from({ length: count }, () => 'word').join(' ')}.`;

  test('a sentence of 31 words is long, one of 30 is not; a line ends it', () => {
    expect(remarks({ text: words(30) })).toEqual([]);
    expect(remarks({ text: words(31) })).toEqual(['long-sentence text']);
    expect(remarks({ text: `${words(30).slice(0, -1)}\n\n- ${words(20)}` })).toEqual([]);
  });

  test('an address that can lead nowhere is a dead link', () => {
    const dead = [
      'https://example.com/law',
      'ftp://law.quarn.net',
      'https://intranet/x',
      'https://law.quarn.net/{id}',
      'law',
      'https://a.test',
    ];
    expect(dead.filter((address) => !isDeadInForm(address))).toEqual([]);
    expect(isDeadInForm('https://eur-lex.europa.eu/eli/dir/1984/500/2005-05-20')).toBe(false);
    expect(remarks({ authorities: [{ name: 'Office', url: 'https://example.org', role: 'Asks', evidence: 'read' }] })).toEqual([
      'dead-link contacts/Office',
    ]);
  });

  test('a rule past its look-again date is due, unless it has ended', () => {
    const past = { lookAgainBy: day('2026-11-30') };
    expect(remarks({}, [sheetRule('late', isA, past)])).toEqual(['look-again rules/late']);
    expect(
      remarks({}, [sheetRule('ended', isA, { ...past, to: day('2026-01-01') }), sheetRule('due', isA, { lookAgainBy: TODAY })]),
    ).toEqual([]);
  });

  test('rules are counted by how well they are known', () => {
    const practice = sheetRule('said', true, { standing: 'common-practice', strength: 'note' });
    const memory = sheetRule('heard', isA, { strength: 'should', sources: [{ ...quoted, evidence: 'memory' }] });
    expect(report({}, [sheetRule('mark', isA), practice, memory])).toMatchObject({ rules: 3, read: 1, memory: 1, commonPractice: 1 });
  });
});
