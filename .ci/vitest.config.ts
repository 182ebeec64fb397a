import { fileURLToPath } from 'node:url';
import { defineConfig, type TestProjectConfiguration } from 'vitest/config';

const root = fileURLToPath(new URL('..', import.meta.url));
const resolve = { alias: { '@': root.replace(/\/$/, ''), 'server-only': fileURLToPath(new URL('empty.ts', import.meta.url)) } };

// Knex loads migrations and seeds by itself, past Vite: the workers it runs in know TypeScript and our paths through this.
process.env['TSX_TSCONFIG_PATH'] = fileURLToPath(new URL('tsconfig.node.json', import.meta.url));

/** Tests that need nothing but Node. Those of a kind run before the next kind begins. */
function pure(name: string, groupOrder: number): TestProjectConfiguration {
  return {
    resolve,
    test: {
      name,
      environment: 'node',
      include: [`tests/${name}/**/*.test.{ts,tsx}`],
      sequence: { groupOrder },
      testTimeout: 60_000,
      hookTimeout: 60_000,
    },
  };
}

/** Tests on a real MariaDB, each worker with a database of its own. Those of `long` take minutes and are run by `npm run test:long`. */
function onDatabase(name: 'db' | 'long', groupOrder: number, maxWorkers: number): TestProjectConfiguration {
  return {
    resolve,
    test: {
      name,
      environment: 'node',
      include: [`tests/${name}/**/*.test.ts`],
      globalSetup: ['tests/db/global.ts'],
      setupFiles: ['tests/db/setup.ts'],
      pool: 'forks',
      execArgv: ['--import', 'tsx'],
      maxWorkers,
      sequence: { groupOrder },
      testTimeout: 30_000,
      hookTimeout: 60_000,
    },
  };
}

/** These count rows before and after, and so can have nobody else at work on the site. */
const ALONE = ['tests/e2e/protected-paths.test.ts', 'tests/e2e/stewards.test.ts'];

/** Journeys on one site, in a real browser. */
function inBrowser(name: 'e2e' | 'e2e-alone', groupOrder: number, maxWorkers: number): TestProjectConfiguration {
  return {
    resolve,
    test: {
      name,
      environment: 'node',
      ...(name === 'e2e' ? { include: ['tests/e2e/**/*.test.{ts,tsx}'], exclude: ALONE } : { include: ALONE }),
      globalSetup: ['tests/e2e/global.ts'],
      pool: 'forks',
      execArgv: ['--import', 'tsx'],
      maxWorkers,
      sequence: { groupOrder },
      testTimeout: 120_000,
      hookTimeout: 120_000,
    },
  };
}

export default defineConfig({
  root,
  test: {
    allowOnly: false,
    passWithNoTests: true,
    projects: [
      ...[pure('unit', 0), pure('properties', 1), pure('cases', 2), onDatabase('db', 3, 2)],
      ...[inBrowser('e2e', 4, 2), inBrowser('e2e-alone', 5, 1), onDatabase('long', 6, 1)],
    ],
  },
});
