import { curveCatmullRom, line } from 'd3-shape';
import { NEUTRAL, PROFILES, type ProfileText } from './profiles';

/** [radius, height] in millimetres. An edge is the same point twice. */
export type Point = readonly [radius: number, height: number];
export type Outline = readonly Point[];

/** The section of a piece in true millimetres, as far as its measures are known. */
export type Section = {
  /** Whether the form is one of ours; else a neutral vessel stands for it. */
  readonly known: boolean;
  readonly outer: Outline;
  readonly inner: Outline;
  readonly handle: Outline;
  readonly spout: Outline;
  readonly lid: { readonly outer: Outline; readonly inner: Outline } | null;
  /** Null for a form without an inside to fill. */
  readonly fills: { readonly floor: number; readonly rim: number } | null;
};

export type Measures = { readonly depthMm?: number | undefined; readonly capacityMl?: number | undefined };

const isForm = (form: string): form is keyof typeof PROFILES => Object.hasOwn(PROFILES, form);

/** "0,4 28,4!" as points; what ends in `!` stands twice. */
function outlineOf(text: string): Outline {
  return text.split(' ').flatMap((mark): Point[] => {
    const [radius = 0, height = 0] = mark.replace('!', '').split(',').map(Number);
    return mark.endsWith('!') ? [[radius, height], [radius, height]] : [[radius, height]]; // prettier-ignore
  });
}

const heightAt = (outline: Outline, place: number): number => outline.at(place)?.[1] ?? 0;

/** What a vessel holds up to its rim, in millilitres, from its inner line: a stack of cut cones. */
export function capacityOf(inner: Outline): number {
  const cubicMm = inner.slice(1).reduce((sum, [radius, height], place) => {
    const [below = 0, from = 0] = inner[place] ?? [];
    return sum + ((height - from) * Math.PI * (radius * radius + radius * below + below * below)) / 3;
  }, 0);
  return cubicMm / 1000;
}

type Scale = { readonly across: number; readonly up: number };

/** A piece may be much flatter or taller than our drawing of its form; beyond this it would no longer look like one. */
const MOST = 2.2;
const bounded = (factor: number): number => Math.min(MOST, Math.max(1 / MOST, factor));

const isMeasure = (value: number | undefined): value is number => value !== undefined && Number.isFinite(value) && value > 0;

function scaleFor(inner: Outline, { depthMm, capacityMl }: Measures): Scale {
  const depth = heightAt(inner, -1) - heightAt(inner, 0);
  const byDepth = isMeasure(depthMm) ? depthMm / depth : null;
  const byVolume = isMeasure(capacityMl) ? capacityMl / capacityOf(inner) : null;
  if (byDepth === null) {
    const even = byVolume === null ? 1 : Math.cbrt(byVolume);
    return { across: even, up: even };
  }
  if (byVolume === null) return { across: byDepth, up: byDepth };
  return { across: byDepth * bounded(Math.sqrt(byVolume / byDepth) / byDepth), up: byDepth };
}

const sized = (text: string | undefined, { across, up }: Scale): Outline =>
  text === undefined ? [] : outlineOf(text).map(([radius, height]): Point => [radius * across, height * up]);

/** The section of a form at the size that is known of it. An unknown form gives the neutral vessel. */
export function sectionOf(form: string | undefined, measures: Measures): Section {
  const known = form !== undefined && isForm(form);
  const text: ProfileText = known ? PROFILES[form] : NEUTRAL;
  const solid = text.solid === true;
  const scale = solid ? { across: 1, up: 1 } : scaleFor(outlineOf(text.inner), measures);
  const inner = sized(text.inner, scale);
  return {
    known,
    inner,
    outer: sized(text.outer, scale),
    handle: sized(text.handle, scale),
    spout: sized(text.spout, scale),
    lid: text.lid === undefined ? null : { outer: sized(text.lid.outer, scale), inner: sized(text.lid.inner, scale) },
    fills: solid ? null : { floor: heightAt(inner, 0), rim: heightAt(inner, -1) },
  };
}

/** Heights of the edges one sees from outside above the foot, with the radius each reaches out to. */
export function edgesOf(outer: Outline): Outline {
  const edges = outer.filter(([radius, height], place) => {
    const before = outer[place - 1];
    return before !== undefined && before[0] === radius && before[1] === height;
  });
  const foot = edges.findLastIndex(([, height]) => height === 0);
  return edges.slice(foot + 1);
}

/** The one smoothing of all drawings. `to` places a point of the pot on the paper. */
export function smoothLine(outline: Outline, to: (point: Point) => readonly [number, number]): string {
  const draw = line<readonly [number, number]>().curve(curveCatmullRom.alpha(0.5)).digits(2);
  return draw(outline.map(to)) ?? '';
}
