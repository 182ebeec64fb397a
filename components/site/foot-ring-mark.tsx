import { curveCardinalClosed, curveNatural, lineRadial } from 'd3-shape';
import type { ReactElement } from 'react';

type Props = {
  /** In CSS pixels. Small marks get lines that are thicker against their size, or they would fade. */
  readonly size: number;
  /** One inner ring a layer: bloc 1, country 2, part 3. */
  readonly rings?: 1 | 2 | 3;
  /** Without a title the mark is only decoration beside words. */
  readonly title?: string;
};

const TURN = 2 * Math.PI;
const STEPS = { ring: 20, spiral: 31 };

/** The outer ring as a hand leaves it: two slow waves, never more than a hair. */
const thrown = (angle: number): number => 56 + 0.9 * Math.sin(angle + 0.7) + 0.5 * Math.sin(2 * angle + 2.1);

const ring = lineRadial().curve(curveCardinalClosed);
const spiral = lineRadial().curve(curveNatural);

const circlePoints = (radius: (angle: number) => number): [number, number][] =>
  Array.from({ length: STEPS.ring }, (_, step) => {
    const angle = (step / STEPS.ring) * TURN;
    return [angle, radius(angle)];
  });

/** Two and a half turns from the centre out, as a throwing spiral opens. */
const spiralPoints = (widest: number): [number, number][] =>
  Array.from({ length: STEPS.spiral }, (_, step) => {
    const part = step / (STEPS.spiral - 1);
    return [part * 2.5 * TURN, 1.5 + part * (widest - 1.5)];
  });

/** A tenth of a unit is finer than any screen shows the mark. */
const short = (path: string | null): string =>
  (path ?? '').replace(/-?\d+\.\d+/g, (figure) => Number(figure).toFixed(1).replace(/\.0$/, ''));

/** The underside of a pot: outer ring, foot ring, a ring for each layer, throwing spiral. Always iron, never filled. */
export function FootRingMark({ size, rings = 1, title }: Props): ReactElement {
  const fine = Math.max(1.2, 132 / size);
  const inner = Array.from({ length: rings }, (_, place) => 33 - place * 6);
  const widest = (inner.at(-1) ?? 33) - 7;
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 120 120"
      fill="none"
      stroke="currentColor"
      className="flex-none text-iron"
      {...(title === undefined ? { 'aria-hidden': true } : { role: 'img', 'aria-label': title })}
    >
      <g transform="translate(60 60)" strokeWidth={fine} strokeLinecap="round">
        <path d={short(ring(circlePoints(thrown)))} />
        <circle r="44" strokeWidth="9" />
        {inner.map((radius) => (
          <circle key={radius} r={radius} />
        ))}
        <path d={short(spiral(spiralPoints(widest)))} strokeWidth={Math.max(1.4, fine)} />
      </g>
    </svg>
  );
}
