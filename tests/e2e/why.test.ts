import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { checkBriefly, openBrowser, visit } from './browser';

let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(async () => {
  await browser.close();
});

const SAID = { use: 'food', form: 'mug', 'holds-liquid': 'yes', 'depth-mm': '95' };

test.each([
  ['with script', true],
  ['without script', false],
])('CHECK-64 %s every line says why, and the next fact leads to its question', async (_, script) => {
  const page = await (await visit(browser, { script })).newPage();
  await checkBriefly(page, ['dk'], SAID);
  await page.getByRole('button', { name: 'Show my checklist' }).click();
  await page.waitForURL(/\/check\/[A-Za-z0-9_-]{22}$/);
  const why = page.locator('article summary', { hasText: 'Why?' });
  expect(await why.count()).toBe(await page.locator('article').count());
  await why.first().click();
  expect(await page.locator('article details[open]').first().innerText()).toMatch(/because/);

  const fact = page.getByRole('region', { name: 'The cheapest next fact' });
  const link = fact.getByRole('link').first();
  const address = (await link.getAttribute('href')) ?? '';
  await link.click();
  await page.waitForURL((url) => url.pathname === address);
  await page.goBack();

  await page.getByRole('button', { name: 'Keep a dated copy' }).click();
  await page.waitForURL(/\/copies\//);
  expect(await page.locator('article summary', { hasText: 'Why?' }).count()).toBe(await page.locator('article').count());
  expect(await page.locator('main a[href^="/check/"]').count()).toBe(0);
});
