import { err, ok, type Result } from '@/lib/kernel/result';
import type { Evidence } from './region-measures';

/** The number of a cone as potters write it: "06", "6", "05.5". A zero in front makes it another, cooler cone. */
export type ConeNumber = string;

export type ConeRow = {
  readonly cone: ConeNumber;
  readonly celsius: number;
  readonly evidence: Evidence;
  readonly source: string;
};

export type ConeSeries = 'self-supporting' | 'large' | 'large-older';

/** One column of one chart: a kind of cone heated at one rate over the last 100 °C. Without both, a cone has no temperature. */
export type ConeChart = {
  readonly id: string;
  readonly series: ConeSeries;
  readonly celsiusAnHour: number;
  /** From the coolest cone to the hottest. */
  readonly rows: readonly ConeRow[];
};

const SHAPE = /^(?:0[1-9]|02[0-6]|01\d|[1-9]|[1-3]\d|4[0-2])(?:\.5)?$/;

/** "cone 06", "Δ6", "05½", "5 1/2" as a cone's number. Null where it is none; a zero in front is never lost or added. */
export function readCone(typed: string): ConeNumber | null {
  const text = typed
    .replaceAll('½', ' 1/2')
    .normalize('NFKC')
    .trim()
    .replace(/^(?:cone|[∆Δ△▲^])\s*/iu, '')
    .replace(/\s*1\/2$/, '.5')
    .replace(',', '.');
  return SHAPE.test(text) ? text : null;
}

/** Where a cone stands among all: below zero for those with a zero in front, the coolest furthest. "05.5" is cooler than "05". */
export const coneRank = (cone: ConeNumber): number => (cone.startsWith('0') ? -Number(cone) : Number(cone));

export const isHalfCone = (cone: ConeNumber): boolean => cone.endsWith('.5');

export type ConeFault = { readonly kind: 'unknown-cone' } | { readonly kind: 'not-on-this-chart'; readonly cone: ConeNumber };

/** The temperature at which a cone bends on one chart. */
export function rowOfCone(chart: ConeChart, typed: string): Result<ConeRow, ConeFault> {
  const cone = readCone(typed);
  if (cone === null) return err({ kind: 'unknown-cone' });
  const row = chart.rows.find((one) => one.cone === cone);
  return row === undefined ? err({ kind: 'not-on-this-chart', cone }) : ok(row);
}

/** The cones on either side of a temperature; both the same where it is a cone's own. Null beyond an end of the chart. */
export type NearestCones = { readonly atOrBelow: ConeRow | null; readonly atOrAbove: ConeRow | null };

export function nearestCones({ rows }: ConeChart, celsius: number): NearestCones {
  return {
    atOrBelow: rows.findLast((row) => row.celsius <= celsius) ?? null,
    atOrAbove: rows.find((row) => row.celsius >= celsius) ?? null,
  };
}

/** Which cones of a chart reach a temperature. */
export type ReachingCones = {
  readonly reaching: readonly ConeRow[];
  readonly coolest: ConeRow | null;
  /** Leaving out half cones, which not every supplier sells. */
  readonly coolestWhole: ConeRow | null;
  /** The hottest cone that does not reach it; without one, a cooler cone that is not on our chart might. */
  readonly below: ConeRow | null;
  /** Memory as soon as one of the rows that decide is from memory; null where none reaches it. */
  readonly evidence: Evidence | null;
};

export function conesReaching({ rows }: ConeChart, celsius: number): ReachingCones {
  const reaching = rows.filter((row) => row.celsius >= celsius);
  const below = rows.findLast((row) => row.celsius < celsius) ?? null;
  const coolest = reaching[0] ?? null;
  const coolestWhole = reaching.find(({ cone }) => !isHalfCone(cone)) ?? null;
  const deciding = [coolest, coolestWhole, below].filter((row) => row !== null);
  const isRead = deciding.every((row) => row.evidence === 'read');
  return { reaching, coolest, coolestWhole, below, evidence: coolest === null ? null : isRead ? 'read' : 'memory' };
}
