import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { nextPlace } from '@/lib/accounts/domain/next-place';

const SITE = 'https://footring.example.test';
const AWAY = [
  '//evil.example',
  '///evil.example',
  '/\\evil.example',
  '\\\\evil.example',
  '/\t/evil.example',
  '/\n/evil.example',
  '/%09/evil.example',
  '/%2f/evil.example',
  '/%2F%2Fevil.example',
  '/%5cevil.example',
  'https:evil.example',
  'https://evil.example',
  'https:/evil.example',
  'http://footring.example.test@evil.example',
  '@evil.example',
  'javascript:alert(1)',
  'JaVaScRiPt:alert(1)',
  'data:text/html,x',
  ' //evil.example',
  '/ /evil.example',
  '/bench\r\nLocation: https://evil.example',
  '/bench\u0000',
  '/bench\u2028',
  './/evil.example',
  '/..//evil.example',
  '/./\\evil.example',
  '/.//evil.example',
  'evil.example',
  '?next=//evil.example',
  '#',
  '',
  `/${'a'.repeat(10_000)}`,
];

describe('ACT-4 S21 where one goes on', () => {
  test.each(AWAY)('%j leads nowhere else', (text) => {
    expect(nextPlace(text, '/bench')).toBe('/bench');
  });

  test.each([undefined, null, 0, [], {}, ['/bench']])('%j is no place', (value) => {
    expect(nextPlace(value, '/bench')).toBe('/bench');
  });

  test.each([
    ['/bench/account', '/bench/account'],
    ['/check/abc/use?look=1', '/check/abc/use?look=1'],
    ['/bench/account/name?look=0190a000-0000-4000-8000-000000000000', '/bench/account/name?look=0190a000-0000-4000-8000-000000000000'],
    ['/bench/../regions', '/regions'],
    ['/regions?q=//evil.example', '/regions?q=//evil.example'],
  ])('%j is %j', (text, place) => {
    expect(nextPlace(text, '/bench')).toBe(place);
  });

  test('stays on the site whatever was written', () => {
    const part = fc.constantFrom('/', '\\', '.', '%2f', '%5c', '@', ':', '//', 'evil.example', 'https:', '?', '#', '\t', 'a', '%09', ' ');
    fc.assert(
      fc.property(fc.array(part, { maxLength: 8 }), (parts) => {
        const place = nextPlace(`/${parts.join('')}`, '/bench');
        expect(new URL(place, SITE).origin).toBe(SITE);
        expect(place).not.toMatch(/^\/[/\\]/);
      }),
      { seed: 21, numRuns: 2000 },
    );
  });
});
