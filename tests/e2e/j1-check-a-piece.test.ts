import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { answerPage, carryOn, checkBriefly, checkPiece, MUG, openBrowser, SITE, visit, WITH_SCRIPT } from './browser';

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
])('J1 %s', (_, script) => {
  test('a maker checks a mug for Denmark and California and gets both side by side, then each in full', async () => {
    const page = await (await visit(browser, { script })).newPage();
    const asked = await checkPiece(page, ['dk', 'us-ca'], MUG);
    expect(new Set(asked).size).toBe(asked.length);
    await page.getByRole('button', { name: 'Show my checklist' }).click();
    await page.waitForURL(/\/check\/[A-Za-z0-9_-]{22}$/);
    const table = page.getByRole('table');
    expect(await table.getByRole('columnheader').allInnerTexts()).toEqual(['Duty', 'Denmark', 'California']);
    expect(await page.getByText('This list is not proof.').first().isVisible()).toBe(true);

    await page.getByRole('link', { name: 'Checklist for Denmark' }).click();
    await page.waitForURL(/place=dk/);
    const limit = page.locator('#dk-rule-eu-pb-cat2');
    expect(await limit.innerText()).toMatch(/Applies/);
    expect(await limit.innerText()).toMatch(/Because you said: .*Inside depth: 95/s);
    await limit.getByText('Details and source').click();
    expect(await limit.getByText('Art. 2(4)').first().isVisible()).toBe(true);
    expect(await page.locator('#dk-rule-dk-register').innerText()).toMatch(/Applies/);
    const said = await page.locator('section', { has: page.getByRole('heading', { name: 'Also said' }) }).innerText();
    expect(said).toMatch(/1,?000/);
    expect(said).toMatch(/5,?000/);

    await page.goBack();
    await page.getByRole('link', { name: 'Checklist for California' }).click();
    await page.waitForURL(/place=us-ca/);
    expect(await page.locator('#us-ca-rule-us-ca-pb-cups').innerText()).toMatch(/Applies/);
    expect(await page.locator('#us-ca-rule-us-ca-name-mark').innerText()).toMatch(/Applies/);
  });
});

describe.each(WITH_SCRIPT)('J1 with script: %s', (script) => {
  test('the page and the API give the same lines for the same answers', async () => {
    const page = await (await visit(browser, { script })).newPage();
    const said = {
      use: 'food',
      form: 'mug',
      'holds-liquid': 'yes',
      'depth-mm': '95',
      'capacity-ml': '350',
      'cooked-in': 'no',
      'packaging-or-storage': 'no',
    };
    await checkBriefly(page, ['eu'], said);
    await page.getByRole('button', { name: 'Show my checklist' }).click();
    await page.waitForURL(/\/check\/[A-Za-z0-9_-]{22}$/);
    const shown = await page
      .locator('section', { has: page.locator('#eu-applies') })
      .locator('article')
      .evaluateAll((cards) => cards.map(({ id }) => id.replace('eu-rule-', '')));
    const reply = await fetch(`${SITE}/api/v1/checks`, {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: JSON.stringify({
        regions: ['eu'],
        answers: {
          use: 'food',
          form: 'mug',
          'holds-liquid': true,
          'depth-mm': 95,
          'capacity-ml': 350,
          'cooked-in': false,
          'packaging-or-storage': false,
        },
      }),
    });
    type Line = { id: string; status: string; strength: string };
    const { regions } = (await reply.json()) as { regions: { rules: Line[] }[] };
    const told = regions[0]?.rules.filter(({ status, strength }) => status === 'applies' && strength !== 'note').map(({ id }) => id) ?? [];
    expect([...shown].sort()).toEqual([...told].sort());
  });

  test('an entry that cannot be read comes back as typed, says how to mend it, and Back works', async () => {
    const page = await (await visit(browser, { script })).newPage();
    await page.goto('/check?region=dk');
    await page.getByRole('button', { name: 'Begin with the questions' }).click();
    await page.waitForURL(/\/use$/);
    await answerPage(page, { use: 'food' });
    const base = page.url().replace(/\/[^/]+$/, '');
    await page.goto(`${base}/depth-mm`);
    await page.locator('input[name="depth-mm"]').fill('about sixty');
    await page.locator('input[name="capacity-ml"]').fill('350');
    await carryOn(page);
    expect(new URL(page.url()).searchParams.get('look')).toBe('1');
    expect(await page.locator('input[name="depth-mm"]').inputValue()).toBe('about sixty');
    expect(await page.locator('input[name="capacity-ml"]').inputValue()).toBe('350');
    const summary = page.getByRole('group', { name: 'One answer needs another look' });
    expect(await summary.innerText()).toMatch(/write digits only/);
    await page.locator('input[name="depth-mm"]').fill('62,5');
    await carryOn(page);
    await page.goBack();
    expect(await page.getByRole('heading', { level: 1 }).isVisible()).toBe(true);
    await page.goto(`${base}/review`);
    expect(await page.locator('main').innerText()).toMatch(/62\.5\s*mm/);
  });

  test('what is not answered or not known is shown as open, never as no', async () => {
    const page = await (await visit(browser, { script })).newPage();
    await page.goto('/check?region=dk');
    await page.getByRole('button', { name: 'Begin with the questions' }).click();
    await page.waitForURL(/\/use$/);
    await answerPage(page, { use: 'food' });
    const base = page.url().replace(/\/[^/]+$/, '');
    await page.goto(`${base}/depth-mm`);
    await answerPage(page, {});
    await page.goto(`${base}/review`);
    expect(await page.locator('#not-known').isVisible()).toBe(true);
    await page.getByRole('button', { name: 'Show my checklist' }).click();
    await page.waitForURL(/\/check\/[A-Za-z0-9_-]{22}$/);
    expect(await page.locator('#dk-rule-eu-pb-cat1').innerText()).toMatch(/Not settled yet/);
    expect(await page.locator('#dk-rule-dk-register').innerText()).toMatch(/Not settled yet/);
    expect(
      await page
        .locator('section', { has: page.locator('#dk-does-not-apply') })
        .locator('#dk-rule-eu-pb-cat1')
        .count(),
    ).toBe(0);
  });

  test('a kept copy has an address of its own and says what it rests on', async () => {
    const page = await (await visit(browser, { script })).newPage();
    await checkBriefly(page, ['jp'], {
      use: 'food',
      form: 'bowl',
      'holds-liquid': 'yes',
      'depth-mm': '25',
      'capacity-ml': '400',
      'cooked-in': 'no',
    });
    await page.getByRole('button', { name: 'Show my checklist' }).click();
    await page.getByRole('button', { name: 'Keep a dated copy' }).click();
    await page.waitForURL(/\/copies\/[0-9a-f]{64}$/);
    expect(await page.locator('#jp-rule-jp-pb-deep-small').innerText()).toMatch(/Applies/);
    expect(await page.locator('main').innerText()).toMatch(/the list is the same/);
    const other = await (await visit(browser, { script })).newPage();
    const answer = await other.goto(page.url());
    expect(answer?.status()).toBe(200);
  });
});

/** W10: after each step the heading has the focus. Who types faster than that would be set back to it. */
const arrived = (page: Page) => page.waitForFunction(() => document.activeElement?.tagName === 'H1');

test('J1 a whole check can be done with the keyboard alone', async () => {
  const page = await (await visit(browser)).newPage();
  await page.goto('/check');
  const press = async (key: string, until: string) => {
    for (let tries = 0; tries < 60; tries += 1) {
      await page.keyboard.press(key);
      if (await page.evaluate((selector) => document.activeElement?.matches(selector) === true, until)) return;
    }
    throw new Error(`${until} cannot be reached with ${key}`);
  };
  await press('Tab', 'details:has(input[value="dk"]) > summary');
  await page.keyboard.press('Enter');
  await press('Tab', 'input[name="region"][value="dk"]');
  await page.keyboard.press('Space');
  await press('Tab', 'button.button-primary');
  await page.keyboard.press('Enter');
  await page.waitForURL(/\/use$/);
  await arrived(page);
  await press('Tab', 'input[name="use"]');
  await page.keyboard.press('Space');
  await press('Tab', 'button.button-primary');
  await page.keyboard.press('Enter');
  await page.waitForURL(/\/form$/);
  await arrived(page);
});
