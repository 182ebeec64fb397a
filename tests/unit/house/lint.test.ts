import { ESLint } from 'eslint';
import { beforeAll, describe, expect, test } from 'vitest';

/** One wrong line, and the lint rule that refuses it. */
type Example = readonly [line: string, rule: string];

const SYNTAX = 'no-restricted-syntax';
const AS = '@typescript-eslint/consistent-type-assertions';

/** By the file they would stand in. Each example is one line, so that a fault shows which example it refuses. */
const REFUSED: Readonly<Record<string, readonly Example[]>> = {
  'db/regions.ts': [
    ["import type { Knex } from 'knex'; declare const db: Knex; declare const trx: Knex.Transaction; declare const code: string;", ''],
    ['export async function a(): Promise<void> { await trx.commit(); }', SYNTAX],
    ['export async function b(): Promise<unknown> { return db.transaction(); }', SYNTAX],
    ['export const c = db.raw(`SELECT * FROM regions WHERE code = ${code}`);', SYNTAX],
    ["export const d = db('regions').whereRaw('code = ' + code);", SYNTAX],
    ["export const e = db('regions').forUpdate().skipLocked();", SYNTAX],
    ["export const f = db.raw('SELECT GET_LOCK(?, 5)', ['x']);", SYNTAX],
    ["export const g = db.raw('SELECT id FROM regions FOR UPDATE SKIP LOCKED');", SYNTAX],
    ["export const h = code as 'dk';", AS],
    ["console.log('here');", 'no-console'],
  ],
  'lib/regions/list-regions.ts': [
    ['export function a(value: any): void { void value; }', '@typescript-eslint/no-explicit-any'],
    ['export const b = (list: readonly string[]): string => list[0]!;', '@typescript-eslint/no-non-null-assertion'],
    ["export const c = 'x' as string;", AS],
    ["export const d: string = JSON.parse('1');", '@typescript-eslint/no-unsafe-assignment'],
    ["export enum E { One = 'one' }", SYNTAX],
    ["export const f = new Function('return 1');", 'no-new-func'],
    ["export const g: unknown = eval('1');", 'no-eval'],
    ['export async function h(): Promise<void> { Promise.resolve(1); }', '@typescript-eslint/no-floating-promises'],
    ['export const i = (n: number) => n;', '@typescript-eslint/explicit-module-boundary-types'],
    ['export default b;', SYNTAX],
    ['// @ts-ignore', '@typescript-eslint/ban-ts-comment'],
  ],
  'lib/regions/domain/rule.ts': [
    ['export const a = (): Date => new Date();', SYNTAX],
    ['export const b = (): number => Math.random();', SYNTAX],
    ["export function c(): void { throw new Error('no'); }", SYNTAX],
    ["export const d = process.env['PORT'];", 'no-restricted-globals'],
    ['export const e = (list: readonly string[]): string => list[0]!;', '@typescript-eslint/no-non-null-assertion'],
  ],
  'app/not-found.tsx': [
    ["import type { ReactElement } from 'react';", ''],
    ["export const A = (): ReactElement => <p dangerouslySetInnerHTML={{ __html: 'x' }} />;", SYNTAX],
    ["export const B = (): ReactElement => <img src='x.png' />;", 'jsx-a11y/alt-text'],
  ],
};

const ACCEPTED: Readonly<Record<string, readonly string[]>> = {
  'lib/regions/list-regions.ts': [
    "export const kinds = ['bloc', 'country'] as const;",
    "export const one = (list: readonly string[]): string => list[0] ?? 'none';",
  ],
  'lib/regions/schema.ts': ["export const code = 'dk' as string;"],
  'lib/checks/domain/tape.ts': ['export const at = (tape: Uint8Array, place: number): number => tape[place]!;'],
  'app/not-found.tsx': [
    "import type { ReactElement } from 'react';",
    'export default function NotFound(): ReactElement { return <p>Not here</p>; }',
  ],
};

// On a CI machine typescript-eslint would read the files as they lie on the disk, not the lines given here.
process.env['TSESTREE_SINGLE_RUN'] = 'false';

const eslint = new ESLint({ overrideConfigFile: '.ci/eslint.config.mjs' });

async function faultsIn(file: string, text: string): Promise<readonly { readonly line: number; readonly rule: string }[]> {
  const [result] = await eslint.lintText(text, { filePath: file });
  return (result?.messages ?? []).map(({ line, ruleId, message }) => ({ line, rule: ruleId ?? message }));
}

/** A function of so many statements, so many of them branches. */
function longFunction(statements: number, branches: number): string {
  const lines = Array.from({ length: statements }, (_, n) => (n < branches ? `  if (sum === ${n}) sum += 2;` : `  sum += ${n};`));
  return ['export function add(start: number): number {', '  let sum = start;', ...lines, '  return sum;', '}', ''].join('\n');
}

describe.each(Object.entries(REFUSED))('lint in %s', (file, examples) => {
  let faults: Awaited<ReturnType<typeof faultsIn>> = [];
  beforeAll(async () => {
    faults = await faultsIn(file, examples.map(([line]) => line).join('\n'));
  });

  test.each(examples.map((example, index) => [...example, index + 1] as const).filter(([, rule]) => rule !== ''))(
    'refuses %s',
    (_, rule, line) => {
      expect(faults.filter((fault) => fault.line === line).map((fault) => fault.rule)).toContain(rule);
    },
  );
});

test.each(Object.entries(ACCEPTED))('lint accepts in %s what belongs there', async (file, lines) => {
  expect(await faultsIn(file, `${lines.join('\n')}\n`)).toEqual([]);
});

describe('lint of sizes', () => {
  const rulesIn = async (file: string, text: string): Promise<readonly string[]> => (await faultsIn(file, text)).map(({ rule }) => rule);

  test('refuses a function over 50 lines', async () => {
    expect(await rulesIn('lib/regions/list-regions.ts', longFunction(50, 0))).toEqual(['max-lines-per-function']);
  });

  test('refuses a file over 250 lines', async () => {
    expect(await rulesIn('lib/regions/list-regions.ts', '// line\n'.repeat(252))).toEqual(['max-lines']);
  });

  test('refuses more than eight ways through a function', async () => {
    expect(await rulesIn('lib/regions/list-regions.ts', longFunction(10, 8))).toEqual(['complexity']);
  });

  test('leaves tests and migrations as long as they have to be', async () => {
    expect(await rulesIn('tests/db/setup.ts', longFunction(260, 9))).toEqual([]);
    expect(await rulesIn('db/migrations/001_regions.ts', longFunction(260, 9))).toEqual([]);
  });
});
