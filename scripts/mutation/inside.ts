import { parentPort } from 'node:worker_threads';
import { ASYMMETRIC_MATCHERS_OBJECT, chai, JestAsymmetricMatchers, JestChaiExpect, JestExtend } from '@vitest/expect';

/* Stands in for the test runner inside the thread in which mutants are tried: it keeps the tests, and runs them as often as asked. */

type Work = (...row: never[]) => unknown;
type Kept = { readonly name: string; readonly work: () => unknown };

/** What the thread is told: which mutant is awake, and how often properties run. */
export type Planted = { now: number; runs: number };
export type Order = Planted & { readonly skip: readonly string[] };
/** The first test that failed, if any did. */
export type Tried = { readonly now: number; readonly failed: string | null };

declare global {
  var planted: Planted;
}

const kept: Kept[] = [];
let prefix = '';

type Tabled = (rows: readonly unknown[]) => (name: string, work: Work) => void;
type Test = ((name: string, work: Work) => void) & { each: Tabled };

const call = (work: Work, values: readonly unknown[]): unknown => (work as (...all: readonly unknown[]) => unknown)(...values);
const isList = (row: unknown): row is readonly unknown[] => Array.isArray(row);
const listOf = (row: unknown): readonly unknown[] => (isList(row) ? row : [row]);
const each: Tabled = (rows) => (name, work) => {
  for (const [at, row] of rows.entries()) {
    test(`${name} #${at}`, () => call(work, listOf(row)));
  }
};

export const test: Test = Object.assign(
  (name: string, work: Work): void => {
    kept.push({ name: `${prefix}${name}`, work: () => call(work, []) });
  },
  { each },
);
export const it = test;

export function describe(name: string, body: () => void): void {
  const before = prefix;
  prefix = `${before}${name} > `;
  body();
  prefix = before;
}
describe.each =
  (rows: readonly unknown[]) =>
  (name: string, body: (...row: readonly unknown[]) => void): void => {
    for (const [at, row] of rows.entries()) {
      describe(`${name} #${at}`, () => {
        body(...listOf(row));
      });
    }
  };

chai.use(JestExtend);
chai.use(JestChaiExpect);
chai.use(JestAsymmetricMatchers);
const matchers = (globalThis as Readonly<Record<symbol, unknown>>)[ASYMMETRIC_MATCHERS_OBJECT];
export const expect: unknown = Object.assign(
  (value: unknown, message?: string) => chai.expect(value, message),
  chai.expect,
  typeof matchers === 'object' ? matchers : {},
);

/** Milliseconds of each test when it last passed, and how many mutants it has found. */
const speed = new Map<string, number>();
const found = new Map<string, number>();
const promise = (name: string): number => (speed.get(name) ?? 0) / (1 + (found.get(name) ?? 0));

/** Quick tests that found much go first. Says which test begins, so that one that hangs is noticed. */
async function tryAll({ now, runs, skip }: Order): Promise<Tried> {
  globalThis.planted.now = now;
  globalThis.planted.runs = runs;
  const tests = kept.filter(({ name }) => !skip.includes(name)).sort((a, b) => promise(a.name) - promise(b.name));
  for (const { name, work } of tests) {
    parentPort?.postMessage(name);
    const began = performance.now();
    try {
      await work();
    } catch {
      found.set(name, 1 + (found.get(name) ?? 0));
      return { now, failed: name };
    }
    speed.set(name, performance.now() - began);
  }
  return { now, failed: null };
}

parentPort?.on('message', (order: Order) => {
  void tryAll(order).then((tried) => parentPort?.postMessage(tried));
});
