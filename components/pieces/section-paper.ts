import { edgesOf, smoothLine, type Outline, type Point, type Section } from '@/lib/pieces/domain/section';

/** Where a section lies on its paper, in the units of the drawing, and the paths made of it. */
export type Paper = {
  readonly width: number;
  readonly height: number;
  readonly axis: number;
  readonly top: number;
  readonly ground: number;
  readonly scale: number;
  /** How far the drawing reaches to the left of the axis. */
  readonly reach: number;
};

type Sides = (point: Point) => readonly [number, number];

const WIDTH = 320;
const MARGIN = { start: 62, end: 12, top: 34, bottom: 14 };
const TALLEST = 196;
const LEAST_HEIGHT = 56;
const HANDLE_MM = 5;

const widest = (...outlines: readonly Outline[]): number => Math.max(0, ...outlines.flat().map(([radius]) => radius));
const highest = (...outlines: readonly Outline[]): number => Math.max(0, ...outlines.flat().map(([, height]) => height));

/** Fits a section onto paper of one width, so that drawings stand side by side without jumping. */
export function paperFor(section: Section, lidded: boolean): Paper {
  const { outer, inner, handle, spout } = section;
  const lid = lidded && section.lid !== null ? section.lid.outer : [];
  const left = widest(outer, spout);
  const right = Math.max(widest(outer), widest(handle) + (handle.length > 0 ? HANDLE_MM : 0));
  const tall = highest(outer, inner, lid, spout);
  const room = WIDTH - MARGIN.start - MARGIN.end;
  const scale = Math.min(room / (left + right), TALLEST / tall);
  const drawn = Math.max(LEAST_HEIGHT, tall * scale);
  return {
    width: WIDTH,
    height: Math.ceil(drawn + MARGIN.top + MARGIN.bottom),
    axis: MARGIN.start + (room - (left + right) * scale) / 2 + left * scale,
    top: MARGIN.top + drawn - tall * scale,
    ground: MARGIN.top + drawn,
    scale,
    reach: left * scale,
  };
}

export const leftOf =
  ({ axis, ground, scale }: Paper): Sides =>
  ([radius, height]) => [axis - radius * scale, ground - height * scale];

export const rightOf =
  ({ axis, ground, scale }: Paper): Sides =>
  ([radius, height]) => [axis + radius * scale, ground - height * scale];

/** Both faces of a wall and what lies between them, closed. */
export function wallPath(outer: Outline, inner: Outline, to: Sides): string {
  return `${smoothLine(outer, to)}L${smoothLine(inner.toReversed(), to).slice(1)}Z`;
}

/** A face closed along the axis: the room inside a vessel, or half of what one sees of it from outside. */
export function halfPath(face: Outline, to: Sides): string {
  const [end, start] = [to([0, face.at(-1)?.[1] ?? 0]), to([0, face[0]?.[1] ?? 0])];
  return `${smoothLine(face, to)}L${end.join(',')}L${start.join(',')}Z`;
}

/** A piece from outside: the outer face from the table up, without what is hidden under the foot. */
export function seenFromOutside(outer: Outline): Outline {
  const foot = outer.findLastIndex(([, height]) => height === 0);
  const stands = outer[foot];
  // Both ends of the line on the table are edges, so each stands twice.
  return stands === undefined ? outer : [[0, 0], [0, 0], stands, ...outer.slice(foot)]; // prettier-ignore
}

/** Lines across the outside: the rim, and every edge above the foot. */
export function linesAcross(outer: Outline): Outline {
  const rim = outer.at(-1);
  return rim === undefined || rim[0] === 0 ? edgesOf(outer) : [...edgesOf(outer), rim];
}
