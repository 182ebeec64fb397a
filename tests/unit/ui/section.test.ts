import { describe, expect, test } from 'vitest';
import { QUESTIONS } from '@/lib/checks/domain/questions';
import { PROFILES } from '@/lib/pieces/domain/profiles';
import { capacityOf, edgesOf, sectionOf, smoothLine, type Outline } from '@/lib/pieces/domain/section';

const FORMS = QUESTIONS.flatMap((question) => (question.id === 'form' ? [...question.options] : []));
const OURS = FORMS.filter((form) => form !== 'other');

/** The radius of an outline where it first passes a height on its way up. */
function radiusAt(outline: Outline, height: number): number | null {
  for (const [place, [radius, up]] of outline.entries()) {
    const before = outline[place - 1];
    if (before === undefined || up < height || before[1] > height) continue;
    return up === before[1] ? radius : before[0] + ((radius - before[0]) * (height - before[1])) / (up - before[1]);
  }
  return null;
}

test('every form that can be answered has a profile of its own, but "other"', () => {
  expect(Object.keys(PROFILES).sort()).toEqual([...OURS].sort());
});

describe.each(OURS)('%s', (form) => {
  const section = sectionOf(form, {});

  test('stands on the table and begins at the axis', () => {
    expect(Math.min(...section.outer.map(([, height]) => height))).toBe(0);
    expect(section.outer[0]?.[0]).toBe(0);
    expect(section.inner[0]?.[0]).toBe(0);
  });

  test('has clay between its two faces all the way up', () => {
    if (form === 'tile') return; // a slab: its faces lie above each other

    const floor = section.inner[0]?.[1] ?? 0;
    const rim = section.inner.at(-1)?.[1] ?? 0;
    for (let part = 0.15; part < 0.95; part += 0.1) {
      const height = floor + (rim - floor) * part;
      const [inside, outside] = [radiusAt(section.inner, height), radiusAt(section.outer, height)];
      if (inside !== null && outside !== null) expect(outside - inside, `at ${String(part)}`).toBeGreaterThan(1);
    }
  });
});

describe('measures', () => {
  test('a known depth is the depth of the drawing, exactly as far as numbers go', () => {
    const { fills } = sectionOf('bowl', { depthMm: 95 });
    expect((fills?.rim ?? 0) - (fills?.floor ?? 0)).toBeCloseTo(95, 9);
  });

  test('a known capacity is what the inner line holds', () => {
    expect(capacityOf(sectionOf('jar', { capacityMl: 1100 }).inner)).toBeCloseTo(1100, 6);
  });

  test('depth and capacity together make it wider or narrower', () => {
    const { inner, fills } = sectionOf('mug', { depthMm: 95, capacityMl: 350 });
    expect(capacityOf(inner)).toBeCloseTo(350, 6);
    expect((fills?.rim ?? 0) - (fills?.floor ?? 0)).toBeCloseTo(95, 9);
  });

  test('measures that fit no such form still give a drawing that looks like one', () => {
    const { inner } = sectionOf('bowl', { depthMm: 20, capacityMl: 1_000_000 });
    expect(capacityOf(inner)).toBeLessThan(1_000_000);
  });

  test.each([0, -5, Number.NaN, Number.POSITIVE_INFINITY])('a depth of %s is no depth', (depthMm) => {
    expect(sectionOf('bowl', { depthMm })).toEqual(sectionOf('bowl', {}));
  });

  test('a tile and an ornament have no inside to measure', () => {
    expect(sectionOf('tile', { depthMm: 30 }).fills).toBeNull();
    expect(sectionOf('ornament', {}).fills).toBeNull();
  });
});

test('an unknown form, and one by a name of nobody, give the neutral vessel', () => {
  expect(sectionOf(undefined, {}).known).toBe(false);
  expect(sectionOf('constructor', {})).toEqual(sectionOf(undefined, {}));
  expect(sectionOf('other', {})).toEqual(sectionOf(undefined, {}));
});

test('a mug of 95 mm drawn from its profile holds about what such mugs hold', () => {
  const capacity = capacityOf(sectionOf('mug', { depthMm: 92 }).inner);
  expect(capacity).toBeGreaterThan(300);
  expect(capacity).toBeLessThan(480);
});

test('edges above the foot are seen from outside, those under it are not', () => {
  expect(edgesOf(sectionOf('bowl', {}).outer)).toEqual([[34, 8]]);
});

test('a path is short and plain: numbers of two places, no word like NaN', () => {
  const path = smoothLine(sectionOf('teapot', {}).outer, ([radius, height]) => [160 - radius, 200 - height]);
  expect(path).toMatch(/^M[-\d.,MCLZ ]+$/);
});
