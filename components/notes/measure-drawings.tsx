import type { ReactElement } from 'react';
import { leftOf, wallPath, halfPath, rightOf } from '@/components/pieces/section-paper';
import { sectionOf, type Point, type Section } from '@/lib/pieces/domain/section';
import { CutPiece, Label, paperAt, Thin, UprightSpan } from './cut-piece';
import { DrawingFrame, drawingWords } from './drawing-frame';

type DepthOfProps = { readonly section: Section; readonly ground: number; readonly said: string };

const SCALE = 0.82;
const AXIS = 190;

/** One piece with the plane of its rim and its depth beside it. */
function DepthOf({ section, ground, said }: DepthOfProps): ReactElement {
  const paper = paperAt({ axis: AXIS, ground, scale: SCALE });
  const [rim, floor] = [ground - (section.fills?.rim ?? 0) * SCALE, ground - (section.fills?.floor ?? 0) * SCALE];
  const lip = AXIS - (section.inner.at(-1)?.[0] ?? 0) * SCALE;
  return (
    <>
      <CutPiece section={section} paper={paper} />
      <Thin d={`M56,${rim}H312M56,${floor}H${lip}`} dashed />
      <Thin d={`M${lip},${floor}H${AXIS}`} dashed />
      <UprightSpan at={64} from={rim} to={floor} />
      <Label x={4} y={rim - 9}>
        {said}
      </Label>
      <Label x={312} y={rim - 9} anchor="end">
        {drawingWords('depth', 'plane')}
      </Label>
    </>
  );
}

/** Depth of a plate and of a bowl, at one scale. */
export function Depth(): ReactElement {
  return (
    <DrawingFrame name="depth" height={204}>
      <DepthOf section={sectionOf('plate', { depthMm: 22 })} ground={66} said={drawingWords('depth', 'plate')} />
      <DepthOf section={sectionOf('bowl', { depthMm: 62 })} ground={190} said={drawingWords('depth', 'bowl')} />
    </DrawingFrame>
  );
}

/** A jar and its lid, apart. */
export function LidApart(): ReactElement {
  const section = sectionOf('jar', {});
  const paper = paperAt({ axis: 104, ground: 216, scale: 0.95 });
  const raised = ([radius, height]: Point): Point => [radius, height + 26];
  const lid = section.lid === null ? null : { outer: section.lid.outer.map(raised), inner: section.lid.inner.map(raised) };
  return (
    <DrawingFrame name="lid" height={252}>
      <CutPiece section={section} paper={paper} />
      {lid === null ? null : (
        <g className="stroke-iron" strokeWidth="1.2">
          <path d={wallPath(lid.outer, lid.inner, leftOf(paper))} className="fill-oxide" />
          <path d={halfPath(lid.outer, rightOf(paper))} className="fill-bisque" />
        </g>
      )}
      <Thin d="M152,62H196M164,150H196" />
      <Label x={202} y={67}>
        {drawingWords('lid', 'lid')}
      </Label>
      <Label x={202} y={155}>
        {drawingWords('lid', 'jar')}
      </Label>
      <Label x={104} y={240} anchor="middle">
        {drawingWords('lid', 'sum')}
      </Label>
    </DrawingFrame>
  );
}

/** What one test covers, named around a mug. */
export function Combination(): ReactElement {
  const said = (part: string): string => drawingWords('combination', part);
  return (
    <DrawingFrame name="combination" height={222}>
      <CutPiece section={sectionOf('mug', {})} paper={paperAt({ axis: 150, ground: 182, scale: 1.3 })} />
      <Thin d="M52,60L101,74M44,126H96M276,40L207,54M252,170L204,156" />
      <Label x={6} y={62}>
        {said('glaze')}
      </Label>
      <Label x={6} y={131}>
        {said('clay')}
      </Label>
      <Label x={314} y={44} anchor="end">
        {said('form')}
      </Label>
      <Label x={314} y={176} anchor="end">
        {said('texture')}
      </Label>
      <Label x={150} y={212} anchor="middle">
        {said('firing')}
      </Label>
    </DrawingFrame>
  );
}

/** The underside of a plate, with the place for words that last. */
export function FootMark(): ReactElement {
  const { outer } = sectionOf('plate', {});
  const standing = outer.filter(([, height]) => height === 0).map(([radius]) => radius);
  const [scale, across, down] = [0.68, 100, 100];
  const rings = [Math.max(...outer.map(([radius]) => radius)), Math.max(...standing), Math.min(...standing)];
  return (
    <DrawingFrame name="foot-mark" height={200}>
      {rings.map((radius) => (
        <circle key={radius} cx={across} cy={down} r={radius * scale} className="fill-bisque stroke-iron" strokeWidth="1.5" />
      ))}
      <Label x={across} y={down + 5} anchor="middle">
        {drawingWords('foot-mark', 'words')}
      </Label>
      <UprightSpan at={across + 40} from={down - 6} to={down + 6} />
      <Thin d={`M${across + 46},${down}H204`} />
      <Label x={210} y={down + 5}>
        {drawingWords('foot-mark', 'height')}
      </Label>
    </DrawingFrame>
  );
}
