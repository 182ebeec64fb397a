import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { readEmailText } from '@/lib/accounts/domain/email-address';

describe('ACT-1 S22 an address', () => {
  test.each([
    ['mara@example.test', 'mara@example.test'],
    ['  Mara@Example.TEST ', 'mara@example.test'],
    ['MARA@EXAMPLE.TEST\n', 'mara@example.test'],
    ['ｍａｒａ＠ｅｘａｍｐｌｅ．ｔｅｓｔ', 'mara@example.test'],
    ['mara+pots@example.test', 'mara+pots@example.test'],
    ['mara@töpferei.example', 'mara@xn--tpferei-90a.example'],
  ])('%j is %j', (typed, kept) => {
    expect(readEmailText(typed)).toBe(kept);
  });

  test.each([
    'a@example.test,b@evil.example',
    'a@example.test;b@evil.example',
    'a@example.test b@evil.example',
    'a@b@example.test',
    '"a b"@example.test',
    '"a@evil.example"@example.test',
    'Mara <mara@example.test>',
    'mara@example.test\r\nBcc: b@evil.example',
    'mara\u0000@example.test',
    'mara\u202e@example.test',
    'ú1@example.test',
    'mara@localhost',
    'mara@127.0.0.1',
    'mara@[127.0.0.1]',
    'mara@example..test',
    '.mara@example.test',
    'mara@-example.test',
    'mara@example.test/path',
    'mara@example.test:25',
    `${'a'.repeat(65)}@example.test`,
    `mara@${'a'.repeat(300)}.test`,
    `mara@${'a.'.repeat(150)}test`,
    '@example.test',
    'mara@',
    'mara',
    '',
    ' ',
  ])('%j is refused', (typed) => {
    expect(readEmailText(typed)).toBeNull();
  });

  test('that was read is read as itself, and holds no mark that a header or a list could break at', () => {
    fc.assert(
      fc.property(fc.oneof(fc.emailAddress(), fc.string({ unit: 'binary', maxLength: 60 })), (typed) => {
        const kept = readEmailText(typed);
        if (kept === null) return;
        expect(readEmailText(kept)).toBe(kept);
        expect(kept).toMatch(/^[!-+\--:=?-~]+@[a-z0-9.-]+$/);
      }),
      { seed: 22, numRuns: 500 },
    );
  });
});
