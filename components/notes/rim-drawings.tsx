import { useId, type ReactElement } from 'react';
import { halfPath, rightOf, seenFromOutside } from '@/components/pieces/section-paper';
import { Patterns } from '@/components/pieces/section-patterns';
import { sectionOf, type Point } from '@/lib/pieces/domain/section';
import { CutHalves, CutPiece, Label, paperAt, Thin, UprightSpan } from './cut-piece';
import { DrawingFrame, drawingWords } from './drawing-frame';

/** The band outside that a regulation counts to the rim, and how deep the rim stands in the acid. */
const BAND_MM = 20;

/** A mug with its hatched band below the lip, measured. */
export function LipBand(): ReactElement {
  const id = useId();
  const section = sectionOf('mug', {});
  const paper = paperAt({ axis: 112, ground: 190, scale: 1.5 });
  const rim = rightOf(paper)([0, section.outer.at(-1)?.[1] ?? 0])[1];
  const lower = rim + BAND_MM * paper.scale;
  return (
    <DrawingFrame name="lip-band" height={204}>
      <Patterns id={id} section={section} paper={{ ...paper, width: 320, height: 204 }} />
      <CutPiece section={section} paper={paper} />
      <path d={halfPath(seenFromOutside(section.outer), rightOf(paper))} fill={`url(#${id}hatch)`} clipPath={`url(#${id}rim)`} />
      <Thin d={`M172,${rim}H262M172,${lower}H262`} dashed />
      <UprightSpan at={250} from={rim} to={lower} />
      <Label x={264} y={(rim + lower) / 2 + 5}>
        {drawingWords('lip-band', 'band')}
      </Label>
    </DrawingFrame>
  );
}

const AXIS = 150;
const FLOOR = 186;
const SCALE = 1.4;

/** The mug upside down in its dish. */
export function RimTest(): ReactElement {
  const section = sectionOf('mug', {});
  const rim = section.outer.at(-1)?.[1] ?? 0;
  const place =
    (side: 1 | -1) =>
    ([radius, height]: Point): readonly [number, number] => [AXIS + side * radius * SCALE, FLOOR - (rim - height) * SCALE];
  const level = FLOOR - BAND_MM * SCALE;
  return (
    <DrawingFrame name="rim-test" height={212}>
      <CutHalves section={section} left={place(-1)} right={place(1)} scale={SCALE} />
      <Thin d={`M62,${level}H88M212,${level}H270`} />
      <Thin d={`M62,${level + 9}h16M66,${level + 18}h16M222,${level + 9}h34M226,${level + 18}h34`} dashed />
      <path d={`M62,${level - 16}V${FLOOR + 6}H270V${level - 16}`} fill="none" className="stroke-iron" strokeWidth="2.4" />
      <UprightSpan at={55} from={level} to={FLOOR} />
      <Label x={2} y={(level + FLOOR) / 2 + 5}>
        {drawingWords('rim-test', 'height')}
      </Label>
      <Label x={278} y={level + 18}>
        {drawingWords('rim-test', 'acid')}
      </Label>
    </DrawingFrame>
  );
}
