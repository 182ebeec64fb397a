import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { openBrowser } from './browser';
import { faultsOf, routes } from './every-route';

let browser: Browser;
let pages: readonly string[] = [];

beforeAll(async () => {
  browser = await openBrowser();
  pages = await routes(browser);
});
afterAll(async () => {
  await browser.close();
});

// Light colours are tried at 320 px: the same tokens meet here.
test('W1 at 1280 px, dark: axe finds nothing on any page, and none scrolls sideways', async () => {
  expect(await faultsOf(browser, pages, { width: 1280, colours: ['dark'] })).toEqual([]);
}, 900_000);
