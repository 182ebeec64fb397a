import { describe, expect, test } from 'vitest';
import { LOCALE } from '@/lib/kernel/words';
import { citedTexts, findText, readingOf, readSourceAddress, searchTexts, sourceAddress } from '@/lib/regions/domain/cited-text';
import { seedSheets } from '@/tests/builders/seed-sheets';
import { day } from '../checks/lines';
import { aSheet, isA, quoted, sheetRule, sheetTerm } from '../checks/sheets';

const COLLATOR = new Intl.Collator(LOCALE);
const SHEETS = [...seedSheets.values()];

const sheet = aSheet([sheetRule('mark', isA), sheetRule('test', isA, { sources: [{ ...quoted, source: 'law', evidence: 'memory' }] })], {
  terms: [sheetTerm('cup', isA)],
  sources: [
    {
      id: 'act',
      title: 'Ware Act',
      publisher: 'Parliament of Quarn',
      url: 'https://law.quarn.example.test/ware/',
      seenOn: day('2026-11-01'),
    },
    { id: 'law', title: 'Glaze Law', publisher: 'Parliament of Quarn' },
    { id: 'spare', title: 'A spare text', publisher: 'Parliament of Quarn' },
  ],
});
const neighbour = aSheet([sheetRule('mark-rr', isA, { region: 'rr', sources: [{ ...quoted, source: 'ware' }] })], {
  code: 'rr',
  name: 'Rill',
  sources: [{ id: 'ware', title: 'The ware act', publisher: 'Quarn', url: 'https://law.quarn.example.test/ware' }],
});

describe('REG-45 sources', () => {
  test('a text lists what rests on it: rules and terms, in every sheet that cites it under the same title and address', () => {
    const same = { ...neighbour, sources: neighbour.sources.map((source) => ({ ...source, title: 'Ware Act' })) };
    const text = findText([sheet, same], { region: 'qq', id: 'act' });
    expect(text?.resting.map(({ id }) => id)).toEqual(['mark', 'cup', 'mark-rr']);
    expect(text?.places.map(({ code }) => code)).toEqual(['qq', 'rr']);
    expect(findText([sheet, neighbour], { region: 'qq', id: 'act' })?.places).toHaveLength(1);
    expect(findText([sheet], { region: 'qq', id: 'other' })).toBeNull();
    expect(findText([sheet], { region: 'zz', id: 'act' })).toBeNull();
  });

  test('read, with its day, is told apart from never read', () => {
    const readingAt = (id: string) => {
      const text = findText([sheet], { region: 'qq', id });
      return text === null ? null : readingOf(text);
    };
    expect(readingAt('act')).toEqual({ state: 'read', on: '2026-11-01' });
    expect(readingAt('law')).toEqual({ state: 'not-read', on: null });
    expect(readingAt('spare')).toEqual({ state: 'not-read', on: null });
  });

  test('an address names a sheet and a text of it, codes with hyphens too', () => {
    expect(readSourceAddress('us-ca--prop-65')).toEqual({ region: 'us-ca', id: 'prop-65' });
    expect(['eu', 'eu-x', 'eu--', '--x', 'EU--x', 'eu--x--y', '../eu--x'].map(readSourceAddress)).toEqual(Array(7).fill(null));
  });

  test('every citation of every sheet is on the page of its source, and every listed text has a page', () => {
    const missed = SHEETS.flatMap((one) =>
      [...one.rules, ...one.terms].flatMap(({ id, sources }) =>
        sources.filter(({ source }) => !findText(SHEETS, { region: one.code, id: source })?.resting.some((rest) => rest.id === id)),
      ),
    );
    expect(missed).toEqual([]);
    const texts = citedTexts(SHEETS, COLLATOR);
    const gone = texts.filter(({ address }) => {
      const at = readSourceAddress(address);
      return at === null || findText(SHEETS, at) === null || sourceAddress(at.region, at.id) !== address;
    });
    expect(gone).toEqual([]);
    expect(new Set(texts.map(({ address }) => address)).size).toBe(texts.length);
  });

  test('a text is at home in the widest sheet that names it', () => {
    const bloc = { ...sheet, code: 'vv', name: 'Vale', kind: 'bloc' as const, rules: [], terms: [] };
    expect(citedTexts([sheet, bloc], COLLATOR).map(({ address }) => address)).toEqual(['vv--spare', 'vv--law', 'vv--act']);
  });

  test('a search takes words of title, publisher and place, and what is only said is no text', () => {
    const texts = citedTexts([sheet, neighbour], COLLATOR);
    expect(searchTexts(texts, 'glaze quarn').map(({ address }) => address)).toEqual(['qq--law']);
    expect(searchTexts(texts, 'rill').map(({ address }) => address)).toEqual(['rr--ware']);
    expect(searchTexts(texts, '')).toHaveLength(4);
    expect(searchTexts(texts, 'zzzz')).toEqual([]);
    const practice = sheetRule('said', true, { sources: [{ ...quoted, source: 'law', standing: 'common-practice' }] });
    expect(citedTexts([{ ...sheet, rules: [practice], terms: [] }], COLLATOR).map(({ address }) => address)).not.toContain('qq--law');
  });
});
