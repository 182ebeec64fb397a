import type { Point } from '@/lib/pieces/domain/section';
import { readVessel, type Vessel } from '@/lib/pieces/domain/vessel';

/** A vessel that must be read. */
export function aVessel(points: readonly Point[], spillsBelowRimMm = 0): Vessel {
  const vessel = readVessel({ points, spillsBelowRimMm });
  if (!vessel.ok) throw new Error(`The profile was refused: ${JSON.stringify(vessel.error)}`);
  return vessel.value;
}

/** A straight cylinder of a depth that holds so much. */
export function aCylinder(depthMm: number, capacityMl: number): Vessel {
  const radius = Math.sqrt((capacityMl * 1000) / (Math.PI * depthMm));
  return aVessel([
    [radius, 0],
    [radius, depthMm],
  ]);
}

/** The packs give height and radius in centimetres; profiles are radius and height in millimetres. */
export const fromPack = (zr: readonly (readonly [number, number])[]): readonly Point[] =>
  zr.map(([height, radius]): Point => [radius * 10, height * 10]);
