import { err, ok, type Result } from '@/lib/kernel/result';
import type { Outline, Point } from './section';

/** The inside of a turned piece, in millimetres: one line from the centre of the inside up to the rim, spun round the axis. */
export type Vessel = {
  /** From the axis to the rim. It neither crosses itself nor stands twice on one point. */
  readonly inner: Outline;
  readonly lowestMm: number;
  /** Height of the plane of the upper rim. */
  readonly rimMm: number;
  /** Height at which it overflows: the rim, or the lowest place of a spout or notch. */
  readonly overflowMm: number;
};

/** The points as they were given, and by how much a spout or notch lies below the rim. */
export type GivenProfile = { readonly points: readonly Point[]; readonly spillsBelowRimMm?: number | undefined };

/** Why a profile is refused. `at` counts the points from zero. */
export type ProfileFault =
  | { readonly kind: 'too-few-points' | 'too-many-points' | 'no-opening' | 'bad-spill' | 'spill-below-floor' }
  | {
      readonly kind:
        'not-a-number' | 'negative-radius' | 'too-large' | 'back-at-centre' | 'crosses-itself' | 'rim-not-highest' | 'rim-covered';
      readonly at: number;
    };

type Mark = { readonly point: Point; readonly at: number };

export const MOST_POINTS = 300;
/** Ten metres: more than any kiln takes. */
const MOST_MM = 10_000;

/**
 * Reads a profile: points from the centre of the inside up to the highest point of the rim. A first point off the axis means a
 * floor that is flat up to it. The floor may be raised or lowered at the centre, the wall may lean in.
 */
export function readVessel({ points, spillsBelowRimMm = 0 }: GivenProfile): Result<Vessel, ProfileFault> {
  if (points.length < 2) return err({ kind: 'too-few-points' });
  if (points.length > MOST_POINTS) return err({ kind: 'too-many-points' });
  const faulty = points.map(pointFault).find((fault) => fault !== null);
  if (faulty !== undefined) return err(faulty);
  const line = fromAxis(points);
  const fault = lineFault(line);
  return fault === null ? withLevels(line, spillsBelowRimMm) : err(fault);
}

function pointFault([radius, height]: Point, at: number): ProfileFault | null {
  if (!Number.isFinite(radius) || !Number.isFinite(height)) return { kind: 'not-a-number', at };
  if (radius < 0) return { kind: 'negative-radius', at };
  return radius > MOST_MM || Math.abs(height) > MOST_MM ? { kind: 'too-large', at } : null;
}

const isSame = ([radius, height]: Point, [otherRadius, otherHeight]: Point): boolean => radius === otherRadius && height === otherHeight;

/** The line from the axis, without points that stand twice (the drawings mark edges so). */
function fromAxis(points: readonly Point[]): readonly Mark[] {
  const marks = points.map((point, at): Mark => ({ point, at }));
  const [first] = marks;
  const floor: readonly Mark[] = first === undefined || first.point[0] === 0 ? [] : [{ point: [0, first.point[1]], at: 0 }];
  const all = [...floor, ...marks];
  return all.filter(({ point }, place) => {
    const before = all[place - 1];
    return before === undefined || !isSame(before.point, point);
  });
}

function lineFault(line: readonly Mark[]): ProfileFault | null {
  const last = line.at(-1);
  if (line.length < 2 || last === undefined) return { kind: 'too-few-points' };
  if (last.point[0] === 0) return { kind: 'no-opening' };
  const back = line.find(({ point }, place) => place > 0 && point[0] === 0);
  if (back !== undefined) return { kind: 'back-at-centre', at: back.at };
  return crossing(line) ?? higherThanRim(line, last.point[1]) ?? coversRim(line, last.point);
}

/** Where the lowest place comes first in the line. */
function placeOfLowest(line: readonly Mark[]): number {
  const lowest = Math.min(...line.map(({ point }) => point[1]));
  return line.findIndex(({ point }) => point[1] === lowest);
}

/** Beyond the lowest place nothing may stand above the rim: the liquid would never reach the rim. */
function higherThanRim(line: readonly Mark[], rim: number): ProfileFault | null {
  const over = line.slice(placeOfLowest(line)).find(({ point }) => point[1] > rim);
  return over === undefined ? null : { kind: 'rim-not-highest', at: over.at };
}

/** A raised centre may stand higher than the rim, but not over it: the wall would lie inside the clay. */
function coversRim(line: readonly Mark[], [rimRadius, rim]: Point): ProfileFault | null {
  const covering = line.slice(0, placeOfLowest(line) + 1).find(({ point: [radius, height] }, place) => {
    const [beforeRadius, beforeHeight] = line[place - 1]?.point ?? [0, height];
    if (height >= rim) return radius >= rimRadius;
    if (beforeHeight <= rim) return false;
    return beforeRadius + ((beforeHeight - rim) / (beforeHeight - height)) * (radius - beforeRadius) >= rimRadius;
  });
  return covering === undefined ? null : { kind: 'rim-covered', at: covering.at };
}

/** Above zero: c lies to the left of the way from a to b. */
const turn = (a: Point, b: Point, c: Point): number => (b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]);

const isWithin = (a: Point, b: Point, c: Point): boolean =>
  Math.min(a[0], b[0]) <= c[0] && c[0] <= Math.max(a[0], b[0]) && Math.min(a[1], b[1]) <= c[1] && c[1] <= Math.max(a[1], b[1]);

function meet(a: Point, b: Point, c: Point, d: Point): boolean {
  const [ofC, ofD, ofA, ofB] = [turn(a, b, c), turn(a, b, d), turn(c, d, a), turn(c, d, b)].map(Math.sign);
  if (ofC !== ofD && ofA !== ofB) return true;
  const touches = (side: number | undefined, from: Point, to: Point, point: Point): boolean => side === 0 && isWithin(from, to, point);
  return touches(ofC, a, b, c) || touches(ofD, a, b, d) || touches(ofA, c, d, a) || touches(ofB, c, d, b);
}

/** The way back over the stretch just drawn. */
function doublesBack(a: Point, b: Point, c: Point): boolean {
  return turn(a, b, c) === 0 && (b[0] - a[0]) * (c[0] - b[0]) + (b[1] - a[1]) * (c[1] - b[1]) < 0;
}

function crossing(line: readonly Mark[]): ProfileFault | null {
  const stretches = line.slice(1).flatMap((to, place) => {
    const from = line[place];
    return from === undefined ? [] : [{ from: from.point, to: to.point, at: to.at }];
  });
  const crossed = stretches.find(({ from, to }, place) => {
    const before = stretches[place - 1];
    const earlier = stretches.slice(0, Math.max(0, place - 1));
    return (before !== undefined && doublesBack(before.from, from, to)) || earlier.some((other) => meet(other.from, other.to, from, to));
  });
  return crossed === undefined ? null : { kind: 'crosses-itself', at: crossed.at };
}

function withLevels(line: readonly Mark[], spillsBelowRimMm: number): Result<Vessel, ProfileFault> {
  if (!Number.isFinite(spillsBelowRimMm) || spillsBelowRimMm < 0) return err({ kind: 'bad-spill' });
  const inner = line.map(({ point }) => point);
  const lowestMm = Math.min(...inner.map(([, height]) => height));
  const rimMm = inner.at(-1)?.[1] ?? lowestMm;
  const overflowMm = rimMm - spillsBelowRimMm;
  return overflowMm < lowestMm ? err({ kind: 'spill-below-floor' }) : ok({ inner, lowestMm, rimMm, overflowMm });
}
