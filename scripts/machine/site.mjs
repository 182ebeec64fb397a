import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { begin, must } from './processes.mjs';
import { Trouble } from './say.mjs';
import { dataFolder, root } from './settings.mjs';

const NEXT = path.join(root, 'node_modules/next/dist/bin/next');
const SOURCES = ['app', 'components', 'lib', 'db', 'content', 'public'];

/** What a build is made from, as one hash: the sources, the settings files beside them, the locked packages and the key. */
export function fingerprint(key, folder = root) {
  const hash = createHash('sha256').update(`${key}\n${process.version}\n`);
  const beside = readdirSync(folder).filter((name) => /\.(ts|mjs|json)$/.test(name) && name !== 'next-env.d.ts' && !name.startsWith('.'));
  const inside = SOURCES.filter((name) => existsSync(path.join(folder, name))).flatMap((name) =>
    readdirSync(path.join(folder, name), { recursive: true, withFileTypes: true })
      .filter((entry) => entry.isFile())
      .map((entry) => path.relative(folder, path.join(entry.parentPath ?? entry.path, entry.name))),
  );
  for (const name of [...beside, ...inside].sort()) {
    hash.update(`${name}\0`).update(
      createHash('sha256')
        .update(readFileSync(path.join(folder, name)))
        .digest(),
    );
  }
  return hash.digest('hex');
}

/** True when the build in `dist` is a finished one of exactly these sources. `record` is the file that remembers it. */
export function isBuilt({ dist, record, key }) {
  const build = readOr(path.join(root, dist, 'BUILD_ID'));
  return build !== null && readOr(record) === `${fingerprint(key)} ${build}`;
}

/** Builds the site into `dist`. */
export async function build({ dist, record, key, env }) {
  const sources = fingerprint(key);
  rmSync(record, { force: true }); // so that a build cut short is seen the next time
  await must('The site could not be built.', process.execPath, [NEXT, 'build'], {
    log: path.join(dataFolder, `build${dist}.log`),
    env: { ...env, NODE_ENV: 'production', FOOTRING_DIST: dist, NEXT_SERVER_ACTIONS_ENCRYPTION_KEY: key, NEXT_TELEMETRY_DISABLED: '1' },
  });
  writeFileSync(record, `${sources} ${readOr(path.join(root, dist, 'BUILD_ID')) ?? ''}`);
}

/** What the site and its workers are told alike. Both get the application's account of the database, never the owner's. */
export function appEnv({ port, site, databaseUrl, secret, mailUrl, demo }) {
  return {
    NODE_ENV: 'production',
    PORT: String(port),
    FOOTRING_SITE: site,
    FOOTRING_SECRET: secret,
    FOOTRING_MAIL_URL: mailUrl ?? '',
    FOOTRING_DEMO: demo,
    DATABASE_URL: databaseUrl,
    DATABASE_OWNER_URL: '',
  };
}

/** Starts the built site. `env` is that of `appEnv`. */
export function startSite({ dist, port, host, env, key, onDeath, output }) {
  const listen = host === null ? [] : ['-H', host];
  const started = begin(process.execPath, [NEXT, 'start', '-p', String(port), ...listen], {
    output,
    env: {
      ...env,
      FOOTRING_DIST: dist,
      NEXT_SERVER_ACTIONS_ENCRYPTION_KEY: key,
      NEXT_TELEMETRY_DISABLED: '1',
    },
  });
  started.onDeath = (code) => onDeath?.(`The site ended by itself (${code}).`);
  return started;
}

/** Starts a worker: it sends mail, does jobs and tidies up. It needs some seconds to end what it has begun. */
export function startWorker({ env, onDeath, output }) {
  const started = begin(process.execPath, ['--import', 'tsx', 'scripts/worker.ts'], {
    output,
    patienceMs: 15_000,
    env: { ...env, TSX_TSCONFIG_PATH: '.ci/tsconfig.node.json' },
  });
  started.onDeath = (code) => onDeath?.(`The worker ended by itself (${code}).`);
  return started;
}

/** Waits until the site says that it and its database are well. */
export async function untilHealthy(address, limitMs = 120_000) {
  const until = Date.now() + limitMs;
  let last = 'no answer';
  while (Date.now() < until) {
    const answer = await ask(`${address}/api/health`);
    if (answer?.ok) return;
    if (answer !== null) last = `status ${answer.status}: ${(await answer.text()).slice(0, 300)}`;
    await wait(100);
  }
  throw new Trouble(`The site does not say that it is well: ${address}/api/health gives ${last}`);
}

/** Of some pages, those that are there. */
export async function pagesThere(address, pages) {
  const there = await Promise.all(pages.map(async ([place]) => (await ask(`${address}${place}`))?.ok === true));
  return pages.filter((_, index) => there[index]);
}

async function ask(url) {
  try {
    return await fetch(url, { signal: AbortSignal.timeout(5000), redirect: 'manual' });
  } catch {
    return null;
  }
}

function readOr(file) {
  return existsSync(file) ? readFileSync(file, 'utf8') : null;
}
