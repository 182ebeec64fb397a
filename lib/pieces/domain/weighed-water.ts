import { err, ok, type Result } from '@/lib/kernel/result';

export type WaterFault = 'not-a-weight' | 'not-room-temperature';

/** g/mL of pure water at °C, from memory; between them straight lines are near enough for a kitchen scale. */
const DENSITIES: readonly (readonly [celsius: number, density: number])[] = [
  [15, 0.9991],
  [20, 0.9982],
  [25, 0.997],
  [30, 0.9957],
];

/** The millilitres that a weight of water takes up at 15 to 30 °C: for measuring what a piece holds on a scale. */
export function volumeOfWaterMl(grams: number, celsius: number): Result<number, WaterFault> {
  if (!Number.isFinite(grams) || grams < 0) return err('not-a-weight');
  const density = densityAt(celsius);
  return density === null ? err('not-room-temperature') : ok(grams / density);
}

function densityAt(celsius: number): number | null {
  const above = DENSITIES.findIndex(([known]) => celsius <= known);
  const [upper, lower] = [DENSITIES[above], DENSITIES[Math.max(0, above - 1)]];
  if (upper === undefined || lower === undefined || celsius < lower[0]) return null;
  const part = upper[0] === lower[0] ? 0 : (celsius - lower[0]) / (upper[0] - lower[0]);
  return lower[1] + part * (upper[1] - lower[1]);
}
