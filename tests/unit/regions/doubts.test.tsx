import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, test } from 'vitest';
import { DoubtTable } from '@/components/doubts/doubt-table';
import { DueTable } from '@/components/doubts/due-table';
import { RuleDoubts } from '@/components/doubts/rule-doubts';
import { SheetKeepers } from '@/components/doubts/sheet-keepers';
import { LineTable } from '@/components/day-book/line-table';
import type { ToldLine } from '@/lib/day-book/domain/told-line';
import { words } from '@/lib/kernel/words';
import { LookAgain } from '@/components/regions/look-again';
import { tellRule } from '@/lib/regions/domain/told-rule';
import { doubtInput, lookAgainQuery } from '@/lib/regions/doubt-schema';
import { HOSTILE } from '../../builders/hostile-text';
import { aDate } from '../../builders/seed-sheets';
import { aRule, aSource } from '../../builders/small-world';

const RIGHT = { key: '0190a000-0000-7000-8000-000000000001', rule: 'xd-name', words: 'The order was replaced.', stamp: 'x' };
const faultsOf = (over: Readonly<Record<string, unknown>>): readonly string[] => {
  const read = doubtInput.safeParse({ ...RIGHT, ...over });
  return read.success ? [] : read.error.issues.map(({ path }) => String(path[0]));
};

describe('REG-85 the form of a doubt', () => {
  test.each<readonly [string, Readonly<Record<string, unknown>>, readonly string[]]>([
    ['with words alone', {}, []],
    ['with all there is', { elsewhere: 'Order 681', link: 'https://law.example.test/681', homepage: '' }, []],
    ['with two addresses', { words: 'See http://a.example.test and www.b.example.test' }, []],
    ['with three addresses', { words: 'See http://a.example.test and www.b.example.test', link: 'HTTPS://c.example.test' }, ['words']],
    ['with too few words', { words: 'Wrong!' }, ['words']],
    ['with words that nobody sees', { words: '\u200b'.repeat(40) }, ['words']],
    ['with 2000 characters', { words: 'a'.repeat(2000) }, []],
    ['with 2001 characters', { words: 'a'.repeat(2001) }, ['words']],
    ['with a filled trap', { homepage: 'https://pots.example.test' }, ['homepage']],
    ['about what is no rule', { rule: '../x' }, ['rule']],
  ])('%s', (_, over, faults) => {
    expect(faultsOf(over)).toEqual(faults);
  });
});

test('REG-92 of the list’s address only what can be read is asked', () => {
  expect(lookAgainQuery.parse({ region: 'DK', keeper: 'x', days: '-1', page: '0' })).toEqual({});
  expect(lookAgainQuery.parse({ region: 'dk', keeper: 'me', days: ['7', '8'], page: '2' })).toEqual({
    region: 'dk',
    keeper: 'me',
    days: 7,
    page: 2,
  });
});

/** Tags and attributes that a page may have by itself; a hostile text adds none. */
const skeletonOf = (html: string): string => html.replace(/>[^<]*</g, '><').replace(/(aria-label|href|id)="[^"]*"/g, '$1=""');

test('REG-93 S33 hostile texts in doubts, names, titles and reasons change nothing of a page but its words', () => {
  const draw = (text: string): string =>
    renderToStaticMarkup(
      <>
        <RuleDoubts
          waiting={1}
          answered={[
            { id: 'a', words: text, elsewhere: text, link: text, answer: text, by: { kind: 'named', name: text }, on: new Date(0) },
          ]}
        />
        <DoubtTable doubts={[{ id: 'a', place: text, rule: 'x', ruleTitle: text, words: text, madeAt: new Date(0), isWaiting: true }]} />
        <SheetKeepers names={[text, 'Mara']} said={text} />
        <DueTable
          rules={[{ region: 'xa', place: text, id: 'xa-1', title: text, lookAgainBy: aDate('2026-12-01'), daysLeft: 0 }]}
          keepers={new Map([['xa', [text]]])}
        />
        <LineTable
          lines={[
            {
              number: 1,
              at: new Date(0),
              act: 'doubt.answer',
              did: text,
              who: { kind: 'named', name: text },
              whom: null,
              subjectKind: text,
              change: null,
              region: 'dk',
              edition: null,
              reason: text,
            },
          ]}
          places={[{ code: 'dk', name: text }]}
        />
      </>,
    );
  const plain = skeletonOf(draw('plain'));
  for (const { text } of HOSTILE) expect([text, skeletonOf(draw(text))]).toEqual([text, plain]);
});

const aLine = (over: Partial<ToldLine>): ToldLine => ({
  number: 4,
  at: new Date(0),
  act: 'amendment.approve',
  did: 'amendment.approve',
  who: { kind: 'named', name: 'Ruth' },
  whom: null,
  subjectKind: 'amendment',
  change: null,
  region: 'dk',
  edition: 7,
  reason: null,
  ...over,
});

test('DAY-8 a line on a sheet leads to its edition, else to the sheet, and of a place without a sheet nowhere', () => {
  const draw = (line: ToldLine): string => renderToStaticMarkup(<LineTable lines={[line]} places={[{ code: 'dk', name: 'Denmark' }]} />);
  expect(draw(aLine({}))).toContain('href="/regions/dk/editions/7"');
  expect(draw(aLine({ act: 'doubt.answer', edition: null }))).toContain('href="/regions/dk"');
  expect(draw(aLine({ region: 'zz' }))).not.toContain('href=');
});

test('REG-92 L6 a rule past its day says since when nobody looked, and whom to check with; one on its day does not', () => {
  const rule = tellRule(aRule('xa-1', { lookAgainBy: aDate('2026-12-01') }), [aSource]);
  const draw = (today: string): string =>
    renderToStaticMarkup(<LookAgain rule={rule} today={aDate(today)} authority="the Office of Ware" />);
  expect(draw('2026-12-01')).toBe('');
  expect(draw('2026-12-02')).toContain(words('regions.rule.lookAgainPast', { seen: '1 November 2026', authority: 'the Office of Ware' }));
});
