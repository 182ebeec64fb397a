import { describe, expect, test } from 'vitest';
import { parseCalendarDate } from '@/lib/kernel/calendar-date';
import { sayMoney, sayTolerance, sayUnit } from '@/lib/regions/domain/figure-words';
import { payloadLines } from '@/lib/regions/domain/payload-lines';

describe('figures', () => {
  test('stand as the source gives them', () => {
    expect(sayUnit(0.5, 'ug/mL')).toBe('0.5\u00a0µg/mL');
    expect(sayUnit(0.0000025, 'mg/dm2')).toBe('0.0000025\u00a0mg/dm²');
    expect(sayUnit(3000, 'mL')).toBe('3,000\u00a0mL');
  });

  test('a unit without words of its own stands as it is', () => {
    expect(sayUnit(2, 'oz')).toBe('2\u00a0oz');
  });

  test('money keeps its decimals', () => {
    expect(sayMoney('50000', 'DKK')).toBe('DKK\u00a050,000');
    expect(sayMoney('12.50', 'EUR')).toBe('€12.50');
  });

  test('a tolerance of nothing is left out', () => {
    expect(sayTolerance({ value: 22, plusMinus: 2 }, 'C')).toBe('22\u00a0°C, give or take 2\u00a0°C');
    expect(sayTolerance({ value: 24, plusMinus: 0 }, 'h')).toBe('24\u00a0hours');
  });
});

describe('details of a rule', () => {
  test('a limit says substance, figure, where, and how it is judged, each doubt by its own mark', () => {
    const lines = payloadLines({
      substance: 'Cd',
      part: 'inside',
      per: 'L',
      amount: { value: 0.3, unit: 'mg/L', evidence: 'read' },
      decision: { kind: 'each', specimens: 6, evidence: 'memory', atLimit: 'unclear' },
    });
    expect(lines).toEqual([
      { name: 'Substance', kind: 'text', text: 'Cadmium (Cd)' },
      { name: 'Limit', kind: 'text', text: '0.3\u00a0mg/L; whether exactly this much is within is not settled' },
      { name: 'Measured', kind: 'text', text: 'from the inside, for each litre of test liquid' },
      {
        name: 'How lab figures are judged',
        kind: 'texts',
        texts: ['It holds for each of at least 6 pieces.', 'The texts do not agree on a figure exactly on the limit.'],
        fromMemory: true,
      },
    ]);
  });

  test('the exact words of a label keep their language', () => {
    expect(payloadLines({ words: { da: 'Ikke til mad', en: 'Not for food' }, leastLetterMm: 3.2, permanent: true })).toEqual([
      {
        name: 'Exact words',
        kind: 'quotes',
        quotes: [
          { lang: 'da', language: 'Danish', text: 'Ikke til mad' },
          { lang: 'en', language: 'English', text: 'Not for food' },
        ],
      },
      { name: 'Letters', kind: 'text', text: 'at least 3.2\u00a0mm high' },
      { name: 'How lasting', kind: 'text', text: 'has to last as long as the piece' },
    ]);
  });

  test('a paper lists its fields, a cost its range and its day', () => {
    expect(payloadLines({ document: 'Declaration of compliance', fields: ['Name', 'Date'], yearsKept: 1 })).toMatchObject([
      { name: 'Paper', text: 'Declaration of compliance' },
      { name: 'It states', texts: ['Name', 'Date'] },
      { name: 'Kept for', text: '1 year' },
    ]);
    const asOf = parseCalendarDate('2026-01-31');
    if (asOf === null) throw new Error('not a day');
    expect(payloadLines({ low: 60, high: 90, currency: 'EUR', per: 'specimen', asOf })).toMatchObject([
      { text: '€60 to €90' },
      { text: 'each piece tested' },
      { text: '31 January 2026' },
    ]);
  });

  test('what the source does not say has no line', () => {
    expect(payloadLines({})).toEqual([]);
    expect(payloadLines({ who: 'The importer' })).toEqual([{ name: 'Who', kind: 'text', text: 'The importer' }]);
  });
});
