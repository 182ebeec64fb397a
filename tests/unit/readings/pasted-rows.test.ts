import { describe, expect, test } from 'vitest';
import { MOST_ROWS, readPasted, rowsOf } from '@/lib/readings/domain/pasted-rows';

const row = (over: object) => ({ specimen: 'A', part: 'vessel', substance: 'Pb', value: '0.31', unit: 'mg/L', below: false, ...over });
const only = (text: string) => readPasted(text)[0];
const why = (text: string) => {
  const line = only(text);
  return line?.kind === 'not-understood' ? line.why : line?.kind;
};

describe('ENTRY-1 rows pasted from a spreadsheet are read as a person would read them', () => {
  test.each([
    ['tabs, without a heading', 'A\tPb\t0,31\tmg/L'],
    ['semicolons and a decimal comma', 'A;Pb;0,31;mg/l'],
    ['commas and a decimal point', 'A,Pb,0.31,mg/L'],
    ['commas and quotation marks', 'A,Pb,"0,31",mg/L'],
    ['with the part', 'A;vessel;lead;0.31;mg/L'],
    ['the unit behind the figure', 'A;Lead (Pb);0.31 mg/L'],
    ['no break space and full-width digits', 'A;Pb;０．３１;\u00a0mg/L'],
    ['not below, said so', 'A;Pb;0.31;mg/L;no'],
  ])('%s', (_, text) => {
    expect(rowsOf(readPasted(text))).toEqual([row({})]);
  });

  test.each([
    ['Sample No.;Element;Result (mg/L)\nA;Pb;0,31'],
    ['Unit;Result;Analyte;Specimen\nmg/L;0,31;Pb;A'],
    ['SPECIMEN\tPart\tSubstance\tValue\tUnit\tBelow\nA\tinside\tPb\t0.31\tmg/L\t'],
  ])('words of a heading are forgiven and give the order: %s', (text) => {
    const [heading, ...rows] = readPasted(text);
    expect(heading).toMatchObject({ kind: 'heading', line: 1, ignored: [] });
    expect(rowsOf(rows)).toEqual([row({})]);
  });

  test('a column nobody here knows is named, not dropped in silence', () => {
    const [heading, first] = readPasted('Sample;Element;Result;Unit;Lab temperature\nA;Pb;0,31;mg/L;21 C');
    expect(heading).toMatchObject({ kind: 'heading', ignored: ['Lab temperature'] });
    expect(first).toMatchObject({ kind: 'understood', row: row({}) });
  });

  test.each([
    ['a sign', 'A;Pb;< 0,01;mg/L'],
    ['a full-width sign', 'A;Pb;＜0.01;mg/L'],
    ['a column', 'A;Pb;0.01;mg/L;yes'],
  ])('ENTRY-2 below detection by %s keeps the most there can be', (_, text) => {
    expect(rowsOf(readPasted(text))).toEqual([row({ value: '0.01', below: true })]);
  });

  test.each([
    ['µg/mL', 'ug/mL'],
    ['μg/mL', 'ug/mL'],
    ['ug/ml', 'ug/mL'],
    ['MG/DM²', 'mg/dm2'],
    ['µg/cm²', 'ug/cm2'],
    ['mg/kg', 'mg/kg'],
    ['%', '%'],
    ['PPM', 'ppm'],
  ])('the unit %s is %s', (typed, unit) => {
    expect(rowsOf(readPasted(`A;Pb;1;${typed}`))).toEqual([row({ value: '1', unit })]);
  });
});

describe('ENTRY-3 a line that is not understood says why and is not guessed', () => {
  test.each([
    ['A;Pb;1.234;mg/L', 'thousands-unclear'],
    ['A;Pb;1.234,5;mg/L', 'not-a-number'],
    ['A;Pb;1e309;mg/L', 'not-a-number'],
    ['A;Pb;NaN;mg/L', 'not-a-number'],
    ['A;Pb;-0.1;mg/L', 'not-a-number'],
    [`A;Pb;${'9'.repeat(400)};mg/L`, 'not-a-number'],
    ['A;Pb;n.d.;mg/L', 'not-a-number'],
    ['A;Pb;;mg/L', 'no-value'],
    ['A;Pb;0.31;', 'no-unit'],
    ['A;Pb;0.31;mg', 'unknown-unit'],
    ['A;Pb;0.31 mg/L;ug/L', 'two-units'],
    ['A;Pb;0.31;mg/L;perhaps', 'unknown-below'],
    [';Pb;0.31;mg/L', 'no-specimen'],
    ['A;kryptonite;0.31;mg/L', 'columns'],
    ['A;Pb;0.31;mg/L;no;more', 'columns'],
    ['A,Pb,0,31,mg/L', 'unknown-unit'],
    ['Sample;Part;Element;Result;Unit\nA;handle;Pb;0.3;mg/L', 'heading'],
    ['nothing of this is a row', 'columns'],
  ])('%s: %s', (text, said) => {
    expect(why(text)).toBe(said);
  });

  test('with a heading each missing cell is named', () => {
    const lines = readPasted('Sample;Part;Element;Result;Unit\nA;handle;Pb;0.3;mg/L\nB;;xx;0.3;mg/L\nC;;;0.3;mg/L\nD;;Pb;0.3;mg/L;stray');
    expect(lines.slice(1).map((line) => (line.kind === 'not-understood' ? line.why : line.kind))).toEqual([
      'unknown-part',
      'unknown-substance',
      'no-substance',
      'columns',
    ]);
  });

  test('every line that is not empty comes back with its number and its words', () => {
    const text = 'Sample;Element;Result;Unit\r\nA;Pb;0.31;mg/L\r\n\r\n  \r\nremark: see page 2\r\nB;Cd;<0.01;mg/L';
    expect(readPasted(text).map(({ line, kind }) => [line, kind])).toEqual([
      [1, 'heading'],
      [2, 'understood'],
      [5, 'not-understood'],
      [6, 'understood'],
    ]);
    expect(readPasted(text)[2]?.text).toBe('remark: see page 2');
  });

  test('what is more than a sheet can take is said, line by line', () => {
    const text = Array.from({ length: MOST_ROWS + 2 }, (_, place) => `S${String(place)};Pb;0.1;mg/L`).join('\n');
    const lines = readPasted(text);
    expect(rowsOf(lines)).toHaveLength(MOST_ROWS);
    expect(lines.slice(-2)).toMatchObject([{ why: 'too-many' }, { why: 'too-many' }]);
  });

  test('nothing pasted is nothing read', () => {
    expect(readPasted('')).toEqual([]);
    expect(readPasted(' \n\t\n')).toEqual([]);
  });
});
