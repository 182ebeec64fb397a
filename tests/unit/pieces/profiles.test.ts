import { describe, expect, test } from 'vitest';
import { insideDepthMm } from '@/lib/pieces/domain/region-measures';
import { PROFILES } from '@/lib/pieces/domain/profiles';
import { sectionOf, type Point } from '@/lib/pieces/domain/section';
import { MOST_POINTS, readVessel, type ProfileFault } from '@/lib/pieces/domain/vessel';
import { aVessel } from './vessels';

type Refused = readonly [name: string, points: readonly Point[], spill: number, fault: ProfileFault];

const BOWL: readonly Point[] = [[0, 0], [40, 0], [60, 50]]; // prettier-ignore
const long = Array.from({ length: MOST_POINTS + 1 }, (_, at): Point => [10 + at, at]);

const REFUSED: readonly Refused[] = [
  ['nothing', [], 0, { kind: 'too-few-points' }],
  ['one point', [[0, 0]], 0, { kind: 'too-few-points' }],
  ['one point twice', [[0, 5], [0, 5]], 0, { kind: 'too-few-points' }],
  ['more points than a pot needs', long, 0, { kind: 'too-many-points' }],
  ['a radius that is no number', [[0, 0], [Number.NaN, 5]], 0, { kind: 'not-a-number', at: 1 }],
  ['an endless height', [[0, 0], [5, Infinity]], 0, { kind: 'not-a-number', at: 1 }],
  ['a radius below zero', [[-1, 0], [5, 5]], 0, { kind: 'negative-radius', at: 0 }],
  ['micrometres', [[0, 0], [40_000, 50_000]], 0, { kind: 'too-large', at: 1 }],
  ['a line that begins at the rim', [[60, 50], [40, 0], [0, 0]], 0, { kind: 'no-opening' }],
  ['a line back to the centre', [[0, 0], [10, 5], [0, 10], [20, 20]], 0, { kind: 'back-at-centre', at: 2 }],
  ['a line that ends below its highest point', [[0, 0], [50, 20], [60, 18]], 0, { kind: 'rim-not-highest', at: 1 }],
  ['a line that crosses itself', [[0, 0], [50, 0], [50, 30], [20, 30], [20, -10], [60, 40]], 0, { kind: 'crosses-itself', at: 4 }],
  ['a line that goes back over itself', [[0, 0], [50, 0], [30, 0], [60, 40]], 0, { kind: 'crosses-itself', at: 2 }],
  ['a wall that ends under the raised centre', [[0, 1.2], [30.4, 0], [5, 1]], 0, { kind: 'rim-covered', at: 1 }],
  ['a spout above the rim', BOWL, -1, { kind: 'bad-spill' }],
  ['a spout that is no number', BOWL, Number.NaN, { kind: 'bad-spill' }],
  ['a spout below the floor', BOWL, 51, { kind: 'spill-below-floor' }],
]; // prettier-ignore

describe('profiles', () => {
  test.each(REFUSED)('PIECE-1 refused: %s', (_, points, spillsBelowRimMm, fault) => {
    expect(readVessel({ points, spillsBelowRimMm })).toEqual({ ok: false, error: fault });
  });

  test('PIECE-1 a first point off the axis means a flat floor', () => {
    expect(aVessel([[40, 3], [40, 90]]).inner).toEqual([[0, 3], [40, 3], [40, 90]]); // prettier-ignore
  });

  test('PIECE-1 points that mark an edge by standing twice are read once', () => {
    expect(aVessel([[0, 0], [40, 0], [40, 0], [40, 90]]).inner).toHaveLength(3); // prettier-ignore
  });

  test('PIECE-1 a wall may lean in, and a centre may stand higher than the rim', () => {
    expect(readVessel({ points: [[0, 0], [50, 0], [30, 60]] }).ok).toBe(true); // prettier-ignore
    expect(readVessel({ points: [[0, 60], [20, 0], [50, 40]] }).ok).toBe(true); // prettier-ignore
  });

  test.each(Object.keys(PROFILES).filter((form) => form !== 'tile' && form !== 'ornament'))(
    'PIECE-1 our own drawing of a %s is read',
    (form) => {
      expect(readVessel({ points: sectionOf(form, {}).inner })).toMatchObject({ ok: true });
    },
  );
});

describe('depth', () => {
  test('PIECE-5 a raised centre takes nothing off the depth (SOR/2016-175 s. 1: from the lowest inside point)', () => {
    const raised = aVessel([[0, 12], [20, 3], [60, 3], [80, 30]]); // prettier-ignore
    expect(insideDepthMm(raised, 'rim-plane')).toBe(27);
  });

  test('PIECE-5 a spout below the rim tells the two ways of taking depth apart', () => {
    const spouted = aVessel([[0, 0], [50, 0], [55, 27]], 3); // prettier-ignore
    expect(insideDepthMm(spouted, 'rim-plane')).toBe(27);
    expect(insideDepthMm(spouted, 'overflow')).toBe(24);
  });

  test('PIECE-5 a slab has no depth', () => {
    expect(insideDepthMm(aVessel([[0, 9], [75, 9]]), 'overflow')).toBe(0); // prettier-ignore
  });
});
