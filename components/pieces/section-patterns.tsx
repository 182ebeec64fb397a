import type { ReactElement } from 'react';
import { smoothLine, type Section } from '@/lib/pieces/domain/section';
import { halfPath, leftOf, rightOf, type Paper } from './section-paper';

type Drawn = { readonly id: string; readonly section: Section; readonly paper: Paper };

/** Decoration within this distance of the rim is what some limits ask about. */
const RIM_BAND_MM = 20;
const BAND = 18;

/** Patterns stand for what colours would: dots for bare clay, a net for crazing, hatching for a decorated rim. */
export function Patterns({ id, section, paper }: Drawn): ReactElement {
  const to = leftOf(paper);
  const rim = rightOf(paper)([0, section.outer.at(-1)?.[1] ?? 0])[1];
  const middle = (to([0, section.inner.at(-1)?.[1] ?? 0])[1] + to([0, section.inner[0]?.[1] ?? 0])[1]) / 2;
  return (
    <defs className="stroke-iron">
      <pattern id={`${id}dots`} width="6" height="6" patternUnits="userSpaceOnUse">
        <circle cx="1.5" cy="1.5" r="1.1" className="fill-iron" stroke="none" />
        <circle cx="4.5" cy="4.5" r="1.1" className="fill-iron" stroke="none" />
      </pattern>
      <pattern id={`${id}net`} width="13" height="11" patternUnits="userSpaceOnUse">
        <path d="M0,3L5,0M5,0L9,5L13,3M9,5L7,11M0,3L2,9L7,11M2,9L0,11M13,3L13,3M7,11L13,9" fill="none" strokeWidth="0.9" />
      </pattern>
      <pattern id={`${id}hatch`} width="6" height="6" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
        <path d="M0,0V6" strokeWidth="2" />
      </pattern>
      <clipPath id={`${id}room`}>
        <path d={halfPath(section.inner, to)} />
      </clipPath>
      <clipPath id={`${id}lower`}>
        <path d={`M0,${middle}H${paper.width}V${paper.height}H0Z`} />
      </clipPath>
      <clipPath id={`${id}upper`}>
        <path d={`M0,0H${paper.width}V${middle}H0Z`} />
      </clipPath>
      <clipPath id={`${id}rim`}>
        <path d={`M0,${rim}H${paper.width}v${RIM_BAND_MM * paper.scale}H0Z`} />
      </clipPath>
    </defs>
  );
}

type BandProps = Drawn & { readonly inside: string | undefined; readonly crazed: boolean };

/** A band along the inside, showing the surface that food touches. A plain glaze needs none. */
export function SurfaceBand({ id, section, paper, inside, crazed }: BandProps): ReactElement {
  const path = smoothLine(section.inner, leftOf(paper));
  return (
    <>
      {bandsFor(inside, crazed).map(({ pattern, part }) => (
        <g key={pattern} clipPath={`url(#${id}${part})`}>
          <path d={path} clipPath={`url(#${id}room)`} stroke={`url(#${id}${pattern})`} strokeWidth={BAND * 2} strokeLinecap="butt" />
        </g>
      ))}
    </>
  );
}

type Band = { readonly pattern: 'dots' | 'net'; readonly part: 'room' | 'lower' | 'upper' };

/** Bare clay cannot craze; where only a part is glazed, the lower part is drawn bare. */
function bandsFor(inside: string | undefined, crazed: boolean): readonly Band[] {
  if (inside === 'unglazed') return [{ pattern: 'dots', part: 'room' }];
  const partly = inside === 'partly-glazed';
  const net: readonly Band[] = crazed ? [{ pattern: 'net', part: partly ? 'upper' : 'room' }] : [];
  return partly ? [{ pattern: 'dots', part: 'lower' }, ...net] : net;
}
