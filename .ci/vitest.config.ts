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

const inBrowser: TestProjectConfiguration = {
  resolve,
  test: {
    name: 'e2e',
    environment: 'node',
    include: ['tests/e2e/**/*.test.{ts,tsx}'],
    globalSetup: ['tests/e2e/global.ts'],
    pool: 'forks',
    execArgv: ['--import', 'tsx'],
    maxWorkers: 1,
    sequence: { groupOrder: 4 },
    testTimeout: 120_000,
    hookTimeout: 120_000,
  },
};

export default defineConfig({
  root,
  test: {
    allowOnly: false,
    passWithNoTests: true,
    projects: [pure('unit', 0), pure('properties', 1), pure('cases', 2), onDatabase('db', 3, 2), inBrowser, onDatabase('long', 5, 1)],
  },
});
