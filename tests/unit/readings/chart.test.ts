import { describe, expect, test } from 'vitest';
import { chartsOf, type ChartVerdict } from '@/lib/readings/domain/chart';

const verdict = (over: Partial<ChartVerdict>): ChartVerdict => ({
  substance: 'Pb',
  part: 'vessel',
  strength: 'must',
  status: 'within',
  limit: { value: 4, unit: 'mg/L' },
  compared: { value: '0.31', unit: 'mg/L' },
  rule: 'eu-pb-cat2',
  ...over,
});
const measured = () => false;

describe('ENTRY-6 a chart shows each limit as a tick and the reading as a line', () => {
  test('on one scale of powers of ten that holds every figure of every place', () => {
    const [chart] = chartsOf(
      [
        { code: 'eu', verdicts: [verdict({})] },
        { code: 'us', verdicts: [verdict({ limit: { value: 0.5, unit: 'ug/mL' }, compared: { value: '0.31', unit: 'ug/mL' } })] },
      ],
      measured,
    );
    expect(chart).toMatchObject({ substance: 'Pb', part: 'vessel', unit: 'mg/L', least: 0.1, most: 10 });
    expect(chart?.ticks.map(({ value }) => value)).toEqual([0.1, 1, 10]);
    expect(chart?.ticks.map(({ at }) => Number(at.toFixed(9)))).toEqual([0, 0.5, 1]);
    expect(chart?.rows.map(({ code }) => code)).toEqual(['eu', 'us']);
    const [eu, us] = chart?.rows ?? [];
    expect(eu?.limitAt).toBeGreaterThan(us?.limitAt ?? 1);
    expect(eu?.comparedAt).toBeCloseTo(us?.comparedAt ?? 1, 12);
    expect(us?.comparedAt ?? 1).toBeLessThan(us?.limitAt ?? 0);
  });

  test('limits in units that measure different things stand in charts of their own', () => {
    const charts = chartsOf(
      [{ code: 'eu', verdicts: [verdict({}), verdict({ limit: { value: 0.8, unit: 'mg/dm2' }, compared: null })] }],
      measured,
    );
    expect(charts.map(({ unit }) => unit)).toEqual(['mg/L', 'mg/dm2']);
    expect(charts[1]?.rows[0]).toMatchObject({ compared: null, comparedAt: null, below: false });
  });

  test('a figure below detection is told apart, and nothing at all lies at the edge', () => {
    const [chart] = chartsOf([{ code: 'eu', verdicts: [verdict({ compared: { value: '0', unit: 'mg/L' } })] }], () => true);
    expect(chart?.rows[0]).toMatchObject({ comparedAt: 0, below: true });
  });

  test('a limit exactly on a power of ten does not lie on the edge', () => {
    const [chart] = chartsOf([{ code: 'eu', verdicts: [verdict({ limit: { value: 1, unit: 'mg/L' }, compared: null })] }], measured);
    expect(chart).toMatchObject({ least: 0.1, most: 10 });
    expect(chart?.rows[0]?.limitAt).toBeCloseTo(0.5, 9);
  });

  test('no limit, a limit of nothing and an unreadable figure draw nothing', () => {
    const odd = [
      verdict({ limit: null }),
      verdict({ limit: { value: 0, unit: 'mg/L' } }),
      verdict({ limit: { value: 'much', unit: 'mg/L' } }),
    ];
    expect(chartsOf([{ code: 'eu', verdicts: odd }], measured)).toEqual([]);
  });

  test('parts in a million count as of the liquid, or of the mass where the material was read', () => {
    const charts = chartsOf(
      [{ code: 'eu', verdicts: [verdict({ part: 'content', limit: { value: 90, unit: 'ppm' }, compared: { value: '0.01', unit: '%' } })] }],
      measured,
    );
    expect(charts[0]).toMatchObject({ unit: 'mg/kg', rows: [{ compared: { value: 100, unit: 'mg/kg' } }] });
  });
});
