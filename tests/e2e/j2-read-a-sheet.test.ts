import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { openBrowser, SITE, visit } from './browser';

let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(async () => {
  await browser.close();
});

describe.each([
  ['with script', true],
  ['without script', false],
])('J2 %s', (_, script) => {
  test('a reader finds Denmark, reads its sheet with the layer above, and opens a rule with its source', async () => {
    const page = await (await visit(browser, { script })).newPage();
    await page.goto('/regions?q=denm');
    await page.getByRole('main').getByRole('link', { name: 'Denmark' }).first().click();
    await page.waitForURL(/\/regions\/dk$/);
    expect(await page.getByRole('heading', { level: 1 }).innerText()).toMatch(/Denmark/);
    expect(await page.locator('main').innerText()).toMatch(/This list is not proof|Nothing here is proof|not proof/);
    await page.locator('a[href="/rules/dk-register"]').first().click();
    await page.waitForURL(/\/rules\/dk-register$/);
    expect(await page.locator('main').innerText()).toMatch(/BEK nr\. 1520/);
    await page.getByRole('link', { name: 'No registration for small makers' }).click();
    await page.waitForURL(/\/rules\/dk-threshold$/);
    expect(await page.locator('main').innerText()).toMatch(/1,000 pieces.*DKK\s50,000/s);
  });

  test('a sheet can be read as of an earlier day, and a day that is none is not found', async () => {
    const page = await (await visit(browser, { script })).newPage();
    const answer = await page.goto('/regions/eu/on/2015-01-01');
    expect(answer?.status()).toBe(200);
    expect(await page.locator('main').innerText()).toMatch(/1 January 2015/);
    expect((await page.goto('/regions/eu/on/2015-02-30'))?.status()).toBe(404);
    expect(await page.locator('body').innerText()).toMatch(/\S{3,}/);
  });

  test('an address that is none says so in words', async () => {
    const page = await (await visit(browser, { script })).newPage();
    for (const path of ['/nope', '/regions/zz', '/rules/none', '/check/AAAAAAAAAAAAAAAAAAAAAA/review', '/copies/' + 'a'.repeat(64)]) {
      const answer = await page.goto(path);
      expect([path, answer?.status()]).toEqual([path, 404]);
      expect((await page.locator('body').innerText()).length).toBeGreaterThan(40);
    }
  });
});

test('J2 a rule of 2024 is not in the sheet of 2015 and is in that of today', async () => {
  const ids = async (on: string) => {
    const sheet = (await (await fetch(`${SITE}/api/v1/regions/eu?on=${on}`)).json()) as { rules: { id: string }[] };
    return sheet.rules.map(({ id }) => id);
  };
  // Regulation (EU) 2023/988 applies from 13 December 2024 (its Art. 52).
  expect(await ids('2024-12-12')).not.toContain('eu-gpsr-rp');
  expect(await ids('2024-12-13')).toContain('eu-gpsr-rp');
});
