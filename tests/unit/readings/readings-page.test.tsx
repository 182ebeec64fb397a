import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, test } from 'vitest';
import { ReadingsForm } from '@/components/readings/readings-form';
import { ReadingsResult } from '@/components/readings/readings-result';
import { sheetFaultWords } from '@/components/readings/sheet-fault-words';
import { SubstanceLimitsTable } from '@/components/regions/substance-limits';
import { belowAmong, chartsOf } from '@/lib/readings/domain/chart';
import { regionVerdicts } from '@/lib/readings/domain/region-verdicts';
import { readSheetEntry } from '@/lib/readings/domain/sheet-entry';
import type { SheetFields } from '@/lib/readings/domain/sheet-id';
import { START_FIELDS } from '@/lib/readings/domain/start-fields';
import { verdictInput } from '@/lib/readings/schema';
import { answersInput } from '@/lib/checks/schema';
import { aDate, seedLine, seedSheets } from '@/tests/builders/seed-sheets';

const ON = aDate('2026-12-01');
const CODES = [...seedSheets.values()].filter(({ kind }) => kind !== 'base').map(({ code }) => code);
const placeNames = new Map([...seedSheets.values()].map(({ code, name }) => [code, name]));
const places = CODES.map((code) => ({ code, name: placeNames.get(code) ?? code, line: seedLine(code, ON).line.layers }));

const MUG: SheetFields = {
  ...START_FIELDS,
  region: CODES,
  use: ['food'],
  form: ['mug'],
  'holds-liquid': ['yes'],
  'depth-mm': ['95'],
  'capacity-ml': ['350'],
  'readings.value.1': ['0,31'],
  'readings.value.2': ['0.01'],
  'readings.below.2': ['yes'],
  'readings.pasted': ['Sample;Part;Element;Result (mg/L);Remark\nA;rim;Pb;0,2;blue\nB;lid;Co;0.4;'],
};

function resultOf(fields: SheetFields) {
  const entry = readSheetEntry(fields);
  const { regions, answers, rows, extracts, conditions } = entry;
  const report = verdictInput(answersInput).parse({
    regions: regions.slice(0, 30), // as many as one may ask for at a time; drawn for all of them below
    answers,
    readings: rows.readings,
    furtherPieces: rows.further,
    extracts,
    conditions,
  });
  return { entry, verdicts: CODES.map((code) => regionVerdicts(seedLine(code, ON), answers, report, ON)) };
}

const drawForm = (fields: SheetFields): string => {
  const entry = readSheetEntry(fields);
  const act = () => Promise.resolve();
  return renderToStaticMarkup(
    <ReadingsForm address="A" view={{ fields, entry, faults: entry.faults }} places={places} submit="Go" act={act} />,
  );
};
const said = (html: string): string => html.replaceAll(/<[^>]+>/g, ' ');

describe('the page of readings', () => {
  test('ENTRY-4 the form shows again all that was typed, and every field has a name and an id of its own', () => {
    const html = drawForm({ ...MUG, 'depth-mm': ['about "sixty"'], 'further.value.1': ['1.234'] });
    expect(html).toContain('value="about &quot;sixty&quot;"');
    expect(html).toContain('value="1.234"');
    const ids = [...html.matchAll(/ id="([^"]+)"/g)].map(([, id]) => id);
    expect(ids.filter((id, place) => ids.indexOf(id) < place)).toEqual([]);
    expect([...html.matchAll(/href="#([^"]+)"/g)].filter(([, id]) => !ids.includes(id))).toEqual([]);
    expect(html.match(/<option[^>]*selected=""[^>]*>Mug/)).not.toBeNull();
  });

  test('ENTRY-5 every fault has words, whatever it is', () => {
    const fields: SheetFields = {
      ...MUG,
      region: [],
      on: ['2026-02-30'],
      use: ['perhaps'],
      'volume-lid': ['much'],
      hours: ['long'],
      'profile.radius.1': ['x'],
      'profile.height.1': ['1'],
      'profile.spill': ['y'],
      'further.pasted': ['remark'],
      'readings.value.3': ['1'],
    };
    const { faults } = readSheetEntry(fields);
    expect(faults.length).toBeGreaterThan(8);
    for (const fault of faults) expect(sheetFaultWords(fault)).toMatch(/^[A-Z“].* .* /);
    expect(said(drawForm(fields))).toMatch(/entries need another look/);
  });

  test('ENTRY-3 the preview tells the heading, what was understood and the column nobody knows', () => {
    const text = said(drawForm(MUG));
    expect(text).toMatch(/2 lines were understood, none was not/);
    expect(text).toMatch(/Not read, as we do not know these columns: Remark/);
    expect(text).toMatch(/Piece B, Lid, Cobalt \(Co\): 0\.4/);
  });

  test('the result shows each place a status word, a limit, what was compared and whom to ask, and never calls a pot harmless', () => {
    const { entry, verdicts } = resultOf(MUG);
    const html = renderToStaticMarkup(<ReadingsResult regions={verdicts} on={ON} entry={entry} placeNames={placeNames} />);
    const text = said(html);
    for (const code of CODES) expect(text).toContain(`Whom to ask in ${placeNames.get(code) ?? ''}`);
    expect(text).toMatch(/This list is not proof/);
    expect(text).toMatch(/Compared: 0\.31/);
    expect(text).toMatch(/at most 0\.01/);
    expect(text).toMatch(/Within the limit|Test more pieces/);
    expect(text).toMatch(/We found no limit/);
    expect(text).not.toMatch(/\b(food-safe|compliant|certified)\b/i);
    const ids = [...html.matchAll(/ id="([^"]+)"/g)].map(([, id]) => id);
    expect(ids.filter((id, place) => ids.indexOf(id) < place)).toEqual([]);
  });

  test('ENTRY-6 every limit that was compared stands in a chart, inside its frame', () => {
    const { entry, verdicts } = resultOf(MUG);
    const charts = chartsOf(verdicts, belowAmong(entry.rows.readings));
    const limits = verdicts.flatMap(({ verdicts: list }) => list.filter(({ limit }) => limit !== null));
    expect(charts.flatMap(({ rows }) => rows)).toHaveLength(limits.length);
    for (const { rows } of charts) {
      for (const { limitAt, comparedAt } of rows) expect([limitAt > 0 && limitAt < 1, (comparedAt ?? 0) >= 0 && (comparedAt ?? 1) <= 1]).toEqual([true, true]); // prettier-ignore
    }
    expect(charts.find(({ substance, part }) => substance === 'Cd' && part === 'vessel')?.rows.some(({ below }) => below)).toBe(true);
  });

  test('the page of a substance without any limit says so', () => {
    const none = {
      places: [],
      above: [{ code: 'dk', name: 'Denmark', layers: ['European Union'] }],
      notFound: [{ code: 'jp', name: 'Japan' }],
    };
    const text = said(renderToStaticMarkup(<SubstanceLimitsTable limits={none} name="Uranium (U)" />));
    expect(text).toMatch(/We found no limit on Uranium \(U\) in any place/);
    expect(text).toMatch(/Denmark\s+takes over from European Union/);
    expect(text).toMatch(/That is not the same as none/);
  });
});
