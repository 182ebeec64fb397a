import type { Browser, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, describe, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { findNumberInUse } from '@/db/editions';
import type { AmendmentId } from '@/lib/regions/domain/amendment';
import type { Rule } from '@/lib/regions/domain/rule';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { sendChanged } from '../builders/sent-amendments';
import { startSiteProcess, type SiteProcess } from '../builders/site-process';
import { aRule, aSource } from '../builders/small-world';
import { faultsOf } from './axe';
import { openBrowser, SITE, visit } from './browser';
import { aPerson, cookieOf, visitAs, type Person } from './signed-in';

let browser: Browser;
let editor: Person;
let moderator: Person;
let other: SiteProcess | undefined;

beforeAll(async () => {
  browser = await openBrowser();
  editor = await aPerson('editor', 'Edda Editor');
  moderator = await aPerson('moderator', 'Mona Moderator');
});
afterEach(() => {
  other?.child.kill('SIGKILL');
});
afterAll(async () => {
  await browser.close();
  await db.destroy();
});

/** A rule of an invented order, which the sheet did not have. */
function withRule(region: string, id: string): (sheet: Sheet) => Sheet {
  const source = { ...aSource, id: `${id}-text` };
  const rule = aRule(id, {
    region,
    title: 'A mark on each pot',
    says: 'Put a mark on each pot.',
    sources: [
      {
        source: source.id,
        locator: 'section 4',
        passage: 'Hver gripur skal merktur.',
        passageLang: 'is',
        standing: 'guidance',
        evidence: 'read',
      },
    ],
  });
  return (sheet) => ({ ...sheet, sources: [...sheet.sources, source], rules: [...sheet.rules, rule] });
}

const markedIn = (region: string, id: string): Promise<AmendmentId> =>
  sendChanged(editor.id, region, { mend: withRule(region, id), summary: 'Each pot bears a mark, says the order.' });

const mainOf = async (page: Page): Promise<string> => (await page.locator('main').textContent()) ?? '';
const publicText = async (address: string): Promise<string> => (await fetch(address)).text();

/** Reads and ticks every source of the page shown. */
async function tickAll(page: Page): Promise<void> {
  const boxes = page.getByRole('button', { name: /^I have read this source/ });
  const count = await boxes.count();
  for (let at = 0; at < count; at += 1) {
    await boxes.nth(at).click();
    await page.locator('[data-tick][aria-pressed="true"]').nth(at).waitFor();
  }
}

async function approve(page: Page, id: AmendmentId, button: string): Promise<void> {
  await page.goto(`/sorting-table/${id}`);
  await tickAll(page);
  await page.getByRole('link', { name: 'Approve', exact: true }).click();
  await page.waitForURL(/\/approve$/);
  await page.getByRole('button', { name: button }).click();
  await page.waitForURL(/\?done=/);
}

describe.each([
  [true, 'is'],
  [false, 'li'],
] as const)('with script: %s', (script, region) => {
  test('J4 D5 D6 an amendment is read, remarked on and approved, and the sheet, a checklist and the API have it', async () => {
    const id = await markedIn(region, `${region}-pot-mark`);
    const page = await (await visitAs(browser, moderator, { script, width: script ? 1280 : 320 })).newPage();
    await page.goto('/bench');
    await page
      .locator('main')
      .getByRole('link', { name: /^Sorting table: \d+ amendments? waits?/ })
      .click();
    await page.waitForURL(/\/sorting-table$/);
    await page.locator(`a[href="/sorting-table/${id}"]`).click();
    await page.waitForURL(`**/sorting-table/${id}`);
    const read = await mainOf(page);
    expect(read).toMatch(/Amendment to (Iceland|Liechtenstein)[\s\S]*Edda Editor[\s\S]*New rule: “A mark on each pot”\./);
    expect(read).toContain('From the moment you approve, as edition 2');
    expect(await page.locator('.claim blockquote').getAttribute('lang')).toBe('is');

    await page.goto(`/sorting-table/${id}/approve`);
    expect(await mainOf(page)).toMatch(/You have not ticked these as read yet\s*A mark on each pot: Order on ware, section 4/);
    expect(await page.locator('main button').count()).toBe(0);

    await page.goto(`/sorting-table/${id}`);
    await page.locator(`#remarks-rules-${region}-pot-mark summary`).first().click();
    await page.locator(`#remarks-rules-${region}-pot-mark textarea[name="words"]`).first().fill('Stamped or written?');
    await page.locator(`#remarks-rules-${region}-pot-mark`).getByRole('button', { name: 'Add the remark' }).click();
    await page.waitForURL(/kept=yes/);
    expect(await page.locator(`#remarks-rules-${region}-pot-mark`).textContent()).toMatch(
      /Your remark is kept\.[\s\S]*Stamped or written\?/,
    );
    await page.getByRole('button', { name: /^Mark as answered/ }).click();
    await page
      .getByRole('button', { name: /^Open it again/ })
      .first()
      .waitFor();

    await approve(page, id, 'Approve: it comes into use');
    expect(await page.locator('main [role="status"]').first().textContent()).toMatch(/^Edition 2 of (Iceland|Liechtenstein) is in use\./);
    await page.getByRole('link', { name: 'Read the sheet' }).click();
    await page.waitForURL(`**/regions/${region}`);
    expect(await mainOf(page)).toContain('Put a mark on each pot.');
    expect(await publicText(`${SITE}/api/v1/regions/${region}`)).toContain(`${region}-pot-mark`);
    expect(await checked(SITE, region)).toContain(`${region}-pot-mark`);
    await page.goto(`/sorting-table/${id}`);
    expect(await mainOf(page)).toMatch(/It is in use as edition 2[\s\S]*You gave the last approval/);
    expect(await page.locator('main form').count()).toBe(0);
  });

  test('D6 whoever was slower is told who decided what, and the reason they typed is kept', async () => {
    const id = await markedIn('se', `se-late-${String(script)}`);
    const slow = await (await visitAs(browser, moderator, { script })).newPage();
    await slow.goto(`/sorting-table/${id}/send-back`);
    await slow.locator('textarea[name="reason"]').fill('Where does the order say so? Section 4 is on ovens.');
    const fast = await (await visitAs(browser, await aPerson('moderator', 'Fanny Fast'), { script: false })).newPage();
    await fast.goto(`/sorting-table/${id}/hold`);
    await fast.locator('textarea[name="reason"]').fill('The office answers next week.');
    await fast.getByRole('button', { name: 'Hold it' }).click();
    await fast.waitForURL(/done=held/);
    await slow.getByRole('button', { name: 'Send it back to its author' }).click();
    await slow.locator('#faults').waitFor();
    expect(await slow.locator('#faults').textContent()).toContain('Fanny Fast has held it meanwhile.');
    expect(await slow.locator('textarea[name="reason"]').inputValue()).toBe('Where does the order say so? Section 4 is on ovens.');

    await fast.goto(`/sorting-table/${id}`);
    await fast.getByRole('button', { name: 'Release it' }).click();
    await fast.waitForURL(/done=released/);
    await slow.goto(`/sorting-table/${id}/send-back`);
    await slow.locator('textarea[name="reason"]').fill('short');
    await slow.getByRole('button', { name: 'Send it back to its author' }).click();
    await slow.locator('#faults').waitFor();
    await slow.locator('textarea[name="reason"]').fill('Section 4 is on ovens. Which one do you mean?');
    await slow.getByRole('button', { name: 'Send it back to its author' }).click();
    await slow.waitForURL(/done=sent-back/);
    await slow.getByRole('link', { name: 'Read the amendment' }).click();
    await slow.waitForURL(`**/sorting-table/${id}`);
    expect(await mainOf(slow)).toMatch(
      /Fanny Fast held it[\s\S]*Fanny Fast released it[\s\S]*You sent it back[\s\S]*Section 4 is on ovens\. Which/,
    );
  });

  test('D7 an amendment whose sheet moved on is shown three ways and given back, and nothing is buried', async () => {
    const [first, late] = [await markedIn('fi', `fi-first-${String(script)}`), await markedIn('fi', `fi-late-${String(script)}`)];
    const page = await (await visitAs(browser, moderator, { script, width: 320 })).newPage();
    await approve(page, first, 'Approve: it comes into use');
    const before = await findNumberInUse(db, 'fi');
    await page.goto(`/sorting-table/${late}/approve`);
    expect(new URL(page.url()).pathname).toBe(`/sorting-table/${late}`);
    expect(await mainOf(page)).toMatch(/The sheet moved on[\s\S]*As it was[\s\S]*As it now stands[\s\S]*As proposed/);
    await page.getByRole('button', { name: 'Give it back to its author to carry over' }).click();
    await page.waitForURL(/done=refused-stale/);
    expect(await findNumberInUse(db, 'fi')).toBe(before);
    expect(await db('amendments').where({ id: late }).first('state')).toEqual({ state: 'refused-stale' });
  });
});

/** What a checklist for a mug sold there holds, as one site answers at its next request. */
async function checked(site: string, ...regions: readonly string[]): Promise<string> {
  const body = JSON.stringify({
    regions,
    on: new Date().toISOString().slice(0, 10),
    answers: { use: 'food', form: 'mug', 'holds-liquid': true },
  });
  const answer = await fetch(`${site}/api/v1/checks`, { method: 'POST', headers: { 'content-type': 'application/json' }, body });
  return answer.text();
}

const FIGURE = 3.37;

/** Another figure for lead, each of its uses quoted. */
function withFigure(sheet: Sheet): Sheet {
  const rules = sheet.rules.map((rule): Rule => {
    if (rule.id !== 'eu-pb-cat2' || rule.payload.topic !== 'limit') return rule;
    const payload = { ...rule.payload, amount: { ...rule.payload.amount, value: FIGURE } };
    const sources = rule.sources.map((citation) => ({ ...citation, passage: 'An invented passage.', passageLang: 'en' }));
    return { ...rule, payload, sources };
  });
  return { ...sheet, rules };
}

test('J4 REG-51 a changed limit of the EU needs two moderators; both processes have it in Denmark and Germany at the next request; withdrawn, it is gone again', async () => {
  other = await startSiteProcess();
  const sites = [SITE, other.address];
  const everywhere = async (): Promise<readonly boolean[]> =>
    Promise.all(sites.flatMap((site) => ['dk', 'de'].map(async (place) => (await checked(site, place)).includes(String(FIGURE)))));
  expect(await everywhere()).toEqual([false, false, false, false]); // and both have compiled the lines as they are
  const id = await sendChanged(editor.id, 'eu', { mend: withFigure, summary: 'The figure for lead in hollow ware is another.' });
  const page = await (await visitAs(browser, moderator)).newPage();
  await approve(page, id, 'Give the first approval');
  expect(await mainOf(page)).toContain('Your approval is kept.');
  await page.goto(`/sorting-table/${id}`);
  expect(await mainOf(page)).toContain('The second has to come from another moderator.');
  expect(await page.getByRole('link', { name: 'Approve', exact: true }).count()).toBe(0);
  expect(await everywhere()).toEqual([false, false, false, false]);

  const second = await (await visitAs(browser, await aPerson('moderator', 'Sylvie Second'), { script: false })).newPage();
  await approve(second, id, 'Approve: it comes into use');
  expect(await everywhere()).toEqual([true, true, true, true]);

  await page.goto('/regions/eu/editions');
  await page.getByRole('link', { name: /^Withdraw edition/ }).click();
  await page.waitForURL(/\/withdraw$/);
  expect(await mainOf(page)).toMatch(/What comes back[\s\S]*The rule “Lead limit, hollow ware” is changed:[\s\S]*4 mg\/L/);
  await page.locator('textarea[name="reason"]').fill('The figure was invented for a trial.');
  await page.getByRole('button', { name: 'Withdraw the edition' }).click();
  await page.waitForURL(/editions\?done=/);
  expect(await mainOf(page)).toContain('The figure was invented for a trial.');
  expect(await everywhere()).toEqual([false, false, false, false]);
}, 300_000);

test('nobody decides about their own amendment: a moderator reads it, is told why, and a page of a decision leads back', async () => {
  const id = await sendChanged(moderator.id, 'is', { mend: withRule('is', 'is-own'), summary: 'My own amendment to this sheet.' });
  const page = await (await visitAs(browser, moderator)).newPage();
  for (const part of ['', '/approve', '/hold', '/send-back']) {
    await page.goto(`/sorting-table/${id}${part}`);
    expect(new URL(page.url()).pathname).toBe(`/sorting-table/${id}`);
  }
  expect(await mainOf(page)).toContain('This is your own amendment.');
  expect(await page.locator('main form').count()).toBe(0);
});

test('T3 the table is narrowed and sorted by its address, counts what it shows, and says when nothing fits', async () => {
  const id = await markedIn('no', 'no-sorted');
  const page = await (await visitAs(browser, moderator, { script: false })).newPage();
  await page.goto('/sorting-table');
  await page.locator('select[name="region"]').selectOption('no');
  await page.getByRole('button', { name: 'Show these' }).click();
  await page.waitForURL(/region=no/);
  expect(await page.locator(`a[href="/sorting-table/${id}"]`).count()).toBe(1);
  expect(await mainOf(page)).toMatch(/\d+ amendments? that waits? fits? these filters/);
  await page.getByRole('link', { name: 'Sort by: Place' }).click();
  await page.waitForURL(/sort=region/);
  expect([page.url().includes('region=no'), await page.locator('th[aria-sort="ascending"]').textContent()]).toEqual([true, 'Place']);
  await page.goto('/sorting-table?region=no&days=30');
  expect(await mainOf(page)).toMatch(/None of those that wait fits what you have chosen\.[\s\S]*day book/);
});

test('the table is brought up to date by itself, without taking the focus away', async () => {
  const seen = await markedIn('pt', 'pt-seen');
  const page = await (await visitAs(browser, moderator)).newPage();
  await page.goto('/sorting-table?region=pt');
  await page.locator(`a[data-row="${seen}"]`).focus();
  const came = await markedIn('pt', 'pt-came');
  await page.locator(`a[data-row="${came}"]`).waitFor({ timeout: 60_000 });
  expect(await page.locator('.sorting-table [role="status"]').textContent()).toBe('1 amendment came in');
  expect(await page.evaluate(() => document.activeElement?.getAttribute('data-row'))).toBe(seen);
  await db('amendments').where({ id: seen }).update({ state: 'withdrawn', version: 3 });
  await page.getByText('waits no longer').waitFor({ timeout: 60_000 });
  expect(await page.evaluate(() => document.activeElement?.getAttribute('data-row'))).toBe(seen);
}, 200_000);

test('S28 nobody but moderators gets the table or an amendment on it', async () => {
  const id = await markedIn('pl', 'pl-hidden');
  const people = [await aPerson('maker'), await aPerson('editor')];
  for (const person of people) {
    const headers = { cookie: await cookieOf(person) };
    for (const path of ['/sorting-table', `/sorting-table/${id}`, '/api/sorting-table', '/regions/eu/editions/withdraw']) {
      const answer = await fetch(SITE + path, { headers, redirect: 'manual' });
      expect([person.role, path, answer.status]).toEqual([person.role, path, 404]);
      expect(await answer.text()).not.toContain('A mark on each pot');
    }
  }
  expect((await fetch(`${SITE}/api/sorting-table`)).status).toBe(401);
});

test('W9 an amendment is ticked, remarked on and approved by keyboard alone', async () => {
  const id = await markedIn('cz', 'cz-keys');
  const page = await (await visitAs(browser, moderator, { width: 320 })).newPage();
  await page.goto(`/sorting-table/${id}`);
  const reach = async (selector: string): Promise<void> => {
    for (let presses = 0; presses < 150; presses += 1) {
      if (await page.evaluate((wanted) => document.activeElement?.matches(wanted) ?? false, selector)) return;
      await page.keyboard.press('Tab');
    }
    throw new Error(`The keyboard does not reach ${selector}`);
  };
  await reach('#remarks-rules-cz-keys summary');
  await page.keyboard.press('Enter');
  await reach('#remarks-rules-cz-keys textarea');
  await page.keyboard.type('Is that so?');
  await page.keyboard.press('Tab');
  await page.keyboard.press('Enter');
  await page.waitForURL(/kept=yes/);
  await page.goto(`/sorting-table/${id}`);
  await reach('[data-tick]');
  await page.keyboard.press('Space');
  await page.locator('[data-tick][aria-pressed="true"]').waitFor();
  await reach('a[href$="/approve"]');
  await page.keyboard.press('Enter');
  await page.waitForURL(/\/approve$/);
  await reach('main button');
  await page.keyboard.press('Enter');
  await page.waitForURL(/done=in-use/);
}, 200_000);

test('W1 W7 light and dark: axe finds nothing on the moderators’ pages, and none scrolls sideways', async () => {
  const [id, over] = [await markedIn('hu', 'hu-axe'), await markedIn('hu', 'hu-stale')];
  const setup = await (await visitAs(browser, moderator)).newPage();
  const first = await markedIn('lv', 'lv-first');
  const stale = await markedIn('lv', 'lv-stale');
  await approve(setup, first, 'Approve: it comes into use');
  const paths = [
    '/sorting-table',
    '/sorting-table?region=jp',
    '/sorting-table?done=in-use&place=lv&edition=2',
    `/sorting-table/${id}`,
    `/sorting-table/${id}/approve`,
    `/sorting-table/${id}/send-back`,
    `/sorting-table/${over}/hold`,
    `/sorting-table/${stale}`,
    `/sorting-table/${first}`,
    '/regions/lv/editions',
    '/regions/lv/editions/withdraw',
    '/regions/hu/editions/withdraw',
    '/bench',
  ];
  const open = async (width: number): Promise<Page> => (await visitAs(browser, moderator, { width })).newPage();
  expect(await faultsOf(open, paths)).toEqual([]);
}, 900_000);

test('D8 at 1280 px a claim and its source stand side by side, at 320 px the claim comes first', async () => {
  const id = await markedIn('ee', 'ee-sides');
  const places = async (width: number): Promise<readonly { readonly x: number; readonly y: number }[]> => {
    const page = await (await visitAs(browser, moderator, { width })).newPage();
    await page.goto(`/sorting-table/${id}`);
    return page.locator('.claim-sides > div').evaluateAll((sides) =>
      sides.map((side) => {
        const { x, y } = side.getBoundingClientRect();
        return { x, y };
      }),
    );
  };
  const [wide, narrow] = [await places(1280), await places(320)];
  expect([wide[0]?.y === wide[1]?.y, (wide[1]?.x ?? 0) > (wide[0]?.x ?? 0)]).toEqual([true, true]);
  expect([narrow[0]?.x === narrow[1]?.x, (narrow[1]?.y ?? 0) > (narrow[0]?.y ?? 0)]).toEqual([true, true]);
});

test('signed out, the table leads to the door and back', async () => {
  const page = await (await visit(browser)).newPage();
  await page.goto('/sorting-table');
  expect(new URL(page.url()).pathname).toBe('/sign-in');
  expect(new URL(page.url()).searchParams.get('next')).toBe('/sorting-table');
});
