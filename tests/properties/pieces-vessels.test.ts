import fc from 'fast-check';
import { expect, test } from 'vitest';
import { brimfulMl, capacityToMl, insideAreaMm2, meniscusAreaMm2, tracedRimAreaMm2, wettedAreaMm2 } from '@/lib/pieces/domain/filling';
import { measuredAnswers } from '@/lib/pieces/domain/measured-answers';
import { fillLevels, fillRuleOf, insideDepthMm } from '@/lib/pieces/domain/region-measures';
import type { Point } from '@/lib/pieces/domain/section';
import { readVessel, type GivenProfile, type Vessel } from '@/lib/pieces/domain/vessel';

const tenths = (least: number, most: number): fc.Arbitrary<number> =>
  fc.integer({ min: least * 10, max: most * 10 }).map((value) => value / 10);

/** A floor, raised or not, then walls that rise and lean either way up to a rim; sometimes with a spout. */
const profiles: fc.Arbitrary<GivenProfile> = fc
  .record({
    floor: tenths(-20, 20),
    raised: tenths(0, 60),
    foot: tenths(10, 80),
    rises: fc.array(fc.record({ radius: tenths(5, 150), up: tenths(1, 60) }), { minLength: 1, maxLength: 8 }),
    spill: tenths(0, 30),
  })
  .map(({ floor, raised, foot, rises, spill }) => {
    let height = floor;
    const wall = rises.map(({ radius, up }): Point => {
      height += up;
      return [radius, height];
    });
    const base: readonly Point[] = raised === 0 ? [] : [[0, floor + raised]];
    return { points: [...base, [foot, floor], ...wall], spillsBelowRimMm: spill };
  });

/** What is refused (a cone at the centre may run through the wall) says nothing about measures. */
const vessels: fc.Arbitrary<Vessel> = profiles.map(readVessel).filter((read) => read.ok).map((read) => read.value); // prettier-ignore

const scaledBy = ({ inner, rimMm, overflowMm }: Vessel, factor: number): Vessel => {
  const points = inner.map(([radius, height]): Point => [radius * factor, height * factor]);
  const read = readVessel({ points, spillsBelowRimMm: (rimMm - overflowMm) * factor });
  if (!read.ok) throw new Error(`A larger copy was refused: ${JSON.stringify(read.error)}`);
  return read.value;
};

const close = (value: number, expected: number): boolean => Math.abs(value - expected) <= 1e-6 + 1e-9 * Math.abs(expected);
const factors = fc.integer({ min: 2, max: 64 }).map((value) => value / 8);

test('PIECE-3 k times as large holds k cubed and has k squared the area', () => {
  fc.assert(
    fc.property(vessels, factors, fc.double({ min: 0, max: 1, noNaN: true }), (vessel, k, part) => {
      const large = scaledBy(vessel, k);
      const level = vessel.lowestMm + part * (vessel.overflowMm - vessel.lowestMm);
      expect(close(brimfulMl(large), brimfulMl(vessel) * k ** 3)).toBe(true);
      expect(close(capacityToMl(large, level * k), capacityToMl(vessel, level) * k ** 3)).toBe(true);
      expect(close(insideAreaMm2(large), insideAreaMm2(vessel) * k ** 2)).toBe(true);
      expect(close(wettedAreaMm2(large, level * k), wettedAreaMm2(vessel, level) * k ** 2)).toBe(true);
      expect(close(tracedRimAreaMm2(large), tracedRimAreaMm2(vessel) * k ** 2)).toBe(true);
    }),
    { numRuns: 400 },
  );
});

test('PIECE-4 no fill level holds more than the brim or lies at the floor', () => {
  fc.assert(
    fc.property(vessels, fc.constantFrom('eu', 'ca', 'us'), (vessel, region) => {
      const rule = fillRuleOf([region]);
      const levels = rule === null ? [] : Object.values(fillLevels(vessel, rule));
      for (const filled of levels) {
        if (filled === null) continue;
        expect(filled.levelMm).toBeGreaterThan(vessel.lowestMm);
        expect(filled.capacityMl).toBeLessThanOrEqual(brimfulMl(vessel) * (1 + 1e-12));
      }
    }),
    { numRuns: 400 },
  );
});

test('PIECE-4 a higher level holds no less, and the free surface is how fast it fills', () => {
  fc.assert(
    fc.property(
      vessels,
      fc.double({ min: 0.01, max: 1, noNaN: true }),
      fc.double({ min: 0, max: 1, noNaN: true }),
      (vessel, part, less) => {
        const depth = vessel.overflowMm - vessel.lowestMm;
        const [high, low] = [vessel.lowestMm + part * depth, vessel.lowestMm + part * less * depth];
        expect(capacityToMl(vessel, high)).toBeGreaterThanOrEqual(capacityToMl(vessel, low) - 1e-9);
        const step = 1e-5;
        const rate = ((capacityToMl(vessel, high) - capacityToMl(vessel, high - step)) * 1000) / step;
        const nearEdge = vessel.inner.some(([, height]) => Math.abs(height - high) < 0.01);
        expect(nearEdge || high - step <= vessel.lowestMm || Math.abs(rate - meniscusAreaMm2(vessel, high)) < 2).toBe(true);
      },
    ),
    { numRuns: 400 },
  );
});

test('PIECE-5 depth is zero or more, and the two ways differ by the spout alone', () => {
  fc.assert(
    fc.property(vessels, (vessel) => {
      const [rim, overflow] = [insideDepthMm(vessel, 'rim-plane'), insideDepthMm(vessel, 'overflow')];
      expect(Math.min(rim, overflow)).toBeGreaterThanOrEqual(0);
      expect(close(rim - overflow, vessel.rimMm - vessel.overflowMm)).toBe(true);
      expect(measuredAnswers(vessel, ['ca'])['capacity-ml']).toBeGreaterThanOrEqual(0);
    }),
  );
});

test('PIECE-1 any list of points is read or refused, and never throws', () => {
  const wild = fc.oneof(fc.double(), tenths(-50, 200), fc.constantFrom(0, -0, 1e308, 5e-324));
  fc.assert(
    fc.property(fc.array(fc.tuple(wild, wild), { maxLength: 12 }), wild, (points, spillsBelowRimMm) => {
      const read = readVessel({ points, spillsBelowRimMm });
      if (!read.ok) return;
      expect(brimfulMl(read.value)).toBeGreaterThanOrEqual(0);
      expect(Number.isFinite(insideAreaMm2(read.value))).toBe(true);
      expect(read.value.overflowMm).toBeGreaterThanOrEqual(read.value.lowestMm);
    }),
    { numRuns: 1000 },
  );
});
