import { describe, expect, test } from 'vitest';
import { z } from 'zod';
import {
  brimfulMl,
  capacityToMl,
  heightAlongRim,
  insideAreaMm2,
  meniscusAreaMm2,
  tracedRimAreaMm2,
  wettedAreaMm2,
} from '@/lib/pieces/domain/filling';
import { filledBelow, fillLevels, fillRuleOf, referenceAreas } from '@/lib/pieces/domain/region-measures';
import type { Point } from '@/lib/pieces/domain/section';
import { volumeOfWaterMl } from '@/lib/pieces/domain/weighed-water';
import { aVessel, fromPack } from './vessels';
import { exampleIds, workedExample } from './worked-examples';

const zr = z.array(z.tuple([z.number(), z.number()]));
const figures = z.record(z.string(), z.number());
const wholes = ['we-ge-01', 'we-ge-02', 'we-ge-04'].map((id) =>
  workedExample(id, z.object({ profile_zr_cm: zr }), z.object({ V_mL: z.number(), inner_area_cm2: z.number() })),
);
const hemisphere = workedExample(
  'we-ge-03',
  z.object({ n_equal_angle_segments: z.number() }),
  z.object({ V_exact_mL: z.number(), A_exact_cm2: z.number(), V_frusta_mL: z.number(), A_frusta_cm2: z.number(), V_error_pct: z.number() }),
);
const filled = workedExample(
  'we-ge-05',
  z.object({ profiles: z.record(z.string(), zr), gaps_mm: figures }),
  z.object({ fill_mL: z.record(z.string(), figures), brim_mL: figures }),
);
const weighed = workedExample('we-ge-06', z.object({ water_g: z.number(), T_C: z.number() }), z.object({ V_mL: z.number() }));
const meniscus = workedExample('we-lt-02', z.object({ meniscus_diameter_cm: z.number() }), z.object({ A_dm2: z.number() }));

const near = (value: number, expected: number, relative = 1e-6): void => {
  expect(Math.abs(value / expected - 1)).toBeLessThan(relative);
};

describe('worked examples', () => {
  test('PIECE-2 every one on geometry stands below', () => {
    expect(exampleIds(['geometry'])).toEqual(['we-ge-01', 'we-ge-02', 'we-ge-03', 'we-ge-04', 'we-ge-05', 'we-ge-06']);
  });

  test.each(wholes)('PIECE-2 capacity and inner area ($by)', ({ inputs, expected }) => {
    const vessel = aVessel(fromPack(inputs.profile_zr_cm));
    near(brimfulMl(vessel), expected.V_mL);
    near(insideAreaMm2(vessel) / 100, expected.inner_area_cm2);
    near(wettedAreaMm2(vessel, vessel.overflowMm) / 100, expected.inner_area_cm2);
  });

  test(`PIECE-2 a half sphere by points on its wall comes out a little too small (${hemisphere.by})`, () => {
    const steps = hemisphere.inputs.n_equal_angle_segments;
    const points = Array.from({ length: steps + 1 }, (_, step): Point => {
      const angle = (step / steps) * (Math.PI / 2);
      return [60 * Math.sin(angle), 60 * (1 - Math.cos(angle))];
    });
    const vessel = aVessel(points);
    const { expected } = hemisphere;
    near(brimfulMl(vessel), expected.V_frusta_mL, 1e-4);
    near(insideAreaMm2(vessel) / 100, expected.A_frusta_cm2, 1e-4);
    expect(100 * (brimfulMl(vessel) / expected.V_exact_mL - 1)).toBeCloseTo(expected.V_error_pct, 3);
    expect(insideAreaMm2(vessel) / 100).toBeLessThan(expected.A_exact_cm2);
  });

  const gaps = Object.entries(filled.inputs.profiles).flatMap(([name, profile]) =>
    Object.entries(filled.inputs.gaps_mm).map(([region, gap]) => ({ name, profile, region, gap })),
  );
  test.each(gaps)(`PIECE-2 PIECE-6 $name filled to $gap mm below the brim, $region (${filled.by})`, ({ name, profile, region, gap }) => {
    const vessel = aVessel(fromPack(profile));
    near(filledBelow(vessel, gap)?.capacityMl ?? 0, filled.expected.fill_mL[name]?.[region] ?? 0);
    near(brimfulMl(vessel), filled.expected.brim_mL[name] ?? 0);
  });

  test(`PIECE-2 a capacity by weighing water (${weighed.by})`, () => {
    const volume = volumeOfWaterMl(weighed.inputs.water_g, weighed.inputs.T_C);
    expect(volume.ok && Math.abs(volume.value - weighed.expected.V_mL) < 0.05).toBe(true);
  });

  test(`PIECE-7 the free surface of a plate (${meniscus.by})`, () => {
    const radius = meniscus.inputs.meniscus_diameter_cm * 5;
    const plate = aVessel([[0, 0], [radius - 20, 0], [radius, 19], [radius + 10, 20]]); // prettier-ignore
    near(referenceAreas(plate).meniscusDm2 ?? 0, meniscus.expected.A_dm2, 1e-6);
  });
});

describe('filling', () => {
  test('PIECE-2 the trough round a raised centre is counted by itself, its surface is a ring', () => {
    const raised = aVessel([[0, 60], [20, 0], [50, 0], [50, 40]]); // prettier-ignore
    const cone = (Math.PI * (20 ** 3 - (20 / 3) ** 3) * 3) / 3;
    expect(brimfulMl(raised)).toBeCloseTo((Math.PI * 2500 * 40 - cone) / 1000, 9);
    expect(meniscusAreaMm2(raised, 40)).toBeCloseTo(Math.PI * (2500 - (20 / 3) ** 2), 9);
  });

  test('PIECE-2 a raised centre below the rim takes its own volume and no more', () => {
    const flat = aVessel([[30, 0], [50, 0], [50, 40]]); // prettier-ignore
    const raised = aVessel([[0, 9], [30, 0], [50, 0], [50, 40]]); // prettier-ignore
    expect(brimfulMl(flat) - brimfulMl(raised)).toBeCloseTo((Math.PI * 900 * 9) / 3000, 9);
  });

  test('PIECE-2 a wall that leans in is counted once', () => {
    expect(brimfulMl(aVessel([[50, 0], [30, 60]]))).toBeCloseTo((Math.PI * 60 * (2500 + 1500 + 900)) / 3000, 9); // prettier-ignore
  });

  test('PIECE-2 empty at the floor', () => {
    const vessel = aVessel([[40, 10], [40, 90]]); // prettier-ignore
    expect([capacityToMl(vessel, 10), capacityToMl(vessel, 0), wettedAreaMm2(vessel, 10)]).toEqual([0, 0, 0]);
  });

  test('PIECE-6 each place fills as its source says', () => {
    const rules = [['eu', 'dk'], ['us', 'us-ca'], ['ca'], ['jp']].map(fillRuleOf);
    expect(rules.map((rule) => rule && [rule.leastBelowMm, rule.mostBelowMm, rule.alongRimMm])).toEqual([
      [1, 1, 6],
      [6, 7, null],
      [5, 5, null],
      null,
    ]);
  });

  test('PIECE-6 along a rim that slopes 3 down in 5, six millimetres are 3.6 lower', () => {
    const plate = aVessel([[0, 0], [100, 0], [140, 30]]); // prettier-ignore
    expect(heightAlongRim(plate, 6)).toBeCloseTo(26.4, 9);
    expect(heightAlongRim(aVessel([[0, 0], [100, 0], [140, 30]], 3), 6)).toBeCloseTo(23.4, 9); // prettier-ignore
  });

  test('PIECE-6 along a level rim the liquid may stand at its height', () => {
    const plate = aVessel([[0, 0], [100, 0], [110, 20], [130, 20]]); // prettier-ignore
    const eu = fillRuleOf(['eu']);
    expect(eu && fillLevels(plate, eu).alongRim?.levelMm).toBe(20);
  });

  test('PIECE-6 the way along the rim may go round a corner and ends at the centre', () => {
    const steep = aVessel([[0, 0], [10, 0], [10, 4]]); // prettier-ignore
    expect(heightAlongRim(steep, 3)).toBe(1);
    expect(heightAlongRim(steep, 6)).toBe(0);
    expect(heightAlongRim(steep, 60)).toBeNull();
  });

  test('PIECE-4 a piece too shallow for the room below the rim has no such level', () => {
    const shallow = aVessel([[0, 0], [60, 0], [62, 5]]); // prettier-ignore
    const [ca, us] = [fillRuleOf(['ca']), fillRuleOf(['us'])];
    expect(ca && fillLevels(shallow, ca).highest).toBeNull();
    expect(us && fillLevels(shallow, us)).toEqual({ highest: null, lowest: null, alongRim: null });
  });

  test('PIECE-7 on a sloping rim the free surface is smaller than the traced rim', () => {
    const areas = referenceAreas(aVessel([[0, 0], [100, 0], [140, 10]])); // prettier-ignore
    expect(areas.meniscusDm2).toBeCloseTo((Math.PI * 136 ** 2) / 10_000, 9);
    expect(areas.tracedRimDm2).toBeCloseTo((Math.PI * 140 ** 2) / 10_000, 9);
  });

  test('PIECE-7 a slab has no free surface', () => {
    const slab = aVessel([[0, 9], [75, 9]]); // prettier-ignore
    expect(referenceAreas(slab)).toMatchObject({ meniscusDm2: null });
    expect(tracedRimAreaMm2(slab)).toBeCloseTo(Math.PI * 75 ** 2, 9);
  });

  test('PIECE-2 water out of the range of the table, or no weight, is refused', () => {
    expect(volumeOfWaterMl(300, 40)).toEqual({ ok: false, error: 'not-room-temperature' });
    expect(volumeOfWaterMl(300, Number.NaN)).toEqual({ ok: false, error: 'not-room-temperature' });
    expect(volumeOfWaterMl(-1, 20)).toEqual({ ok: false, error: 'not-a-weight' });
    expect(volumeOfWaterMl(99.91, 15)).toMatchObject({ ok: true, value: 100 });
  });
});
