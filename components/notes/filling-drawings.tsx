import { useId, type ReactElement } from 'react';
import { halfPath, leftOf, wallPath } from '@/components/pieces/section-paper';
import { sectionOf, smoothLine, type Section } from '@/lib/pieces/domain/section';
import { Label, paperAt, Thin } from './cut-piece';
import { DrawingFrame, drawingWords } from './drawing-frame';

type WallProps = { readonly section: Section; readonly axis: number; readonly ground: number; readonly scale: number };

/** A piece of the cut wall, drawn so large that the rest lies outside the drawing. */
function Wall({ section, ...place }: WallProps): ReactElement {
  const to = leftOf(paperAt(place));
  return (
    <g fill="none" className="stroke-iron" strokeLinejoin="round">
      <path d={wallPath(section.outer, section.inner, to)} className="fill-oxide" strokeWidth="1.2" />
      <path d={smoothLine(section.inner, to)} strokeWidth="3.4" />
    </g>
  );
}

/** Millimetres below the point where the cup runs over, as each method fills it. */
const LEVELS = { eu: 1, ca: 5, usFrom: 6, usTo: 7 } as const;

/** The top of a cup with the levels of three methods. */
export function FillLevel(): ReactElement {
  const section = sectionOf('cup', {});
  const [lip = 0, rim = 0] = section.inner.at(-1) ?? [];
  const [scale, top] = [9, 42];
  const axis = 70 + lip * scale;
  const at = (mm: number): number => top + mm * scale;
  return (
    <DrawingFrame name="fill-level" height={150}>
      <Wall section={section} axis={axis} ground={top + rim * scale} scale={scale} />
      <Thin d={`M20,${top}H320`} dashed />
      <Thin d={`M76,${at(LEVELS.eu)}H320M82,${at(LEVELS.ca)}H320`} />
      <rect
        x="86"
        y={at(LEVELS.usFrom)}
        width="240"
        height={(LEVELS.usTo - LEVELS.usFrom) * scale}
        className="fill-wash-cobalt stroke-iron"
        strokeWidth="0.9"
      />
      <Label x={130} y={top - 8}>
        {drawingWords('fill-level', 'overflow')}
      </Label>
      <Label x={130} y={at(LEVELS.eu) + 15}>
        {drawingWords('fill-level', 'eu')}
      </Label>
      <Label x={130} y={at(LEVELS.ca) - 4}>
        {drawingWords('fill-level', 'ca')}
      </Label>
      <Label x={130} y={at(LEVELS.usTo) + 18}>
        {drawingWords('fill-level', 'us')}
      </Label>
    </DrawingFrame>
  );
}

/** How far down the slope of a flat rim the liquid of the European method may end. */
const ALONG_SLOPE_MM = 6;

/** The edge of a plate: where the liquid ends, and where the rim does. */
export function LiquidSurface(): ReactElement {
  const id = useId();
  const section = sectionOf('plate', { depthMm: 22 });
  const [inRadius = 0, inHeight = 0] = section.inner.at(-2) ?? [];
  const [rimRadius = 0, rimHeight = 0] = section.inner.at(-1) ?? [];
  const share = ALONG_SLOPE_MM / Math.hypot(rimRadius - inRadius, rimHeight - inHeight);
  const liquid = [rimRadius - (rimRadius - inRadius) * share, rimHeight - (rimHeight - inHeight) * share] as const;
  const [scale, top] = [6, 76];
  const axis = 42 + rimRadius * scale;
  const ground = top + rimHeight * scale;
  const edge = axis - liquid[0] * scale;
  const level = ground - liquid[1] * scale;
  return (
    <DrawingFrame name="liquid-surface" height={206}>
      <clipPath id={`${id}wet`}>
        <path d={`M0,${level}H320V206H0Z`} />
      </clipPath>
      <path
        d={halfPath(section.inner, leftOf(paperAt({ axis, ground, scale })))}
        className="fill-wash-cobalt"
        clipPath={`url(#${id}wet)`}
      />
      <Wall section={section} axis={axis} ground={ground} scale={scale} />
      <Thin d={`M${edge},${level}H320`} />
      <Thin d={`M42,${top}V18M${edge},${level}V44`} dashed />
      <Thin d={`M42,24H320M48,21l-6,3l6,3M${edge},50H320M${edge + 6},47l-6,3l6,3`} />
      <Label x={130} y={18}>
        {drawingWords('liquid-surface', 'rim')}
      </Label>
      <Label x={130} y={44}>
        {drawingWords('liquid-surface', 'liquid')}
      </Label>
    </DrawingFrame>
  );
}
