import { spawn, type ChildProcess } from 'node:child_process';
import { cpSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createServer, type AddressInfo } from 'node:net';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { z } from 'zod';
import { SITE } from './browser';

const ROOT = join(import.meta.dirname, '../..');
const functions = z.looseObject({ functions: z.record(z.string(), z.unknown()) });

/** A second process of the site under test, on the same database, whose pages are not passed through proxy.ts. */
export type BareSite = { readonly site: string; readonly end: () => Promise<void> };

function freePort(): Promise<number> {
  return new Promise((resolve) => {
    const server = createServer().listen(0, () => {
      const { port } = server.address() as AddressInfo;
      server.close(() => {
        resolve(port);
      });
    });
  });
}

/** The build under test once more, with what calls proxy.ts taken out: as if that file had never been there. */
function buildWithoutProxy(): string {
  const built = process.env['FOOTRING_DIST'] ?? '.next-test';
  const bare = `${built}-bare`;
  rmSync(join(ROOT, bare), { recursive: true, force: true });
  cpSync(join(ROOT, built), join(ROOT, bare), { recursive: true, filter: (path) => !/\/(cache|diagnostics|types)$/.test(path) });
  const manifest = join(ROOT, bare, 'server/functions-config-manifest.json');
  const { functions: all, ...rest } = functions.parse(JSON.parse(readFileSync(manifest, 'utf8')));
  const kept = Object.fromEntries(Object.entries(all).filter(([name]) => name !== '/_middleware'));
  writeFileSync(manifest, JSON.stringify({ ...rest, functions: kept }));
  const edge = join(ROOT, bare, 'server/middleware-manifest.json');
  writeFileSync(edge, JSON.stringify({ version: 3, middleware: {}, functions: {}, sortedMiddleware: [] }));
  return bare;
}

async function untilItAnswers(site: string, child: ChildProcess): Promise<void> {
  for (let tries = 0; tries < 600 && child.exitCode === null; tries += 1) {
    const answer = await fetch(`${site}/api/health`).catch(() => null);
    if (answer?.ok === true) return;
    await wait(100);
  }
  throw new Error('The second site does not answer.');
}

/** Starts the second site. What it is told is what the first was told; only its port is another. */
export async function openBareSite(): Promise<BareSite> {
  const dist = buildWithoutProxy();
  const port = await freePort();
  const env = { ...process.env, NODE_ENV: 'production' as const, FOOTRING_DIST: dist, FOOTRING_SITE: SITE, PORT: String(port) };
  const child = spawn(process.execPath, ['node_modules/next/dist/bin/next', 'start', '-p', String(port)], {
    cwd: ROOT,
    env,
    stdio: 'ignore',
  });
  const over = new Promise<void>((resolve) =>
    child.once('exit', () => {
      resolve();
    }),
  );
  const site = `http://localhost:${String(port)}`;
  await untilItAnswers(site, child);
  const end = async (): Promise<void> => {
    child.kill('SIGTERM');
    await over;
    rmSync(join(ROOT, dist), { recursive: true, force: true });
  };
  return { site, end };
}
