import ts from 'typescript';
import { describe, expect, test } from 'vitest';
import { everySource, hasHiddenAction, isOfActions, ungrounded, type Found } from '../../builders/found-doors';

test('ROL-13 S03 every server action stands on the ground that asks where it came from, and none hides in a function', () => {
  expect(everySource().filter(isOfActions).flatMap(ungrounded)).toEqual([]);
  expect(
    everySource()
      .filter(hasHiddenAction)
      .map(({ file }) => file),
  ).toEqual([]);
});

describe('ROL-13 the reading of sources finds what it is for', () => {
  const read = (text: string): Found => ({ file: 'x.ts', source: ts.createSourceFile('x.ts', text, ts.ScriptTarget.Latest, true) });
  const IMPORT = "import { guarded } from '@/lib/server/define-action';\n";

  test.each([
    ["'use server';\nexport async function a(): Promise<void> {}", ['x.ts a']],
    [`'use server';\n${IMPORT}export const a = guarded(work); export const b = async () => {};`, ['x.ts b']],
    ["'use server';\nimport { guarded } from './mine';\nexport const a = guarded(work);", ['x.ts a']],
    ["'use server';\nexport { a } from './elsewhere';", ["x.ts export { a } from './elsewhere';"]],
    [`'use server';\n${IMPORT}export const a = guarded(work);`, []],
  ])('%s', (text, faults) => {
    expect([isOfActions(read(text)), ungrounded(read(text))]).toEqual([true, faults]);
  });

  test('an action inside a function is found, one word in a text is not', () => {
    expect(hasHiddenAction(read("export const a = async () => { 'use server'; await b(); };"))).toBe(true);
    expect(hasHiddenAction(read("const a = 'use server'; export const b = () => { say('use server'); };"))).toBe(false);
  });
});
