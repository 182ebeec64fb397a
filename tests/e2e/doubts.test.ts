import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { faultsOf } from './axe';
import { openBrowser, SITE, visit, WITH_SCRIPT } from './browser';
import { aPerson, cookieOf, visitAs, type Person } from './signed-in';

let browser: Browser;
let editor: Person;

beforeAll(async () => {
  browser = await openBrowser();
  editor = await aPerson('editor', 'Edda Keeper');
});
beforeEach(async () => {
  await db('doubts').del();
  await db('keepers').del();
  await db('limits').where('key', 'like', 'doubt%').del();
});
afterAll(async () => {
  await db('doubts').del();
  await db('keepers').del();
  await browser.close();
  await db.destroy();
});

const RULE = '/rules/dk-doc';
const SECRET = 'kestrelglaze was replaced last spring';
const mainOf = async (page: Page): Promise<string> => (await page.locator('main').textContent()) ?? '';

/** Presses until the form is old enough to be a person's. What was typed has to be there each time. */
async function sendPatiently(page: Page, typed: string): Promise<number> {
  for (let tries = 1; tries <= 60; tries += 1) {
    expect(await page.locator('textarea[name="words"]').inputValue()).toBe(typed);
    const answered = page.waitForResponse((answer) => answer.request().method() === 'POST');
    await page.getByRole('button', { name: 'Send this doubt' }).click();
    await answered;
    await page.locator('#faults, h1:has-text("Your doubt was sent")').first().waitFor();
    if (page.url().endsWith('/sent')) return tries;
  }
  throw new Error('The form was never taken');
}

describe.each(WITH_SCRIPT)('with script: %s', (script) => {
  test('R2 REG-80 REG-81 a reader doubts a rule, an editor answers, and both stand on the rule from then on alone', async () => {
    const reader = await (await visit(browser, { script, width: 320 })).newPage();
    await reader.goto(RULE);
    await reader.getByRole('link', { name: /^Is this wrong\? Raise a doubt/ }).click();
    await reader.waitForURL(`**${RULE}/doubt`);
    await reader.locator('textarea[name="words"]').fill(SECRET);
    await reader.locator('input[name="link"]').fill('javascript:x//law.example.test');
    const tries = await sendPatiently(reader, SECRET);
    expect(tries).toBeGreaterThan(1);
    await reader.goto(RULE);
    expect(await mainOf(reader)).toContain('One doubt waits for an answer.');
    for (const headers of [{}, { rsc: '1' }] as const) {
      expect(await (await fetch(`${SITE}${RULE}`, { headers })).text()).not.toContain('kestrelglaze');
    }

    const desk = await (await visitAs(browser, editor, { script })).newPage();
    await desk.goto('/bench');
    await desk.getByRole('link', { name: 'Answer readers’ doubts' }).click();
    await desk.waitForURL(/\/doubts$/);
    await desk.getByRole('link', { name: /^Read the doubt about/ }).click();
    await desk.waitForURL(/\/doubts\/[0-9a-f-]{36}$/);
    expect(await mainOf(desk)).toContain(SECRET);
    expect(await desk.locator('main a[href*="javascript"]').count()).toBe(0);
    await desk.locator('textarea[name="answer"]').fill('The order of 2018 still stands.');
    await desk.getByRole('button', { name: 'Show this answer on the rule' }).click();
    await desk.waitForURL(/done=answered/);

    await reader.goto(RULE);
    const told = await mainOf(reader);
    expect(told).toContain(SECRET);
    expect(told).toMatch(/The order of 2018 still stands\.[\s\S]*Answered by Edda Keeper on/);
    await reader.goto('/day-book?kind=doubts&region=dk');
    const book = await mainOf(reader);
    expect([book.includes('Edda Keeper answered a doubt'), book.includes('kestrelglaze')]).toEqual([true, false]);
    expect(await reader.locator('main table a[href="/regions/dk"]').count()).toBeGreaterThan(0);
  });

  test('REG-88 advertising is put aside, and taken up again from where that was said', async () => {
    const at = new Date();
    await db('doubts').insert({
      id: crypto.randomUUID(),
      region: 'dk',
      rule_id: 'dk-doc',
      words: 'Buy pots',
      state: 'waiting',
      made_at: at,
    });
    const desk = await (await visitAs(browser, editor, { script })).newPage();
    await desk.goto('/doubts?region=dk');
    await desk.getByRole('link', { name: /^Read the doubt about/ }).click();
    await desk.waitForURL(/\/doubts\/[0-9a-f-]{36}$/);
    await desk.locator('input[name="reason"]').fill('Advertising');
    await desk.getByRole('button', { name: 'Put this doubt aside' }).click();
    await desk.waitForURL(/done=set-aside/);
    await desk.getByRole('button', { name: 'Take it up again' }).click();
    await desk.waitForURL(/done=taken-up/);
    expect(await mainOf(desk)).toContain('Waiting (1)');
  });

  test('REG-90 REG-91 an editor keeps a sheet and stops, and the sheet names its keeper meanwhile', async () => {
    const page = await (await visitAs(browser, editor, { script })).newPage();
    await page.goto('/regions/dk');
    await page.getByRole('button', { name: 'Become a keeper of Denmark' }).click();
    await page.waitForURL(/done=took/);
    const reader = await (await visit(browser, { script })).newPage();
    await reader.goto('/regions/dk');
    expect(await mainOf(reader)).toContain('Kept by: Edda Keeper.');
    expect(await reader.getByRole('button', { name: /keep/i }).count()).toBe(0);
    await page.goto('/look-again?keeper=me&days=3660');
    expect(await mainOf(page)).toMatch(/rules are due/);
    expect(await page.locator('main a[href^="/regions/dk/amend?item=rules/"]').count()).toBeGreaterThan(0);
    await page.goto('/look-again?region=dk');
    await page.getByRole('button', { name: 'Stop keeping Denmark' }).click();
    await page.waitForURL(/done=gave/);
    await reader.goto('/regions/dk');
    expect(await mainOf(reader)).not.toContain('Kept by');
  });
});

test('REG-89 REG-92 who is no editor finds no desk, and who is signed out is led to the door', async () => {
  const cookie = await cookieOf(await aPerson('maker'));
  for (const path of ['/doubts', '/look-again', `/doubts/${crypto.randomUUID()}`]) {
    expect([path, (await fetch(SITE + path, { headers: { cookie }, redirect: 'manual' })).status]).toEqual([path, 404]);
    const page = await (await visit(browser, { script: false })).newPage();
    await page.goto(path);
    expect([path, new URL(page.url()).pathname]).toEqual([path, '/sign-in']);
    await page.context().close();
  }
});

test('W1 axe finds nothing on the pages of doubts and keepers, light or dark, and none scrolls sideways', async () => {
  const id = crypto.randomUUID();
  await db('doubts').insert({ id, region: 'dk', rule_id: 'dk-doc', words: 'x'.repeat(400), state: 'waiting', made_at: new Date() });
  const paths = [`${RULE}/doubt`, `${RULE}/doubt/sent`, '/doubts', `/doubts/${id}`, '/look-again?region=dk&days=400', '/rules/dk-doc'];
  const open = async (width: number): Promise<Page> => (await visitAs(browser, editor, { width })).newPage();
  expect(await faultsOf(open, paths)).toEqual([]);
});
