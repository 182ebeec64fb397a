import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';

const CSS = readFileSync(new URL('../../../app/styles/tokens.css', import.meta.url), 'utf8');
type Theme = 'light' | 'dark';

/** `--slip: light-dark(#f2f4f1, #141817)` as it is written; forced colours come after and have no numbers. */
const TOKENS = new Map(
  [...CSS.matchAll(/--([a-z-]+): light-dark\((#[0-9a-f]{6}), (#[0-9a-f]{6})\)/g)].map(([, name = '', light = '', dark = '']) => [
    name,
    { light, dark },
  ]),
);

function luminance(colour: string): number {
  const [red = 0, green = 0, blue = 0] = [1, 3, 5].map((at) => {
    const part = Number.parseInt(colour.slice(at, at + 2), 16) / 255;
    return part <= 0.040_45 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

function contrast(one: string, other: string, theme: Theme): number {
  const [lighter = 0, darker = 0] = [one, other].map((name) => luminance(TOKENS.get(name)?.[theme] ?? '')).sort((a, b) => b - a);
  return (lighter + 0.05) / (darker + 0.05);
}

const GROUNDS = ['slip', 'bisque', 'wash'];

/** The lowest contrast on slip, bisque and wash that the look promises, light and dark. */
const LOWEST: readonly (readonly [name: string, light: number, dark: number])[] = [
  ['iron', 12.7, 11.5],
  ['umber', 6.7, 7.2],
  ['celadon', 6.3, 7.9],
  ['cobalt', 7.0, 7.2],
  ['manganese', 7.2, 7.0],
  ['oxide', 6.1, 6.5],
  ['ash', 5.9, 8.0],
  ['copper', 6.5, 6.7],
  ['rule', 3.5, 4.5],
];

describe.each(['light', 'dark'] as const)('%s', (theme) => {
  test.each(LOWEST)('%s keeps its contrast on every ground', (name, light, dark) => {
    const lowest = Math.min(...GROUNDS.map((ground) => contrast(name, ground, theme)));
    expect(lowest).toBeGreaterThanOrEqual((theme === 'light' ? light : dark) - 0.05);
  });

  test('slip on celadon is readable on buttons', () => {
    expect(contrast('slip', 'celadon', theme)).toBeGreaterThanOrEqual(theme === 'light' ? 6.95 : 10.35);
  });

  test.each(['celadon', 'ash', 'copper', 'cobalt'])('on the wash of %s both iron and the colour itself are readable', (name) => {
    expect(contrast('iron', `wash-${name}`, theme)).toBeGreaterThanOrEqual(11.45);
    expect(contrast(name, `wash-${name}`, theme)).toBeGreaterThanOrEqual(5.85);
  });

  test.each(['cobalt', 'manganese', 'umber'])('%s is readable text on every panel', (name) => {
    for (const wash of ['celadon', 'ash', 'copper', 'cobalt']) expect(contrast(name, `wash-${wash}`, theme)).toBeGreaterThanOrEqual(4.5);
  });
});

test('every token of the look is there, in both themes', () => {
  expect(TOKENS.size).toBe(16);
});
