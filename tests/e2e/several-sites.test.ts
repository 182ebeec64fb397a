import { readFileSync, readdirSync } from 'node:fs';
import { request } from 'node:http';
import path from 'node:path';
import { afterEach, expect, test } from 'vitest';
import { startSiteProcess, type SiteProcess } from '../builders/site-process';
import { SITE } from './browser';

let other: SiteProcess | undefined;
afterEach(() => {
  other?.child.kill('SIGKILL');
});

const CHECK = JSON.stringify({ regions: ['dk'], on: '2026-12-01', answers: { use: 'food', form: 'mug' } });
const check = (address: string, headers: Record<string, string> = {}): Promise<Response> =>
  fetch(`${address}/api/v1/checks`, { method: 'POST', headers: { 'content-type': 'application/json', ...headers }, body: CHECK });

type Begun = { readonly finish: () => void; readonly status: Promise<number> };

/** A check whose head the server has read, since it asks for the body: from here on it is in the house. */
function begin(address: string): Promise<Begun> {
  return new Promise((resolve, reject) => {
    const headers = { 'content-type': 'application/json', 'content-length': Buffer.byteLength(CHECK), expect: '100-continue' };
    const asked = request(`${address}/api/v1/checks`, { method: 'POST', headers, agent: false });
    const status = new Promise<number>((answered, failed) => {
      asked.once('response', (answer) => {
        answer.resume();
        answered(answer.statusCode ?? 0);
      });
      asked.once('error', failed);
    });
    status.catch(reject);
    asked.once('continue', () => {
      resolve({ finish: () => asked.end(CHECK), status });
    });
    asked.flushHeaders();
  });
}

test('SRV-7 F14 a site told to end with fifty requests in flight answers all of them and is gone within 15 seconds', async () => {
  other = await startSiteProcess();
  const { address, child, ended } = other;
  expect((await check(address)).status).toBe(200); // the lines are compiled by then
  const begun = await Promise.all(Array.from({ length: 50 }, () => begin(address)));
  const told = Date.now();
  child.kill('SIGTERM');
  for (const { finish } of begun) finish();
  const statuses = await Promise.all(begun.map(({ status }) => status));
  // On a machine that is very busy some may be told to come back; each is answered.
  expect(statuses.filter((status) => status !== 200 && status !== 503)).toEqual([]);
  expect(statuses).toContain(200);
  expect([0, 143]).toContain(await ended); // Next says by 143 that it ended because it was told to
  expect(Date.now() - told).toBeLessThan(15_000);
  await expect(check(address)).rejects.toThrow();
});

test('SRV-13 SRV-15 S49 the API’s limit goes by the address of the socket: no X-Forwarded-For resets it', async () => {
  other = await startSiteProcess({ FOOTRING_API_PER_MINUTE: '30' });
  const statuses: number[] = [];
  for (let call = 0; call < 32; call += 1) {
    const spoofed = { 'x-forwarded-for': `198.51.100.${String(call)}`, 'x-footring-peer': `198.51.100.${String(call)}` };
    statuses.push((await check(other.address, spoofed)).status);
  }
  expect(statuses.filter((status) => status === 200).length).toBeLessThanOrEqual(30);
  expect(statuses.at(-1)).toBe(429);
});

test('S56 a form drawn by one process is taken by another', async () => {
  other = await startSiteProcess();
  const page = await (await fetch(`${SITE}/check`)).text();
  const form = /<form[^>]*method="POST"[^>]*>(?:(?!<\/form>)[\s\S])*name="region"[\s\S]*?<\/form>/i.exec(page)?.[0] ?? '';
  const sent = new FormData();
  for (const [field] of form.matchAll(/<input[^>]*type="hidden"[^>]*>/g)) {
    const valueOf = (name: string): string => (new RegExp(`\\b${name}="([^"]*)"`).exec(field)?.[1] ?? '').replaceAll('&quot;', '"');
    sent.append(valueOf('name'), valueOf('value'));
  }
  sent.append('region', 'dk');
  const headers = { origin: SITE, 'x-forwarded-host': new URL(SITE).host };
  const answer = await fetch(`${other.address}/check`, { method: 'POST', headers, body: sent, redirect: 'manual' });
  expect(answer.status).toBe(303);
  expect(answer.headers.get('location')).toMatch(/\/check\/[\w-]{22}\/use$/);
});

test('S55 nothing is served that is not meant for readers', async () => {
  const places = [
    '/.env',
    '/.env.local',
    '/.git/config',
    '/.git/HEAD',
    '/.data/secrets.json',
    '/package.json',
    '/package-lock.json',
    '/next.config.mjs',
    '/_next/mcp',
    '/_next/webpack-hmr',
    '/__nextjs_original-stack-frames',
    '/__nextjs_source-map',
    '/_next/static/../../package.json',
    '/_next/static/%2e%2e/%2e%2e/package.json',
    '/api/v1/../../.env',
  ];
  for (const place of places) expect((await fetch(SITE + place, { redirect: 'manual' })).status, place).toBe(404);
  const page = await (await fetch(`${SITE}/regions/dk`)).text();
  const scripts = [...page.matchAll(/\/_next\/static\/[^"\\]+\.(?:js|css)/g)].map(([place]) => place);
  expect(scripts.length).toBeGreaterThan(0);
  for (const place of new Set(scripts)) expect((await fetch(`${SITE}${place}.map`)).status, place).toBe(404);
  const health: unknown = await (await fetch(`${SITE}/api/health`)).json();
  expect(Object.keys(health as object).sort()).toEqual(['database', 'mail', 'status', 'store', 'version', 'worker']);
});

test('S51 no secret of the settings is in what browsers are given, and none is named for them', async () => {
  const password = new URL(process.env['DATABASE_URL'] ?? '').password;
  const secrets = [password, process.env['FOOTRING_SECRET'] ?? '', 'FOOTRING_SECRET', 'DATABASE_URL', 'NEXT_PUBLIC_'];
  expect(secrets.every((secret) => secret.length > 8)).toBe(true);
  const folder = path.join(process.env['FOOTRING_DIST'] ?? '.next', 'static');
  const files = readdirSync(folder, { recursive: true, withFileTypes: true }).filter((entry) => entry.isFile());
  expect(files.length).toBeGreaterThan(5);
  const texts = files.map((file) => readFileSync(path.join(file.parentPath, file.name), 'latin1'));
  for (const place of ['/', '/check', '/regions/dk', '/sign-in']) texts.push(await (await fetch(SITE + place)).text());
  for (const secret of secrets)
    expect(
      texts.some((text) => text.includes(secret)),
      secret.slice(0, 4),
    ).toBe(false);
});
