import type { Browser, Page } from 'playwright-core';
import { checkBriefly, choosePlace, MUG, visit } from './browser';

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

/** Every kind of page there is, with a check and a copy that exist; those of search are tried by its own journey. */
export async function routes(browser: Browser): Promise<readonly string[]> {
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
    '/regions?q=egypt',
    '/regions/wishes',
    '/changes',
    '/sources',
    source,
    '/limits',
    '/limits?region=dk&region=us-ca&region=jp',
    '/regions/dk',
    '/regions/eu/on/2020-01-01',
    '/rules/ca-nonfood-warning',
    '/rules/ca-nonfood-warning/doubt',
    '/rules/ca-nonfood-warning/doubt/sent',
    '/check',
    '/check?why=none',
    `${check}/use`,
    `${check}/form`,
    `${check}/depth-mm?look=1`,
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
    '/words',
    '/words/crazing',
    '/terms/eu-flat',
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
