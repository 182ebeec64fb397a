import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';

const STYLES = new URL('../../../app/styles/', import.meta.url);
const FILES = readdirSync(STYLES).filter((file) => file.endsWith('.css'));
const read = (file: string): string => readFileSync(new URL(file, STYLES), 'utf8').replace(/\/\*[\s\S]*?\*\//g, '');

describe.each(FILES)('%s', (file) => {
  const css = read(file);

  test('I3 names no side of the screen, so that it also reads from right to left', () => {
    const physical =
      /(?:^|[\s{;])(?:(?:margin|padding|border)-(?:left|right|top|bottom)|left|right|top|bottom|float|(?:min-|max-)?(?:width|height))\s*:/gm;
    expect(css.replace(/@media[^{]*/g, '').match(physical) ?? []).toEqual([]);
    expect(css).not.toMatch(/text-align:\s*(left|right)/);
  });

  test('has its colours from the tokens', () => {
    if (file === 'tokens.css' || file === 'print.css') return;
    expect(css.match(/#[0-9a-f]{3,8}\b|rgba?\(|hsla?\(/gi) ?? []).toEqual([]);
  });

  test('W22 moves nothing for longer than 200 ms, and nothing but opacity and transform', () => {
    for (const [, rule = ''] of css.matchAll(/transition:\s*([^;]+);/g)) {
      if (rule.includes('none')) continue;
      expect(rule).toMatch(/^(opacity|transform) \d{1,3}ms$/);
      expect(Number.parseInt(rule.split(' ')[1] ?? '', 10)).toBeLessThanOrEqual(200);
    }
    expect(css).not.toMatch(/@keyframes|gradient\(|box-shadow/);
  });
});
