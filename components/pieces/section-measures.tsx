import type { ReactElement } from 'react';
import type { Section } from '@/lib/pieces/domain/section';
import { leftOf, type Paper } from './section-paper';
import type { SectionWords } from './section-words';

type Props = { readonly section: Section; readonly paper: Paper; readonly words: SectionWords };

/** Thin lines with words: the depth always where it is measured, the capacity once it is known. */
export function Measures({ section, paper, words }: Props): ReactElement | null {
  if (section.fills === null) return null;
  const to = leftOf(paper);
  const lip = section.inner.at(-1)?.[0] ?? 0;
  const [lipX, rim] = to([lip, section.fills.rim]);
  const floor = to([0, section.fills.floor])[1];
  return (
    <g fill="none" className="stroke-iron" strokeWidth="0.9">
      <Depth at={paper.axis - paper.reach - 9} rim={rim} floor={floor} lipX={lipX} axis={paper.axis} words={words} />
      {words.capacity.amount === null ? null : (
        <>
          <path d={`M${(lipX + paper.axis) / 2},21V${rim}`} />
          <path d={`M${(lipX + paper.axis) / 2 - 3},${rim - 6}l3,6l3,-6`} />
          <text x={(lipX + paper.axis) / 2 + 4} y="15" textAnchor="middle" stroke="none">
            {words.capacity.name} {words.capacity.amount}
          </text>
        </>
      )}
    </g>
  );
}

type DepthProps = {
  readonly at: number;
  readonly rim: number;
  readonly floor: number;
  readonly lipX: number;
  readonly axis: number;
  readonly words: SectionWords;
};

function Depth({ at, rim, floor, lipX, axis, words: { depth } }: DepthProps): ReactElement {
  const middle = (rim + floor) / 2;
  return (
    <>
      <path d={`M${at - 4},${rim}H${lipX}M${at - 4},${floor}H${axis}`} strokeDasharray="2 3" />
      <path d={`M${at},${rim}V${floor}M${at - 3},${rim + 6}l3,-6l3,6M${at - 3},${floor - 6}l3,6l3,-6`} />
      <text x={at - 7} y={depth.amount === null ? middle + 5 : middle - 3} textAnchor="end" stroke="none">
        {depth.name}
      </text>
      {depth.amount === null ? null : (
        <text x={at - 7} y={middle + 14} textAnchor="end" stroke="none">
          {depth.amount}
        </text>
      )}
    </>
  );
}
