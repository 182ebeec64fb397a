import type { ReactElement } from 'react';

/** Squares without a mark around a QR code, as readers need them. */
const QUIET = 4;

type Props = { readonly title: string; readonly size: number; readonly path: string };

/** A QR code as a drawing: black on white in either theme, since many readers see nothing in the reverse. */
export function QrCode({ title, size, path }: Props): ReactElement {
  const side = size + 2 * QUIET;
  return (
    <svg className="qr" role="img" aria-label={title} viewBox={`${-QUIET} ${-QUIET} ${side} ${side}`} shapeRendering="crispEdges">
      <rect x={-QUIET} y={-QUIET} width={side} height={side} fill="white" />
      <path d={path} fill="black" />
    </svg>
  );
}
