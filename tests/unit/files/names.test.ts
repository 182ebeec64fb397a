import { describe, expect, test } from 'vitest';
import { dispositionOf, servedName, tidyFileName } from '@/lib/files/domain/file-name';
import { mustBeKey, newStoreKey } from '@/lib/server/file-store/file-store';

describe('FILE-5 S43 a file’s name', () => {
  test.each([
    ['../../etc/passwd', 'passwd'],
    ['..\\..\\boot.ini', 'boot.ini'],
    ['..\\', 'page-seen'],
    ['..', 'page-seen'],
    ['%2e%2e/%2e%2e/x.pdf', 'x.pdf'],
    ['%2e%2e%2fx.pdf', '%2e%2e%2fx.pdf'],
    ['/etc/shadow', 'shadow'],
    ['C:\\pots\\lead.pdf', 'lead.pdf'],
    ['a\u0000.pdf', 'a.pdf'],
    ['page.pdf.', 'page.pdf'],
    ['page.pdf. . .', 'page.pdf'],
    ['.htaccess', 'htaccess'],
    ['cafe\u0301.pdf', 'café.pdf'],
    ['in\u202efdp.exe', 'infdp.exe'],
    ['line\r\nset-cookie: a=b.pdf', 'lineset-cookie_ a=b.pdf'],
    ['a"b<c>.pdf', 'a_b_c_.pdf'],
    ['', 'page-seen'],
    ['   ', 'page-seen'],
    ['\ud800x.pdf', 'x.pdf'],
  ])('%j is kept as %j', (given, kept) => {
    expect(tidyFileName(given)).toBe(kept);
  });

  test('of 300 letters 200 stay, whole letters and no halves', () => {
    expect(Array.from(tidyFileName('🏺'.repeat(300)))).toHaveLength(200);
    expect(tidyFileName('x'.repeat(300))).toBe('x'.repeat(200));
    expect(tidyFileName(`${'x'.repeat(199)}.${'y'.repeat(100)}`)).toBe('x'.repeat(199));
  });

  test.each(['.', ' ', '. ', '/', '\u202e'])('S37 of a million times %j is kept as one without a name', (sign) => {
    expect(tidyFileName(sign.repeat(1_000_000))).toBe('page-seen');
  });
});

describe('FILE-8 a file is handed out', () => {
  test.each([
    ['page.html', 'text/plain', 'page.html.txt'],
    ['page.txt', 'text/plain', 'page.txt'],
    ['PAGE.PDF', 'application/pdf', 'PAGE.PDF'],
    ['x.svg', 'image/png', 'x.svg.png'],
    ['photo.jpeg', 'image/jpeg', 'photo.jpeg'],
    ['page-seen', 'image/webp', 'page-seen.webp'],
  ] as const)('%s of type %s as %s', (name, type, served) => {
    expect(servedName(name, type)).toBe(served);
  });

  test.each([
    ['glaze.pdf', `attachment; filename="glaze.pdf"; filename*=UTF-8''glaze.pdf`],
    ['Töpfe (1).pdf', `attachment; filename="T_pfe _1_.pdf"; filename*=UTF-8''T%C3%B6pfe%20%281%29.pdf`],
    ['a"b.pdf', `attachment; filename="a_b.pdf"; filename*=UTF-8''a%22b.pdf`],
    ["it's.pdf", `attachment; filename="it_s.pdf"; filename*=UTF-8''it%27s.pdf`],
  ])('under %s by the header as it must be written', (name, header) => {
    expect(dispositionOf('attachment', name)).toBe(header);
  });
});

test('FILE-5 S43 only a key of the store is a key: nothing else becomes part of a path', () => {
  expect(mustBeKey(newStoreKey())).toMatch(/^[0-9a-f]{32}$/);
  expect(newStoreKey()).not.toBe(newStoreKey());
  for (const wrong of [
    '',
    '../x',
    'a'.repeat(31),
    'A'.repeat(32),
    `${'a'.repeat(32)}\n`,
    `${'a'.repeat(30)}/.`,
    '%2e%2e%2f'.padEnd(32, '0'),
  ]) {
    expect(() => mustBeKey(wrong)).toThrow('no key');
  }
});
