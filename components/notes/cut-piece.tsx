import type { ReactElement } from 'react';
import { halfPath, leftOf, rightOf, seenFromOutside, wallPath, type Paper } from '@/components/pieces/section-paper';
import { smoothLine, type Point, type Section } from '@/lib/pieces/domain/section';

export type Sides = (point: Point) => readonly [number, number];
type Place = { readonly axis: number; readonly ground: number; readonly scale: number };

/** Where a piece stands in a drawing of a note, which holds more than one piece or a part of one. */
export const paperAt = ({ axis, ground, scale }: Place): Paper => ({
  width: 320,
  height: ground,
  axis,
  top: 0,
  ground,
  scale,
  reach: 0,
});

type CutProps = { readonly section: Section; readonly paper: Paper };

/** A piece the right way up: its left half cut and filled, its right half from outside, the food surface as a thick line. */
export function CutPiece({ section, paper }: CutProps): ReactElement {
  return <CutHalves section={section} left={leftOf(paper)} right={rightOf(paper)} scale={paper.scale} />;
}

type HalvesProps = { readonly section: Section; readonly left: Sides; readonly right: Sides; readonly scale: number };

/** The same for a piece that stands some other way, such as upside down: `left` and `right` place its points. */
export function CutHalves({ section, left, right, scale }: HalvesProps): ReactElement {
  const thick = Math.max(5, 9 * scale);
  const handle = section.handle.length === 0 ? null : smoothLine(section.handle, right);
  return (
    <g fill="none" className="stroke-iron" strokeWidth="1.5" strokeLinejoin="round" strokeLinecap="round">
      {handle === null ? null : (
        <>
          <path d={handle} strokeWidth={thick + 3} />
          <path d={handle} className="stroke-bisque" strokeWidth={thick} />
        </>
      )}
      <path d={halfPath(seenFromOutside(section.outer), right)} className="fill-bisque" />
      <path d={halfPath(section.inner, left)} className="fill-bisque" strokeWidth="0" />
      <path d={wallPath(section.outer, section.inner, left)} className="fill-oxide" strokeWidth="1" />
      <path d={smoothLine(section.inner, left)} strokeWidth="2.8" />
    </g>
  );
}

type SpanProps = { readonly at: number; readonly from: number; readonly to: number };

/** A measure up and down: a thin line with an arrow at each end, pointing inwards where it is short. */
export function UprightSpan({ at, from, to }: SpanProps): ReactElement {
  const head = Math.min(6, (to - from) / 3);
  return (
    <path
      d={`M${at},${from}V${to}M${at - 3},${from + head}l3,${-head}l3,${head}M${at - 3},${to - head}l3,${head}l3,${-head}`}
      fill="none"
      className="stroke-iron"
      strokeWidth="0.9"
    />
  );
}

type LabelProps = { readonly x: number; readonly y: number; readonly anchor?: 'start' | 'middle' | 'end'; readonly children: string };

export function Label({ x, y, anchor = 'start', children }: LabelProps): ReactElement {
  return (
    <text x={x} y={y} textAnchor={anchor}>
      {children}
    </text>
  );
}

/** A thin line, whole or dashed. */
export function Thin({ d, dashed = false }: { readonly d: string; readonly dashed?: boolean }): ReactElement {
  return <path d={d} fill="none" className="stroke-iron" strokeWidth="0.9" {...(dashed ? { strokeDasharray: '4 3' } : {})} />;
}
