import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';
import type { Vessel } from '@/lib/pieces/domain/vessel';

const WIDTH = 320;
const MARGIN = 24;
const TALLEST = 240;

/** The inside as it was typed: straight lines through the points, from the axis at the left to the rim. */
export function ProfileDrawing({ vessel }: { readonly vessel: Vessel }): ReactElement {
  const { inner, lowestMm, rimMm, overflowMm } = vessel;
  const widest = Math.max(...inner.map(([radius]) => radius));
  const highest = Math.max(...inner.map(([, height]) => height));
  const scale = Math.min((WIDTH - 2 * MARGIN) / widest, TALLEST / Math.max(highest - lowestMm, 1));
  const height = Math.ceil((highest - lowestMm) * scale) + 2 * MARGIN;
  const across = (radius: number): string => (MARGIN + radius * scale).toFixed(2);
  const up = (level: number): string => (height - MARGIN - (level - lowestMm) * scale).toFixed(2);
  const wall = inner.map(([radius, level], place) => `${place === 0 ? 'M' : 'L'}${across(radius)},${up(level)}`).join('');
  return (
    <svg className="drawing profile-drawing" viewBox={`0 0 ${WIDTH} ${height}`} role="img" aria-labelledby="profile-title profile-about">
      <title id="profile-title">{words('readings-page.profile.drawing')}</title>
      <desc id="profile-about">{words('readings-page.profile.drawingAbout', { points: inner.length })}</desc>
      <g fill="none" className="stroke-iron">
        <path d={`M${across(0)},${up(highest + 14 / scale)}V${height - MARGIN + 14}`} strokeWidth="0.9" strokeDasharray="9 3 1.5 3" />
        <path d={`M${across(0)},${up(rimMm)}H${across(widest)}`} strokeWidth="1" />
        {overflowMm === rimMm ? null : (
          <path d={`M${across(0)},${up(overflowMm)}H${across(widest)}`} strokeWidth="1" strokeDasharray="5 4" />
        )}
        <path d={wall} strokeWidth="2.8" strokeLinejoin="round" strokeLinecap="round" />
      </g>
      <g className="fill-iron">
        {inner.map(([radius, level]) => (
          <circle key={`${String(radius)},${String(level)}`} cx={across(radius)} cy={up(level)} r="3.4" />
        ))}
      </g>
    </svg>
  );
}
