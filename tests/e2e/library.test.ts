import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { openBrowser, visit } from './browser';

let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(async () => {
  await browser.close();
});

const plain = async (width = 320): Promise<Page> => (await visit(browser, { script: false, width })).newPage();

describe('J2 finding a place without script', () => {
  test('by a name in its own language', async () => {
    const page = await plain();
    await page.goto('/');
    await page.getByLabel('A place you sell to').fill('Deutschland');
    await page.getByRole('button', { name: 'Find the place' }).click();
    await page.getByRole('link', { name: 'Germany', exact: true }).click();
    expect(new URL(page.url()).pathname).toBe('/regions/de');
  });

  test('a country without a sheet can be asked for, and the wish is counted once a day', async () => {
    const page = await plain();
    await page.goto('/regions/eg');
    expect(new URL(page.url()).pathname).toBe('/regions');
    for (let times = 0; times < 2; times += 1) {
      await page.goto('/regions?q=Egypt');
      await page.getByRole('button', { name: 'Ask for Egypt' }).click();
      await page.waitForURL(/\/regions\/wishes\?asked=eg/);
      expect(await page.getByRole('status').innerText()).toContain('Your wish for Egypt is counted.');
      expect(await page.getByRole('status').innerText()).toContain('It was asked for once.');
    }
  });

  test('an empty wish is told what to mend', async () => {
    const page = await plain();
    await page.goto('/regions/wishes');
    await page.getByRole('button', { name: 'Ask for this region' }).click();
    await page.waitForURL(/why=/);
    expect(await page.locator('#region').getAttribute('aria-invalid')).toBe('true');
  });
});

test('J2 limits of several places stand side by side without a piece, out of a form without script', async () => {
  const page = await plain(1280);
  await page.goto('/limits');
  for (const place of ['eu', 'jp']) {
    const box = page.locator(`input[name="region"][value="${place}"]`);
    await page.locator('details', { has: box }).locator('summary').click();
    await box.check();
  }
  await page.getByRole('button', { name: 'Show the limits' }).click();
  await page.waitForURL(/region=eu&region=jp/);
  expect(await page.getByRole('columnheader').allInnerTexts()).toEqual(['Kind of ware', 'European Union', 'Japan']);
  expect(await page.getByRole('row', { name: /Flat or shallow ware/ }).innerText()).toMatch(/at most 0[.]8\s+mg[/]dm²/);
});

test('J2 from a rule to its text, and to what else rests on that text', async () => {
  const page = await plain();
  await page.goto('/rules/eu-pb-cat1');
  await page.getByRole('link', { name: 'What else rests on these sources' }).click();
  await page.waitForURL(/\/sources\?rule=eu-pb-cat1/);
  await page.locator('main a[href^="/sources/eu--"]').first().click();
  await page.waitForURL(/\/sources\/eu--/);
  expect(await page.locator('main a[href="/rules/eu-pb-cat1"]').count()).toBeGreaterThan(0);
});
