import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { axeFinds, faultsOf } from './axe';
import { carryOn, choosePlace, openBrowser, SITE, visit } from './browser';

let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(async () => {
  await browser.close();
});

const field = (page: Page) => page.getByRole('banner').getByRole('search').locator('input[name="q"]');

describe.each([
  ['with script', true],
  ['without script', false],
])('J9 %s', (_, script) => {
  test('a potter’s word, sent from any page by keyboard alone, finds the note with the sentence that says it', async () => {
    const page = await (await visit(browser, { script })).newPage();
    await page.goto('/regions');
    await field(page).focus();
    await page.keyboard.type('crackle lines');
    await page.keyboard.press('Enter');
    await page.waitForURL(/\/search\?q=crackle\+lines/);
    expect(await page.getByRole('main').getByRole('status').first().innerText()).toMatch(/answers? (was|were) found for “crackle lines”/);
    const first = page.locator('.hits > li').first();
    expect(await first.getByRole('link').getAttribute('href')).toBe('/notes/crazing-and-crackle');
    expect(await first.locator('mark').count()).toBeGreaterThan(0);
    expect(await first.innerText()).toMatch(/Studio note.*Look again by/s);
    expect(await page.title()).toMatch(/^Search for “crackle lines”/);
  });

  test('a note’s answer goes along into the check, marked and changeable', async () => {
    const page = await (await visit(browser, { script })).newPage();
    await page.goto('/notes/decorative-ware-and-its-marks');
    await page.getByRole('link', { name: 'Check a piece with this answer' }).click();
    await page.waitForURL(/\/check\?with=use:decorative$/);
    expect(await page.getByRole('main').innerText()).toMatch(/Your note’s answer will be filled in/);
    await page.getByRole('button', { name: 'Begin with the questions' }).click();
    await page.waitForURL(/why=none&.*with=use%3Adecorative/);
    await choosePlace(page, 'dk');
    await page.getByRole('button', { name: 'Begin with the questions' }).click();
    await page.waitForURL(/\/check\/[^/]+\/use$/);
    expect(await page.getByRole('main').innerText()).toMatch(/Taken from the studio note/);
    expect(await page.locator('input[name="use"][value="decorative"]').isChecked()).toBe(true);
    await page.locator('input[name="use"][value="food"]').check();
    await carryOn(page);
    await page.goto(page.url().replace(/[^/]+$/, 'use'));
    expect(await page.locator('input[name="use"][value="food"]').isChecked()).toBe(true);
    expect(await page.getByRole('main').innerText()).not.toMatch(/Taken from the studio note/);
  });

  test('the reader’s place comes first, the rest is labelled, and all of it stays in the address', async () => {
    const page = await (await visit(browser, { script })).newPage();
    await page.goto('/search?q=declaration');
    await page.getByRole('main').locator('select[name="region"]').selectOption('dk');
    await page.getByRole('main').getByRole('button', { name: 'Search' }).click();
    await page.waitForURL(/region=dk/);
    const headings = () => page.getByRole('main').getByRole('heading', { level: 2 }).allInnerTexts();
    expect((await headings())[0]).toBe('For Denmark, and what holds everywhere');
    expect(await page.locator('main select[name="region"]').inputValue()).toBe('dk');
    for (let number = 2; number < 9 && !(await headings()).includes('Of other places'); number += 1) {
      await page.getByRole('link', { name: 'Answers after these' }).click();
      await page.waitForURL(new RegExp(`q=declaration&region=dk&page=${number}$`));
    }
    expect((await headings()).at(-1)).toBe('Of other places');
  });

  test('a slip is mended and said so; nothing found helps on', async () => {
    const page = await (await visit(browser, { script })).newPage();
    await page.goto('/search?q=cadnium');
    expect(await page.getByRole('main').innerText()).toMatch(/We read “cadnium” as “cadmium”/);
    await page.goto('/search?q=qqqq+zzzz');
    const main = page.getByRole('main');
    expect(await main.innerText()).toMatch(/Nothing was found for “qqqq zzzz”/);
    expect(await main.getByRole('link', { name: 'Ask an editor for this region' }).getAttribute('href')).toBe('/regions/wishes');
  });
});

describe('J9 with script', () => {
  test('suggestions are a combobox: named, read by arrow keys, put away by Escape, followed by Enter', async () => {
    const page = await (await visit(browser)).newPage();
    await page.goto('/privacy');
    const asked: string[] = [];
    page.on('request', (request) => asked.push(new URL(request.url()).pathname));
    const input = field(page);
    expect(asked).not.toContain('/api/v1/search-index');
    await input.focus();
    await page.getByRole('banner').getByRole('combobox', { name: 'Search for' }).waitFor();
    await page.keyboard.type('haarr');
    const options = page.getByRole('banner').getByRole('listbox', { name: 'Suggestions' }).getByRole('option');
    await options.first().waitFor();
    expect(await options.first().innerText()).toMatch(/Crazing/);
    expect(await input.getAttribute('aria-expanded')).toBe('true');
    expect(await axeFinds(page)).toEqual([]);
    await page.keyboard.press('ArrowDown');
    const active = await input.getAttribute('aria-activedescendant');
    expect(await page.locator(`[id="${active ?? ''}"]`).getAttribute('aria-selected')).toBe('true');
    await page.keyboard.press('Escape');
    expect([await input.getAttribute('aria-expanded'), await input.inputValue()]).toEqual(['false', 'haarr']);
    await page.keyboard.type('i');
    await options.first().waitFor();
    await page.keyboard.press('ArrowDown');
    await page.keyboard.press('Enter');
    await page.waitForURL(/\/(notes|words)\//);
    expect(new URL(page.url()).pathname).toMatch(/crazing/);
  });
});

test('J9 axe finds nothing on search pages, light or dark, and none scrolls sideways', async () => {
  const open = async (width: number) => (await visit(browser, { width })).newPage();
  const paths = ['/search', '/search?q=lead', '/search?q=declaration&region=dk&kind=rule', '/search?q=qqqq'];
  expect(await faultsOf(open, paths)).toEqual([]);
});

test('J9 hostile questions get a page', async () => {
  for (const q of ['%', '\\', '"', '(((', '+*', '%00', '‮lead', 'x'.repeat(10_000), '(a+)+$', '<script>alert(1)</script>']) {
    const answer = await fetch(`${SITE}/search?q=${q === '%00' ? q : encodeURIComponent(q)}`);
    expect([q.slice(0, 20), answer.status]).toEqual([q.slice(0, 20), 200]);
  }
});
