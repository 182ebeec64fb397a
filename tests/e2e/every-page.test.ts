import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { faultsOf } from './axe';
import { openBrowser, SITE, visit } from './browser';
import { routes } from './every-route';

let browser: Browser;
let pages: readonly string[] = [];

beforeAll(async () => {
  browser = await openBrowser();
  pages = await routes(browser);
});
afterAll(async () => {
  await browser.close();
});

test('W1 axe finds nothing on any page, light or dark, and none scrolls sideways', async () => {
  const open = async (width: number) => (await visit(browser, { width })).newPage();
  expect(await faultsOf(open, pages)).toEqual([]);
}, 1_800_000);

test('S09 every page carries a fresh nonce, runs no foreign script, and no policy is broken', async () => {
  const page = await (await visit(browser)).newPage();
  const broken: string[] = [];
  page.on('console', (message) => {
    if (/Content Security Policy/i.test(message.text())) broken.push(message.text());
  });
  const nonces = new Set<string>();
  for (const path of pages) {
    const answer = await page.goto(path);
    const policy = answer?.headers()['content-security-policy'] ?? '';
    nonces.add(/'nonce-([^']+)'/.exec(policy)?.[1] ?? `none on ${path}`);
    expect([path, /unsafe-eval|script-src[^;]*unsafe-inline/.test(policy)]).toEqual([path, false]);
  }
  expect(broken).toEqual([]);
  expect(nonces.size).toBe(pages.length);
});

test('S08 every answer says how it may be used, also errors and the API', async () => {
  for (const path of ['/', '/nope', '/regions/zz', '/api/health', '/api/v1/regions', '/api/v1/rules/none', '/robots.txt', '/icon.svg']) {
    const { headers } = await fetch(SITE + path);
    expect([path, headers.get('x-content-type-options'), headers.get('referrer-policy')]).toEqual([path, 'nosniff', 'same-origin']);
    expect([path, headers.get('x-powered-by')]).toEqual([path, null]);
    expect(headers.get('content-security-policy')).toMatch(/frame-ancestors 'none'/);
  }
});

test('S04 a form that another site sends is refused and changes nothing', async () => {
  const page = await (await visit(browser)).newPage();
  await page.goto('/check');
  const action = await page
    .locator('form:has(input[name="region"]) input[type="hidden"]')
    .evaluateAll((inputs) => inputs.map((input) => [(input as HTMLInputElement).name, (input as HTMLInputElement).value] as const));
  for (const origin of ['https://evil.example.test', 'null', undefined]) {
    const form = new FormData();
    for (const [name, value] of action) form.append(name, value);
    form.append('region', 'dk');
    const answer = await fetch(`${SITE}/check`, {
      method: 'POST',
      body: form,
      redirect: 'manual',
      headers: origin === undefined ? {} : { origin },
    });
    expect([origin, answer.status]).toEqual([origin, 403]);
  }
  const key = action.find(([name]) => name === 'key')?.[1] ?? '';
  expect((await fetch(`${SITE}/check/${key}/review`)).status).toBe(404);
});
