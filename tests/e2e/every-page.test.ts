import AxeBuilder from '@axe-core/playwright';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { checkBriefly, choosePlace, MUG, openBrowser, SITE, visit } from './browser';

let browser: Browser;
let pages: readonly string[] = [];

/** Figures of one mug held against two places, kept at an address. */
async function readingsOf(page: Page): Promise<string> {
  await page.goto('/readings');
  for (const place of ['eu', 'jp']) await choosePlace(page, place);
  await page.locator('select[name="use"]').selectOption('food');
  await page.locator('[name="readings.value.1"]').fill('0.31');
  await page.getByRole('button', { name: 'Hold against the limits', exact: true }).first().click();
  await page.waitForURL(/\/readings\/[A-Za-z0-9_-]{22}/);
  return new URL(page.url()).pathname;
}

/** Every kind of page there is, with a check and a copy that exist. */
async function routes(): Promise<readonly string[]> {
  const page = await (await visit(browser)).newPage();
  await checkBriefly(page, ['dk', 'us-ca'], MUG);
  await page.getByRole('button', { name: 'Show my checklist' }).click();
  await page.waitForURL(/\/check\/[A-Za-z0-9_-]{22}$/);
  const check = new URL(page.url()).pathname;
  await page.getByRole('button', { name: 'Keep a dated copy' }).click();
  await page.waitForURL(/\/copies\//);
  const copy = new URL(page.url()).pathname;
  await page.goto(`${check}/depth-mm`);
  await page.locator('input[name="depth-mm"]').fill('deep');
  await page.getByRole('button', { name: 'Carry on' }).click();
  await page.waitForURL(/look=1/);
  const readings = await readingsOf(page);
  await page.goto('/sources?region=dk');
  const source = (await page.locator('main a[href^="/sources/"]').first().getAttribute('href')) ?? '';
  await page.context().close();
  return [
    '/',
    '/regions',
    '/regions?q=zzzz',
    '/search',
    '/search?q=lead&region=dk',
    '/search?q=qqqqzzzz',
    '/regions?q=egypt',
    '/regions/wishes',
    '/regions/wishes?why=too-many',
    '/changes',
    '/changes?region=us-ca',
    '/sources',
    '/sources?region=jp&q=act',
    source,
    '/limits',
    '/limits?region=dk&region=us-ca&region=jp',
    '/regions/dk',
    '/regions/eu/on/2020-01-01',
    '/rules/ca-nonfood-warning',
    '/check',
    '/check?why=none',
    `${check}/use`,
    `${check}/form`,
    `${check}/depth-mm?look=1`,
    `${check}/turnover-a-year`,
    `${check}/seller-region`,
    `${check}/places`,
    `${check}/review`,
    check,
    `${check}?place=dk`,
    copy,
    '/readings',
    readings,
    '/substances/pb',
    '/privacy',
    '/cautions',
    '/heard',
    '/coverage',
    '/notes',
    '/notes/cones-and-the-1000-degree-line',
    '/notes/leach-test',
    '/notes/other-colourants',
    '/words',
    '/words/crazing',
    '/accessibility',
    '/contact',
    '/day-book',
    '/regions/dk/editions',
    '/regions/dk/editions/compare',
    '/regions/jp/editions/1',
    '/problems/not-understood',
    '/broken',
    '/nope',
  ];
}

beforeAll(async () => {
  browser = await openBrowser();
  pages = await routes();
});
afterAll(async () => {
  await browser.close();
});

const TAGS = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'];

async function widerThanScreen(page: Page): Promise<number> {
  return page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
}

/** Rules whose outcome the colours decide; all others come out the same in both themes. */
const COLOUR_RULES = ['color-contrast', 'link-in-text-block'];

test.each([320, 1280])(
  'W1 at %i px, light and dark: axe finds nothing on any page, and none scrolls sideways',
  async (width) => {
    const page = await (await visit(browser, { width })).newPage();
    const faults: unknown[] = [];
    const look = async (path: string, theme: string, axe: AxeBuilder): Promise<void> => {
      const { violations } = await axe.analyze();
      faults.push(...violations.map(({ id, nodes }) => ({ path, theme, id, at: nodes.slice(0, 3).map(({ target }) => target.join(' ')) })));
    };
    for (const path of pages) {
      await page.emulateMedia({ colorScheme: 'light' });
      await page.goto(path);
      await look(path, 'light', new AxeBuilder({ page }).withTags(TAGS));
      await page.emulateMedia({ colorScheme: 'dark' });
      await look(path, 'dark', new AxeBuilder({ page }).withRules(COLOUR_RULES));
      const wider = await widerThanScreen(page);
      if (wider > 0) faults.push({ path, wider });
    }
    expect(faults).toEqual([]);
  },
  600_000,
);

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
