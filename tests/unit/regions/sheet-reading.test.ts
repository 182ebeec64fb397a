import { describe, expect, test } from 'vitest';
import { parseCalendarDate, type CalendarDate } from '@/lib/kernel/calendar-date';
import { alikeTogether, citeSources } from '@/lib/regions/domain/cited-sources';
import { lifeOn, sayDates } from '@/lib/regions/domain/rule-dates';
import { contactsOf, splitText } from '@/lib/regions/domain/sheet-reading';
import type { ToldSource } from '@/lib/regions/domain/told-rule';

const day = (text: string): CalendarDate => {
  const date = parseCalendarDate(text);
  if (date === null) throw new Error(`${text} is no day`);
  return date;
};

describe('dates of a rule', () => {
  test('the end is told as the last day on which it holds', () => {
    expect(sayDates({ from: day('2026-01-01'), to: day('2027-03-01') })).toBe(
      'In force from 1 January 2026 until the end of 28 February 2027',
    );
  });

  test('a rule begins on its first day and has ended on the day named as its end', () => {
    const span = { from: day('2026-01-01'), to: day('2027-03-01') };
    expect(lifeOn(span, day('2025-12-31'))).toBe('coming');
    expect(lifeOn(span, day('2026-01-01'))).toBe('in-force');
    expect(lifeOn(span, day('2027-02-28'))).toBe('in-force');
    expect(lifeOn(span, day('2027-03-01'))).toBe('ended');
  });
});

describe('the text of a sheet', () => {
  test('what is coming stands apart', () => {
    expect(splitText('One.\n\nTwo.\n\n## Coming\n\n- Soon.\n')).toEqual({ introduction: 'One.\n\nTwo.', coming: '- Soon.' });
  });

  test('a text without that heading is all introduction', () => {
    expect(splitText('Much is coming.\n')).toEqual({ introduction: 'Much is coming.', coming: null });
  });
});

test('the own authority comes first, then the nearest layer', () => {
  const contact = (name: string) => ({ name, url: null, role: 'Answers', evidence: 'read' as const });
  const layer = (code: string) => ({ code, authorities: [contact(code)], accreditation: [] });
  const sheet = { ...layer('us-ca'), above: [layer('care'), layer('us')] };
  expect(contactsOf(sheet, 'authorities').map(({ name }) => name)).toEqual(['us-ca', 'us', 'care']);
});

test('a text that is cited in several places has one number', () => {
  const cited = (title: string, locator: string): ToldSource => ({ title, publisher: 'P', locator, standing: 'law', evidence: 'read' });
  const { list, numberOf } = citeSources([cited('A', '1'), cited('B', '1'), cited('A', '2')]);
  expect(list.map(({ number, source }) => [number, source.title])).toEqual([
    [1, 'A'],
    [2, 'B'],
  ]);
  expect(numberOf(cited('A', '9'))).toBe(1);
});

test('citations that differ in their place alone stand together; another standing, evidence or passage keeps them apart', () => {
  const cited = (title: string, more: Partial<ToldSource>): ToldSource => ({
    title,
    publisher: 'P',
    standing: 'law',
    evidence: 'read',
    ...more,
  });
  const all = [
    cited('A', { locator: 'Art. 1' }),
    cited('B', { locator: 'Art. 1' }),
    cited('A', { locator: 'Art. 2' }),
    cited('A', { locator: 'Art. 3', evidence: 'memory' }),
    cited('A', { locator: 'Art. 4', standing: 'guidance' }),
    cited('A', { locator: 'Art. 5', passage: 'Each piece' }),
    cited('A', {}),
  ];
  const together = alikeTogether(all);
  expect(together.map(({ title, locator }) => [title, locator])).toEqual([
    ['A', 'Art. 1; Art. 2'],
    ['B', 'Art. 1'],
    ['A', 'Art. 3'],
    ['A', 'Art. 4'],
    ['A', 'Art. 5'],
    ['A', undefined],
  ]);
});
