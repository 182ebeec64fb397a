import 'server-only';
import type { GeoContext } from 'd3-geo';

/** Half a unit of the map's box: finer than a line of it is thick. */
const GRID = 0.5;

const onGrid = (at: number): number => Math.round(at / GRID);
const said = (steps: number): string => String(steps * GRID).replace(/^(-?)0\./, '$1.');

/** "3,-2" is written "3-2": the sign parts the figures already. */
function pair(x: number, y: number): string {
  const [first, second] = [said(x), said(y)];
  return first + (second.startsWith('-') ? '' : ',') + second;
}

/**
 * Writes outlines as short SVG paths: each point as its distance from the one before, on a grid. A map drawn so is a third as heavy, and
 * a page carries it twice.
 */
export class MapPen implements GeoContext {
  private at: readonly [number, number] = [0, 0];
  private line = '';

  /** The path drawn since the last time. */
  take(): string {
    const drawn = this.line;
    this.line = '';
    return drawn;
  }

  beginPath(): void {
    // A path begins where it is moved to.
  }

  moveTo(x: number, y: number): void {
    this.at = [onGrid(x), onGrid(y)];
    this.line += `M${pair(...this.at)}`;
  }

  lineTo(x: number, y: number): void {
    const to = [onGrid(x), onGrid(y)] as const;
    const [across, down] = [to[0] - this.at[0], to[1] - this.at[1]];
    if (across === 0 && down === 0) return;
    this.line += `l${pair(across, down)}`;
    this.at = to;
  }

  arc(): void {
    // Only points are drawn by arcs, and a map of countries has none.
  }

  closePath(): void {
    this.line += 'Z';
  }
}
