import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { faultsOf } from './axe';
import { openBrowser, SITE } from './browser';
import { aPerson, visitAs } from './signed-in';

let browser: Browser;

beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(async () => {
  await browser.close();
  await db.destroy();
});

const PACKAGING = 'rules/ie-packaging';
const field = (page: Page, name: string) => page.locator(`[id="${name}"]`);
const mainOf = async (page: Page): Promise<string> => (await page.locator('main').textContent()) ?? '';

/** Presses a button of the page and waits for what it leads to. */
async function press(page: Page, name: string | RegExp, to: RegExp): Promise<void> {
  await page.getByRole('button', { name }).first().click();
  await page.waitForURL(to);
}

/** Presses a button inside a form by what it does. */
async function pressDo(page: Page, act: string, to: RegExp): Promise<void> {
  await page.locator(`button[name="do"][value="${act}"]`).click();
  await page.waitForURL(to);
}

/** Begins a draft at a rule, from its own page. */
async function beginAt(page: Page, rule: string): Promise<void> {
  await page.goto(`/rules/${rule}`);
  await page.getByRole('link', { name: /^Amend the rule/ }).click();
  await page.waitForURL(/\/amend\?item=/);
  await press(page, 'Begin a new amendment', new RegExp(`/bench/amendments/[^/]+/rules/${rule}$`));
}

describe.each([
  [true, 1280],
  [false, 320],
] as const)('with script: %s, %i px wide', (script, width) => {
  test('J3 an editor changes a rule, its condition and its source, checks the amendment and sends it', async () => {
    const editor = await aPerson('editor');
    const page = await (await visitAs(browser, editor, { script, width })).newPage();
    await beginAt(page, 'ie-packaging');

    await field(page, 'says').fill('Register as a producer before you sell anything packed.');
    await pressDo(page, 'add-line:when', /kept=\d+&at=when/);
    expect(await field(page, 'says').inputValue()).toBe('Register as a producer before you sell anything packed.');
    await field(page, 'when.1.question').selectOption('pieces-a-year');
    await pressDo(page, 'show:when.1.question', /at=when\.1\.question/);
    await field(page, 'when.1.by').selectOption('gt');
    await field(page, 'when.1.value').fill('1000');
    await field(page, 'when.1.unit').selectOption('pieces');

    // Saved without the passage's language: nothing is lost, and the field is named.
    await field(page, 'sources.0.passage').fill('Producers shall register.');
    await press(page, 'Save this rule', /mend=\d+/);
    expect(await page.locator('#faults').textContent()).toContain('A passage needs its language');
    expect(await field(page, 'when.1.value').inputValue()).toBe('1000');
    await field(page, 'sources.0.passageLang').fill('en');
    await press(page, 'Save this rule', /saved=/);
    expect(await mainOf(page)).toContain('is saved in your amendment');

    await page.getByRole('link', { name: 'Add a source' }).click();
    await page.waitForURL(/sources\/new$/);
    await field(page, 'name').fill('Guidance for makers');
    await press(page, 'Carry on to its form', /sources\/guidance-for-makers$/);
    await field(page, 'publisher').fill('Office of Packaging');
    await press(page, 'Save this source', /saved=/);

    await page.getByRole('link', { name: 'Check and send' }).click();
    await page.waitForURL(/\/check$/);
    const checked = await mainOf(page);
    expect(checked).toContain('Register as a producer before you sell anything packed.');
    expect(checked).toContain('Guidance for makers');
    await field(page, 'summary').fill('Makers of up to 1,000 pieces need not register.');
    for (const why of await page.locator('textarea[name^="intended."]').all()) await why.fill('The guidance says so.');
    await press(page, 'Send amendment to a moderator', /done=sent/);
    expect(await mainOf(page)).toContain('It waits for a moderator');

    await press(page, 'Take it back', /done=taken-back/);
    await press(page, 'Give it up', /done=withdrawn/);
    await press(page, 'Take it up again', /done=reopened/);
    await page.goto('/bench/amendments');
    expect(await mainOf(page)).toContain('Ireland: 2 things changed');
  });
});

test('J3 S28 what is typed is kept a moment later, offered again from the device, and never overwritten by another tab', async () => {
  const editor = await aPerson('editor');
  const context = await visitAs(browser, editor);
  const page = await context.newPage();
  await beginAt(page, 'ie-packaging');
  const address = page.url();
  await field(page, 'says').fill('Kept by itself.');
  await page.getByText(/^Kept \d\d:\d\d$/).waitFor();

  const other = await context.newPage();
  await other.goto(address);
  expect(await field(other, 'says').inputValue()).toBe('Kept by itself.');
  await field(other, 'says').fill('From the other tab.');
  await other.getByText(/^Kept \d\d:\d\d$/).waitFor();
  await field(page, 'says').fill('From the first tab.');
  await page.getByText('Another tab kept something else', { exact: false }).waitFor();
  expect(await page.locator('.amend-keep').textContent()).toContain('From the other tab.');
  expect(await field(page, 'says').inputValue()).toBe('From the first tab.');
  await page.getByRole('button', { name: 'Keep what is here' }).click();
  await page.getByText(/^Kept \d\d:\d\d$/).waitFor();

  // While the site cannot be reached the device keeps it.
  await page.route('**/api/entries', (route) => route.abort());
  await field(page, 'says').fill('Typed while away.');
  await page.getByText('Not kept yet', { exact: false }).waitFor();
  await page.unroute('**/api/entries');
  const later = await context.newPage();
  await later.goto(address);
  expect(await field(later, 'says').inputValue()).toBe('From the first tab.');
  await later.getByRole('button', { name: 'Restore it' }).click();
  await later.waitForFunction(() => (document.getElementById('says') as HTMLTextAreaElement | null)?.value === 'Typed while away.');

  const stranger = await (await visitAs(browser, await aPerson('moderator'))).newPage();
  expect((await stranger.goto(address))?.status()).toBe(404);
});

test('J3 S02 the door that keeps what is typed asks where it came from and who sends it', async () => {
  const ask = (headers: Record<string, string>): Promise<Response> =>
    fetch(`${SITE}/api/entries`, {
      method: 'POST',
      headers: { 'content-type': 'application/json', ...headers },
      body: JSON.stringify({ id: crypto.randomUUID(), item: 'text', version: 0, values: { text: 'x' } }),
    });
  expect((await ask({})).status).toBe(403);
  expect((await ask({ origin: 'https://elsewhere.example.test' })).status).toBe(403);
  expect((await ask({ origin: SITE })).status).toBe(401);
});

test('J3 without script: a page as it was seen is sent, put with its source and saved', async () => {
  const editor = await aPerson('editor');
  const page = await (await visitAs(browser, editor, { script: false })).newPage();
  await beginAt(page, 'ie-packaging');
  await page.goto(page.url().replace(/\/rules\/.*$/, ''));
  await page.locator('main a[href*="/sources/"]:not([href$="/new"])').first().click();
  await page.waitForURL(/\/sources\//);
  await page.setInputFiles('#file', { name: 'page.txt', mimeType: 'text/plain', buffer: Buffer.from('The page as it was seen.') });
  await press(page, 'Send the page', /file=/);
  await press(page, 'Put it with this source', /attached=/);
  await press(page, 'Save this source', /saved=/);
  await page.getByRole('link', { name: 'Check and send' }).click();
  await page.waitForURL(/\/check$/);
  expect(await mainOf(page)).toContain('Fingerprint of the page as seen');
});

test('J3 W9 by keyboard alone: a word is changed, the form saved, and focus lands where reading goes on', async () => {
  const editor = await aPerson('editor');
  const page = await (await visitAs(browser, editor)).newPage();
  await beginAt(page, 'ie-packaging');
  const tabTo = async (id: string): Promise<void> => {
    for (let presses = 0; presses < 120; presses += 1) {
      if (await page.evaluate((wanted) => document.activeElement?.id === wanted || document.activeElement?.textContent === wanted, id))
        return;
      await page.keyboard.press('Tab');
    }
    throw new Error(`Tab never reaches ${id}`);
  };
  await tabTo('title');
  await page.keyboard.press('End');
  await page.keyboard.type(' in Ireland');
  await page.keyboard.press('Enter'); // loses nothing
  await page.waitForURL(/kept=/);
  expect(await field(page, 'title').inputValue()).toMatch(/ in Ireland$/);
  await tabTo('Save this rule');
  await page.keyboard.press('Enter');
  await page.waitForURL(/saved=/);
  await page.waitForFunction(() => document.activeElement?.tagName === 'H1');
});

test('J3 whoever is signed out is led to sign in and back; a maker is told how to become an editor', async () => {
  const maker = await (await visitAs(browser, await aPerson('maker'))).newPage();
  await maker.goto(`/regions/ie/amend?item=${PACKAGING}`);
  expect(await maker.getByRole('link', { name: 'Ask to become an editor' }).count()).toBe(1);
  const reader = await (await browser.newContext({ baseURL: SITE })).newPage();
  await reader.goto(`/regions/ie/amend?item=${PACKAGING}`);
  expect(new URL(reader.url()).pathname).toBe('/sign-in');
  expect(new URL(reader.url()).searchParams.get('next')).toContain('/regions/ie/amend');
});

test('W1 W7 light and dark: axe finds nothing on the editor’s pages, and none scrolls sideways', async () => {
  const editor = await aPerson('editor');
  const begun = await (await visitAs(browser, editor)).newPage();
  await beginAt(begun, 'ie-packaging');
  await pressDo(begun, 'add-block:when:unless', /at=when/);
  await press(begun, 'Save this rule', /mend=/);
  const form = new URL(begun.url()).pathname;
  const draft = form.replace(/\/rules\/.*$/, '');
  const pages = [
    `${form}?mend=1`,
    draft,
    `${draft}/check`,
    `${draft}/text`,
    `${draft}/rules/new`,
    `${draft}/sources/new`,
    '/bench/amendments',
    '/regions/ie/amend',
    '/regions/new',
  ];
  const open = async (width: number): Promise<Page> => (await visitAs(browser, editor, { width })).newPage();
  expect(await faultsOf(open, pages)).toEqual([]);
}, 300_000);
