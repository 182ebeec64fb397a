import { existsSync, mkdirSync, readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { end, must, run } from './processes.mjs';
import { startMailStandIn } from './mail-stand-in.mjs';
import { Trouble } from './say.mjs';
import { dataFolder, freePort, root } from './settings.mjs';
import { appEnv, build, isBuilt, startSite, startWorker, untilHealthy } from './site.mjs';
import { startTestDatabase, testFolder } from './test-database.mjs';

const DIST = '.next-test';
/** The build of the tests is thrown away; its key protects nothing, and being always the same it lets a build be used again. */
const KEY = Buffer.from('footring tests, not a secret one').toString('base64');
const made = { dist: DIST, record: path.join(dataFolder, 'built-test'), key: KEY };
const node = (...args) => run(process.execPath, args, { env: cleanEnv() });
const tool = (file, ...args) => node(path.join('node_modules', file), ...args);

/** Kept byte for byte, since hashes are made of it; written for people in lines of their own length; rewritten by Next. As in `npm run format`. */
const UNFORMATTED = ['!tests/fixtures/**', '!content/seed/**', '!**/*.md', '!**/*.mdx', '!tsconfig.json'];

/** Every step in its order: what it is called, and what it does. A house step gives its exit code, a suite counts its tests. */
export const STEPS = [
  { name: 'format', work: () => house(tool('prettier/bin/prettier.cjs', '--check', '.', ...UNFORMATTED)) },
  { name: 'lint', work: () => house(tool('eslint/bin/eslint.js', '-c', '.ci/eslint.config.mjs', '--max-warnings', '0', '.')) },
  {
    name: 'rules',
    work: () => house(tool('dependency-cruiser/bin/dependency-cruise.mjs', '--config', '.ci/dependency-rules.cjs', ...sources())),
  },
  { name: 'types', work: () => house(tool('typescript/bin/tsc', '--noEmit', '-p', '.ci/tsconfig.node.json')) },
  { name: 'invariants', work: () => house(node('scripts/check-invariants.mjs')) },
  { name: 'content', work: () => house(tool('tsx/dist/cli.mjs', '--tsconfig', '.ci/tsconfig.node.json', 'scripts/content-report.ts')) },
  { name: 'unit', work: () => suite('unit') },
  { name: 'properties', work: () => suite('properties') },
  { name: 'cases', work: () => suite('cases') },
  { name: 'db', needs: ['database'], work: () => onDatabase((server) => suite('db', serverEnv(server))) },
  { name: 'build', work: () => house(buildSite()) },
  {
    name: 'budgets',
    work: async () =>
      (await buildSite()) === 0
        ? house(run(process.execPath, ['.ci/budgets.mjs'], { env: { ...cleanEnv(), FOOTRING_DIST: DIST } }))
        : { passed: 0, failed: 1 },
  },
  { name: 'e2e', needs: ['database', 'browser'], work: () => onDatabase((server) => journeys(server)) },
  { name: 'wide', onlyWhenNamed: true, needs: ['database', 'browser'], work: () => onDatabase((server) => journeys(server, EVERY_WIDTH)) },
  { name: 'long', onlyWhenNamed: true, needs: ['database'], work: () => onDatabase((server) => suite('long', serverEnv(server))) },
];

/** What the tools below lean on and a fresh checkout lacks: the types Next makes of the folders in app/. */
export async function prepare() {
  const log = path.join(dataFolder, 'typegen.log');
  await must('The types of the pages could not be made.', process.execPath, ['node_modules/next/dist/bin/next', 'typegen'], {
    log,
    env: cleanEnv(),
  });
}

let server;
async function onDatabase(work) {
  server ??= await startTestDatabase();
  return work(server);
}

/** Not a secret one: what it protects is thrown away with the database of the tests. */
const SECRET = Buffer.from('footring tests, not a secret one').toString('base64');

/** The journeys look at pages at 320 px; at every width there is, they take too long to wait for at each change. */
const EVERY_WIDTH = { FOOTRING_EVERY_WIDTH: 'yes' };

async function journeys(database, more = {}) {
  if ((await buildSite()) !== 0) return { passed: 0, failed: 1 };
  const port = await freePort();
  const site = `http://localhost:${port}`;
  const output = process.stdout.fd;
  const onDeath = (message) => process.stderr.write(`${message}\n`);
  const mail = await startMailStandIn({ folder: path.join(testFolder(), 'mail'), output: 'ignore', onDeath });
  const app = appEnv({ port, site, databaseUrl: database.appUrl('footring'), secret: SECRET, mailUrl: mail.mailUrl, demo: '1' });
  // Every journey comes from one address; the limit itself is tried on a site of its own.
  const env = { ...cleanEnv(), ...app, FOOTRING_API_PER_MINUTE: '1000000', DATABASE_OWNER_URL: database.ownerUrl('footring') };
  env.FOOTRING_STORE_DIR = path.join(testFolder(), 'store');
  await must('The tables could not be made.', process.execPath, ['--import', 'tsx', 'scripts/migrate.ts', '--seed'], {
    log: path.join(dataFolder, 'migrate-test.log'),
    env: { ...env, TSX_TSCONFIG_PATH: '.ci/tsconfig.node.json' },
  });
  const forApp = { ...env, DATABASE_OWNER_URL: '' };
  const running = [startWorker({ env: forApp, output, onDeath }), startSite({ ...made, port, host: null, env: forApp, output, onDeath })];
  try {
    await untilHealthy(site);
    return await suite('e2e', { ...env, ...more, NODE_ENV: '', FOOTRING_MAILBOX: mail.box });
  } finally {
    for (const started of [...running, mail.started]) await end(started);
  }
}

async function buildSite() {
  if (isBuilt(made)) {
    process.stdout.write('These sources are built already.\n');
    return 0;
  }
  try {
    await build({ ...made, env: cleanEnv() });
    return 0;
  } catch (error) {
    if (!(error instanceof Trouble)) throw error;
    process.stdout.write(`${error.message}\n`);
    return 1;
  }
}

async function house(code) {
  return (await code) === 0 ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 };
}

/** Runs one kind of tests and counts them from what vitest writes down. A run that dies or fails outside a test counts as one failure. */
async function suite(project, env = {}) {
  const folder = testFolder();
  const report = path.join(folder, `${project}.json`);
  mkdirSync(folder, { recursive: true });
  const args = [
    'run',
    '-c',
    '.ci/vitest.config.ts',
    '--project',
    project,
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${report}`,
  ];
  const code = await run(process.execPath, ['node_modules/vitest/vitest.mjs', ...args], { env: { ...cleanEnv(), ...env } });
  const { numPassedTests: passed, numFailedTests: failed } = existsSync(report)
    ? JSON.parse(readFileSync(report, 'utf8'))
    : { numPassedTests: 0, numFailedTests: 0 };
  return { passed, failed: code === 0 ? failed : Math.max(failed, 1) };
}

const serverEnv = (database) => ({
  FOOTRING_TEST_OWNER_URL: database.ownerUrl('footring'),
  FOOTRING_TEST_APP_URL: database.appUrl('footring'),
});

// Settings of a site that runs beside must not reach the tests.
function cleanEnv() {
  return {
    NODE_ENV: '',
    DATABASE_URL: '',
    DATABASE_OWNER_URL: '',
    FOOTRING_SITE: '',
    FOOTRING_SECRET: '',
    FOOTRING_MAIL_URL: '',
    FOOTRING_MAIL_FROM: '',
    FOOTRING_PROXIES: '',
    FOOTRING_DEMO: '',
    FOOTRING_STORE_DIR: '',
    FOOTRING_S3_ENDPOINT: '',
    FOOTRING_S3_BUCKET: '',
    FOOTRING_S3_KEY: '',
    FOOTRING_S3_SECRET: '',
    PORT: '',
    FOOTRING_DIST: DIST,
    NEXT_TELEMETRY_DISABLED: '1',
  };
}

function sources() {
  const folders = ['app', 'components', 'content', 'db', 'lib', 'tests', 'scripts'].filter((name) => existsSync(path.join(root, name)));
  return [...folders, ...readdirSync(root).filter((name) => /\.(ts|mjs)$/.test(name) && name !== 'next-env.d.ts')];
}
