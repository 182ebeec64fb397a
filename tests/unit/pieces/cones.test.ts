import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { z } from 'zod';
import { parseConesFile } from '@/content/cones/cones-file';
import { conesReaching, nearestCones, readCone, rowOfCone, type ConeChart } from '@/lib/pieces/domain/cone';
import { readConeCharts } from '@/lib/server/cone-charts';
import { factsByRegion } from '../../builders/fact-packs';
import { exampleIds, workedExample } from './worked-examples';

const read = (path: string): string => readFileSync(new URL(path, import.meta.url), 'utf8');
const TEXT = read('../../../content/cones/cones.csv');
const parsed = parseConesFile('cones.csv', TEXT);
if (!parsed.ok) throw new Error(parsed.error.join('\n'));
const CHARTS = new Map(parsed.value.map((chart) => [chart.id, chart]));

function chart(id: string): ConeChart {
  const found = CHARTS.get(id);
  if (found === undefined) throw new Error(`No chart ${id}`);
  return found;
}

const degrees = (id: string): Readonly<Record<string, number>> =>
  Object.fromEntries(chart(id).rows.map(({ cone, celsius }) => [cone, celsius]));

describe('the shipped charts', () => {
  const rows = read('../../fixtures/facts/cones.csv').trim().split('\n').slice(1);

  test.each(rows)('PIECE-9 holds the researched row %s', (row) => {
    const [cone = '', at60 = '', at150 = ''] = row.split(',');
    const evidence = row.includes('[read]') ? 'read' : 'memory';
    const shipped = ['self-supporting-60', 'self-supporting-150'].map((id) => rowOfCone(chart(id), cone));
    expect(shipped).toMatchObject([
      { ok: true, value: { cone, celsius: Number(at60), evidence } },
      { ok: true, value: { cone, celsius: Number(at150), evidence } },
    ]);
  });

  test('PIECE-9 has no row beyond the researched ones', () => {
    expect(chart('self-supporting-60').rows).toHaveLength(rows.length);
    expect(chart('self-supporting-150').rows).toHaveLength(rows.length);
  });

  test('PIECE-9 the large cones of today and of the older chart, figure for figure', () => {
    const values = new Map(factsByRegion.get('care')?.map((fact) => [fact.id, fact.values]));
    expect(degrees('large-60')).toEqual(values.get('cone-08')?.['c_60']);
    expect(degrees('large-150')).toEqual(values.get('cone-08')?.['c_150']);
    expect({ chart: 'older large cone 150 C/h', ...degrees('large-older-150') }).toEqual(values.get('cone-07'));
  });

  test('PIECE-9 the program reads the same charts', async () => {
    expect(await readConeCharts()).toEqual(parsed.value);
  });

  test.each([
    ['another heading', 'cone,c_60\n', 'line 1'],
    ['too few fields', 'self-supporting,06,998\n', 'line 2'],
    ['a cone that is none', 'self-supporting,006,998,1013,read,x\n', 'line 2: cone'],
    ['a kind of cone we do not know', 'seger,06,998,1013,read,x\n', 'line 2: series'],
    ['a temperature with decimals', 'self-supporting,06,998.5,1013,read,x\n', 'line 2: c60'],
    ['no source', 'self-supporting,06,998,1013,read,\n', 'line 2: source'],
    ['no evidence', 'self-supporting,06,998,1013,perhaps,x\n', 'line 2: evidence'],
    ['a cone twice', 'self-supporting,06,998,1013,read,x\nself-supporting,06,999,1014,read,x\n', 'cone 06'],
    ['a cone out of order', 'self-supporting,6,998,1013,read,x\nself-supporting,06,1222,1243,read,x\n', 'cone 06'],
    ['a hotter cone that bends cooler', 'self-supporting,06,998,1013,read,x\nself-supporting,05,990,1044,read,x\n', 'cone 05'],
  ])('PIECE-9 a file with %s is refused', (name, lines, where) => {
    const text = name === 'another heading' ? lines : `chart,cone,c_60,c_150,evidence,source\n${lines}`;
    const faulty = parseConesFile('cones.csv', text);
    expect(faulty.ok ? '' : faulty.error.join('\n')).toContain(where);
  });
});

describe('numbers of cones', () => {
  test.each([
    ['06', '06'], ['6', '6'], [' cone 06 ', '06'], ['Cone 10', '10'], ['Δ6', '6'], ['∆06', '06'], ['△ 9', '9'], ['^6', '6'],
    ['05½', '05.5'], ['05 1/2', '05.5'], ['5.5', '5.5'], ['5,5', '5.5'], ['０６', '06'], ['022', '022'], ['010', '010'], ['cone022', '022'],
  ])('PIECE-10 "%s" is cone %s', (typed, cone) => {
    expect(readCone(typed)).toBe(cone);
  }); // prettier-ignore

  test.each(['', '0', '00', '006', '-6', '+6', '6a', '1000', '6.25', '6 1/4', '043', '027', '43', 'SK 7', '06 or 6', 'NaN', '6 6', '1e1'])(
    'PIECE-10 "%s" is refused',
    (typed) => {
      expect(rowOfCone(chart('self-supporting-60'), typed)).toEqual({ ok: false, error: { kind: 'unknown-cone' } });
    },
  );

  test('PIECE-10 a cone that is not on the chart is refused by name', () => {
    expect(rowOfCone(chart('self-supporting-60'), '03.5')).toEqual({ ok: false, error: { kind: 'not-on-this-chart', cone: '03.5' } });
    expect(rowOfCone(chart('large-60'), '6')).toEqual({ ok: false, error: { kind: 'not-on-this-chart', cone: '6' } });
  });

  test('PIECE-10 the nearest cones on either side, also at the ends', () => {
    const at = (celsius: number) => {
      const { atOrBelow, atOrAbove } = nearestCones(chart('self-supporting-60'), celsius);
      return [atOrBelow?.cone ?? null, atOrAbove?.cone ?? null];
    };
    expect([at(1000), at(998), at(500), at(1400), at(Number.NaN)]).toEqual([['06', '05.5'], ['06', '06'], [null, '022'], ['14', null], [null, null]]); // prettier-ignore
  });
});

const byRate = z.record(z.string(), z.string());
const reach = workedExample(
  'we-cone-01',
  z.object({ threshold_C: z.number(), rates_C_per_h: z.array(z.number()) }),
  z.object({ lowest_incl_half_cones: byRate, lowest_whole_cones: byRate, count_whole: z.record(z.string(), z.number()) }),
);
const answer = z.object({ C: z.number(), ge: z.boolean() });
const three = workedExample(
  'we-cone-03',
  z.object({ cone: z.string(), threshold_C: z.number() }),
  z.object({ self_supporting_60: answer, self_supporting_150: answer, older_single_column_150: answer }),
);

describe('which cones reach a temperature', () => {
  test('PIECE-11 every worked example on cones is a row here or among the units', () => {
    expect(exampleIds(['cones'])).toEqual(['we-cone-01', 'we-cone-02', 'we-cone-03']);
  });

  test.each(reach.inputs.rates_C_per_h)(`PIECE-11 1000 °C at %s °C an hour (${reach.by})`, (rate) => {
    const found = conesReaching(chart(`self-supporting-${rate}`), reach.inputs.threshold_C);
    const { lowest_incl_half_cones: lowest, lowest_whole_cones: lowestWhole, count_whole: count } = reach.expected;
    expect(found.coolest?.cone).toBe(lowest[rate]);
    expect(found.coolestWhole?.cone).toBe(lowestWhole[rate]);
    expect(found.reaching.filter(({ cone }) => !cone.endsWith('.5'))).toHaveLength(count[rate] ?? 0);
    expect(found.evidence).toBe('memory');
  });

  test.each([
    ['self-supporting-60', three.expected.self_supporting_60],
    ['self-supporting-150', three.expected.self_supporting_150],
    ['large-older-150', three.expected.older_single_column_150],
  ])(`PIECE-11 cone 06 on %s (${three.by})`, (id, { C: celsius, ge: reaches }) => {
    const row = rowOfCone(chart(id), three.inputs.cone);
    expect(row.ok && row.value.celsius).toBe(celsius);
    expect(conesReaching(chart(id), three.inputs.threshold_C).reaching.some(({ cone }) => cone === three.inputs.cone)).toBe(reaches);
  });

  test('PIECE-11 on the older chart the deciding rows were read', () => {
    const found = conesReaching(chart('large-older-150'), 1000);
    expect([found.coolest?.cone, found.below?.cone, found.evidence]).toEqual(['05', '06', 'read']);
  });

  test('PIECE-11 a chart that stops below says that none reaches it, and its hottest cone', () => {
    const found = conesReaching(chart('large-60'), 1000);
    expect([found.reaching, found.coolest, found.below?.cone, found.evidence]).toEqual([[], null, '08', null]);
  });

  test('PIECE-11 a temperature that every cone reaches has none below', () => {
    expect(conesReaching(chart('large-60'), 600)).toMatchObject({ coolest: { cone: '019' }, below: null, evidence: 'read' });
  });
});
