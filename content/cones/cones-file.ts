import { z } from 'zod';
import { err, ok, type Result } from '@/lib/kernel/result';
import { coneRank, readCone, type ConeChart, type ConeRow } from '@/lib/pieces/domain/cone';

const HEADER = 'chart,cone,c_60,c_150,evidence,source';
const RATES = [60, 150] as const;

const celsius = z
  .string()
  .regex(/^(\d{3,4})?$/, 'a temperature is three or four digits, or empty where the chart has none')
  .transform((text) => (text === '' ? null : Number(text)));

const line = z.strictObject({
  series: z.enum(['self-supporting', 'large', 'large-older']),
  cone: z.string().refine((text) => readCone(text) === text, { error: 'this is no number of a cone' }),
  c60: celsius,
  c150: celsius,
  evidence: z.enum(['read', 'memory']),
  source: z.string().min(1, 'a row needs its source'),
});
type Line = z.output<typeof line>;

/** What is wrong with the file: one line a fault, with file, line and words. */
export type ConeFileFaults = readonly string[];

/** "a,b,"c, d"" as its fields. The last one may stand in quotation marks. */
const FIELDS = /^([^,"]*),([^,"]*),([^,"]*),([^,"]*),([^,"]*),(?:"([^"]*)"|([^,"]*))$/;

function lineOf(file: string, text: string, number: number): Result<Line, string> {
  const fields = FIELDS.exec(text);
  if (fields === null) return err(`${file}, line ${number}: this is not six fields`);
  const [, series, cone, c60, c150, evidence, quoted, plain] = fields;
  const read = line.safeParse({ series, cone, c60, c150, evidence, source: quoted ?? plain });
  if (read.success) return ok(read.data);
  return err(
    `${file}, line ${number}: ${read.error.issues.map(({ path, message }) => `${path.map(String).join('/')}: ${message}`).join('; ')}`,
  );
}

/** The charts out of the text of `cones.csv`: one for each kind of cone and rate that has figures. */
export function parseConesFile(file: string, text: string): Result<readonly ConeChart[], ConeFileFaults> {
  const [header, ...rest] = text.trimEnd().split(/\r?\n/);
  if (header !== HEADER) return err([`${file}, line 1: the fields are ${HEADER}`]);
  const read = rest.map((one, place) => lineOf(file, one, place + 2));
  const faults = read.flatMap((one) => (one.ok ? [] : [one.error]));
  if (faults.length > 0) return err(faults);
  const charts = chartsOf(read.flatMap((one) => (one.ok ? [one.value] : [])));
  const disorder = charts.flatMap((chart) => disorderOf(file, chart));
  return disorder.length > 0 ? err(disorder) : ok(charts);
}

function chartsOf(lines: readonly Line[]): readonly ConeChart[] {
  const series = [...new Set(lines.map((one) => one.series))];
  return series.flatMap((name) =>
    RATES.flatMap((celsiusAnHour): readonly ConeChart[] => {
      const rows = lines.filter((one) => one.series === name).flatMap((one) => rowOf(one, celsiusAnHour === 60 ? one.c60 : one.c150));
      return rows.length === 0 ? [] : [{ id: `${name}-${celsiusAnHour}`, series: name, celsiusAnHour, rows }];
    }),
  );
}

const rowOf = ({ cone, evidence, source }: Line, degrees: number | null): readonly ConeRow[] =>
  degrees === null ? [] : [{ cone, celsius: degrees, evidence, source }];

/** Each cone of a chart is the next in number and bends hotter than the one before. */
function disorderOf(file: string, { id, rows }: ConeChart): ConeFileFaults {
  return rows.slice(1).flatMap((row, place) => {
    const before = rows[place];
    if (before === undefined || (coneRank(before.cone) < coneRank(row.cone) && before.celsius < row.celsius)) return [];
    return [`${file}, chart ${id}: cone ${row.cone} must come after cone ${before.cone} and bend hotter`];
  });
}
