import { scaleLog } from 'd3-scale';

type Figure = { readonly value: number | string; readonly unit: string };

/** What a chart needs of a verdict. */
export type ChartVerdict = {
  readonly substance: string;
  readonly part: string;
  readonly strength: string | null;
  readonly status: string;
  readonly limit: Figure | null;
  readonly compared: Figure | null;
  readonly rule: string | null;
};

export type ChartRegion = { readonly code: string; readonly verdicts: readonly ChartVerdict[] };

/** A place on the paper runs from 0, the least figure shown, to 1, the largest. */
export type ChartRow = {
  readonly code: string;
  readonly rule: string | null;
  readonly strength: string | null;
  readonly status: string;
  readonly limit: Figure;
  readonly limitAt: number;
  readonly compared: Figure | null;
  /** Null where there is no figure in this unit. A reading of nothing at all lies at 0, where a logarithmic scale never gets. */
  readonly comparedAt: number | null;
  /** The figure rests on a reading below detection: it is the most there can be. */
  readonly below: boolean;
};

export type Chart = {
  readonly substance: string;
  readonly part: string;
  /** Limits and readings of a chart share this unit. */
  readonly unit: string;
  readonly least: number;
  readonly most: number;
  readonly ticks: readonly { readonly value: number; readonly at: number }[];
  readonly rows: readonly ChartRow[];
};

/** Units that measure the same, each as a multiple of the one a chart is drawn in. For drawing alone: nothing is decided by these. */
const DRAWN: Readonly<Record<string, readonly [unit: string, factor: number]>> = {
  'mg/L': ['mg/L', 1],
  'ug/mL': ['mg/L', 1],
  'ug/L': ['mg/L', 0.001],
  ppm: ['mg/L', 1],
  ppb: ['mg/L', 0.001],
  'mg/dm2': ['mg/dm2', 1],
  'ug/cm2': ['mg/dm2', 0.1],
  'ug/dm2': ['mg/dm2', 0.001],
  'mg/article': ['mg/article', 1],
  'ug/article': ['mg/article', 0.001],
  'mg/kg': ['mg/kg', 1],
  '%': ['mg/kg', 10_000],
  percent: ['mg/kg', 10_000],
};

type Drawn = { readonly unit: string; readonly value: number };

function drawn(figure: Figure | null, part: string): Drawn | null {
  if (figure === null) return null;
  const [named, factor] = DRAWN[figure.unit] ?? [figure.unit, 1];
  // Of mass when the part is the material itself, of test liquid else.
  const unit = part === 'content' && (figure.unit === 'ppm' || figure.unit === 'ppb') ? 'mg/kg' : named;
  const value = Number(figure.value) * factor;
  return Number.isFinite(value) ? { unit, value } : null;
}

type Marked = { readonly code: string; readonly verdict: ChartVerdict; readonly limit: Drawn; readonly compared: Drawn | null };

/**
 * Charts of some verdicts, one for each substance, part and unit: each place's limit as a tick and the reading as a line, on a
 * logarithmic scale. `isBelow` tells whether a reading of that substance and part was below detection.
 */
export function chartsOf(regions: readonly ChartRegion[], isBelow: (substance: string, part: string) => boolean): readonly Chart[] {
  const marks = regions.flatMap(({ code, verdicts }) => verdicts.flatMap((verdict) => markOf(code, verdict)));
  const groups = new Map<string, Marked[]>();
  for (const mark of marks) {
    const key = JSON.stringify([mark.verdict.substance, mark.verdict.part, mark.limit.unit]);
    groups.set(key, [...(groups.get(key) ?? []), mark]);
  }
  return [...groups.values()].flatMap((group) => chartOf(group, isBelow));
}

function markOf(code: string, verdict: ChartVerdict): readonly Marked[] {
  const limit = drawn(verdict.limit, verdict.part);
  // A limit of nothing has no place on a logarithmic scale; the table has it.
  if (limit === null || limit.value <= 0) return [];
  const compared = drawn(verdict.compared, verdict.part);
  return [{ code, verdict, limit, compared: compared?.unit === limit.unit ? compared : null }];
}

function chartOf(group: readonly Marked[], isBelow: (substance: string, part: string) => boolean): readonly Chart[] {
  const [first] = group;
  if (first === undefined) return [];
  const { substance, part } = first.verdict;
  const figures = group.flatMap(({ limit, compared }) => [
    limit.value,
    ...(compared !== null && compared.value > 0 ? [compared.value] : []),
  ]);
  const [least, most] = decadesAround(Math.min(...figures), Math.max(...figures));
  const scale = scaleLog().domain([least, most]).range([0, 1]).clamp(true);
  const at = (value: number): number => (value <= 0 ? 0 : scale(value));
  return [
    {
      substance,
      part,
      unit: first.limit.unit,
      least,
      most,
      ticks: decades(least, most).map((value) => ({ value, at: at(value) })),
      rows: group.map(({ code, verdict, limit, compared }) => ({
        code,
        rule: verdict.rule,
        strength: verdict.strength,
        status: verdict.status,
        limit: { value: limit.value, unit: limit.unit },
        limitAt: at(limit.value),
        compared,
        comparedAt: compared === null ? null : at(compared.value),
        below: compared !== null && isBelow(substance, part),
      })),
    },
  ];
}

/** Whole powers of ten with room on both sides, so that no mark lies on the edge. */
function decadesAround(least: number, most: number): readonly [number, number] {
  const from = Math.ceil(Math.log10(least)) - 1;
  const to = Math.floor(Math.log10(most)) + 1;
  return [powerOfTen(from), powerOfTen(Math.max(to, from + 1))];
}

/** Read from its decimal text: 10 ** -3 is not exactly the number written 0.001 everywhere. */
const powerOfTen = (exponent: number): number => Number(`1e${String(exponent)}`);

const MOST_TICKS = 6;

function decades(least: number, most: number): readonly number[] {
  const [from, to] = [Math.round(Math.log10(least)), Math.round(Math.log10(most))];
  const step = Math.max(1, Math.ceil((to - from) / MOST_TICKS));
  return Array.from({ length: Math.floor((to - from) / step) + 1 }, (_, place) => powerOfTen(from + place * step));
}

type Below = { readonly substance: string; readonly part: string; readonly below: boolean };

/** Whether a figure rests on a reading below detection. A lid's reading counts for its vessel too: many places add the two. */
export function belowAmong(rows: readonly Below[]): (substance: string, part: string) => boolean {
  return (substance, part) =>
    rows.some((row) => row.below && row.substance === substance && (row.part === part || (row.part === 'lid' && part === 'vessel')));
}
