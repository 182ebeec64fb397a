import { spawnSync } from 'node:child_process';
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { expect, test } from 'vitest';

/** What the check says of a slice with these promises and these tests. */
function check(promises: string, tests: string): { readonly code: number | null; readonly said: string } {
  const folder = mkdtempSync(path.join(tmpdir(), 'footring-invariants-'));
  try {
    mkdirSync(path.join(folder, 'lib/regions'), { recursive: true });
    mkdirSync(path.join(folder, 'tests/unit'), { recursive: true });
    writeFileSync(path.join(folder, 'lib/regions/invariants.md'), promises);
    writeFileSync(path.join(folder, 'tests/unit/regions.test.ts'), tests);
    const { status, stdout } = spawnSync(process.execPath, ['scripts/check-invariants.mjs', folder], { encoding: 'utf8' });
    return { code: status, said: stdout };
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

const promised = '# Regions\n\n- REG-4 four eyes, see also REG-5\n- **REG-5** nothing is buried\n';

test('a promise that a test names is kept, whichever kind of test it is', () => {
  const tests = "test('REG-4 no own text', () => {});\ntest.each([1, 2])(`REG-5 %s is not buried`, () => {});\n";
  expect(check(promised, tests)).toEqual({ code: 0, said: '' });
});

test('a promise that no test names is a fault', () => {
  expect(check(promised, "test('REG-4 no own text', () => { /* REG-5 */ });\n")).toEqual({
    code: 1,
    said: 'REG-5 of lib/regions/invariants.md is named by no test\n',
  });
});

test('a number that nobody promised is a fault, and so is a family nobody knows', () => {
  const tests = "describe('REG-4 REG-5', () => { test('REG-6 more', () => {}); test('RGE-4 slip', () => {}); });\n";
  expect(check(promised, tests).said.trim().split('\n')).toEqual([
    'tests/unit/regions.test.ts names REG-6, which no invariants.md promises',
    'tests/unit/regions.test.ts names RGE-4, which no invariants.md promises',
  ]);
});

test('a standard named in passing is no promise', () => {
  const tests = "test('REG-4 and REG-5 hold for ISO-6486 sheets', () => {});\n";
  expect(check(promised, tests).code).toBe(0);
});

test('a number promised twice is a fault', () => {
  expect(check(`${promised}- REG-4 again\n`, "test('REG-4 REG-5 both', () => {});\n").said).toContain('REG-4 is promised twice');
});
