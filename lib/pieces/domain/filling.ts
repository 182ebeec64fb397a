import type { Outline, Point } from './section';
import type { Vessel } from './vessel';

/** A straight stretch of the inner line, in the order it was drawn. */
type Stretch = { readonly from: Point; readonly to: Point };

const stretchesOf = (inner: Outline): readonly Stretch[] =>
  inner.slice(1).flatMap((to, place): readonly Stretch[] => {
    const from = inner[place];
    return from === undefined ? [] : [{ from, to }];
  });

/** Where a stretch passes a height, interpolated within it and not taken from the nearest point given. */
function placeAt({ from, to }: Stretch, height: number): Point {
  const part = (height - from[1]) / (to[1] - from[1]);
  return [from[0] + part * (to[0] - from[0]), height];
}

/** What of a stretch lies below a level. One that lies on it, or above, is not below. */
function below(stretch: Stretch, level: number): readonly Stretch[] {
  const { from, to } = stretch;
  const [isFromBelow, isToBelow] = [from[1] < level, to[1] < level];
  if (!isFromBelow && !isToBelow) return [];
  return [{ from: isFromBelow ? from : placeAt(stretch, level), to: isToBelow ? to : placeAt(stretch, level) }];
}

const belowAll = (inner: Outline, level: number): readonly Stretch[] => stretchesOf(inner).flatMap((stretch) => below(stretch, level));

/** The cut cone under a stretch; below zero where the line runs down, as it does on the flank of a raised centre. */
function coneMm3({ from: [radius, low], to: [other, high] }: Stretch): number {
  return ((high - low) * Math.PI * (radius * radius + radius * other + other * other)) / 3;
}

function bandMm2({ from: [radius, low], to: [other, high] }: Stretch): number {
  return Math.PI * (radius + other) * Math.hypot(other - radius, high - low);
}

const total = (parts: readonly Stretch[], measure: (stretch: Stretch) => number): number =>
  parts.reduce((sum, part) => sum + measure(part), 0);

/** What it holds filled to a height, in millilitres: a stack of cut cones, exact where the wall is drawn straight. */
export function capacityToMl({ inner }: Vessel, level: number): number {
  return Math.max(0, total(belowAll(inner, level), coneMm3)) / 1000;
}

/** What it holds when it is about to overflow. */
export const brimfulMl = (vessel: Vessel): number => capacityToMl(vessel, vessel.overflowMm);

/** The surface that the liquid wets when it stands at a height. No lid of liquid is counted. */
export const wettedAreaMm2 = ({ inner }: Vessel, level: number): number => total(belowAll(inner, level), bandMm2);

/** The whole inside from the centre to the rim. */
export const insideAreaMm2 = ({ inner }: Vessel): number => total(stretchesOf(inner), bandMm2);

/** The free surface of the liquid at a height: a disc, or a ring round a centre that stands out of it. */
export function meniscusAreaMm2({ inner }: Vessel, level: number): number {
  const passed = stretchesOf(inner).flatMap((stretch) => {
    const [from, to] = [stretch.from[1], stretch.to[1]];
    if (level <= Math.min(from, to) || level > Math.max(from, to)) return [];
    const [radius] = placeAt(stretch, level);
    return [(from < to ? 1 : -1) * Math.PI * radius * radius];
  });
  return passed.reduce((sum, area) => sum + area, 0);
}

/** The circle of the rim, as one traces it on paper. */
export function tracedRimAreaMm2({ inner }: Vessel): number {
  const [radius = 0] = inner.at(-1) ?? [];
  return Math.PI * radius * radius;
}

/** The height one comes to when going back from the point of overflow along the inner line; null when the centre comes first. */
export function heightAlongRim({ inner, overflowMm }: Vessel, alongMm: number): number | null {
  let left = alongMm;
  for (const stretch of [...stretchesOf(inner)].reverse()) {
    const part = upTo(stretch, overflowMm);
    if (part === null) continue;
    const [[radius, height], [farRadius, farHeight]] = [part.to, part.from];
    const length = Math.hypot(farRadius - radius, farHeight - height);
    if (length >= left) return height + (length === 0 ? 0 : (left / length) * (farHeight - height));
    left -= length;
  }
  return null;
}

/** A stretch up to a height, that height included; null when it lies above it altogether. */
function upTo(stretch: Stretch, height: number): Stretch | null {
  const { from, to } = stretch;
  if (from[1] > height && to[1] > height) return null;
  return { from: from[1] > height ? placeAt(stretch, height) : from, to: to[1] > height ? placeAt(stretch, height) : to };
}
