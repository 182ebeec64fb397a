import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { choosePlace, openBrowser, visit, WITH_SCRIPT } from './browser';

let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(async () => {
  await browser.close();
});

const SHEET = /\/readings\/[A-Za-z0-9_-]{22}/;

/** Presses a button of the form and waits for the address the entry is kept under. */
async function press(page: Page, name: string): Promise<void> {
  const before = new URL(page.url()).pathname;
  await page.getByRole('button', { name, exact: true }).first().click();
  await page.waitForURL((url) => SHEET.test(url.pathname) && url.pathname !== before);
}

async function describeMug(page: Page): Promise<void> {
  for (const place of ['eu', 'us', 'ca']) await choosePlace(page, place);
  for (const [id, answer] of [
    ['use', 'food'],
    ['form', 'mug'],
    ['holds-liquid', 'yes'],
    ['drinking-rim', 'yes'],
    ['rim-decorated', 'no'],
    ['lidded', 'no'],
    ['cooked-in', 'no'],
    ['packaging-or-storage', 'no'],
    ['changed-since-test', 'no'],
  ] as const) {
    await page.locator(`select[name="${id}"]`).selectOption(answer);
  }
  await page.locator('input[name="depth-mm"]').fill('95');
  await page.locator('input[name="capacity-ml"]').fill('350');
}

const cell = (page: Page, column: string, row: number) => page.locator(`[name="readings.${column}.${String(row)}"]`);

describe.each(WITH_SCRIPT)('J6 with script: %s', (script) => {
  test('a maker types a report and sees it held against three places, with chart, caution and whom to ask', async () => {
    const page = await (await visit(browser, { script })).newPage();
    await page.goto('/');
    await page.getByRole('navigation', { name: 'Main' }).getByRole('link', { name: 'Readings' }).click();
    await page.waitForURL(/\/readings$/);
    await describeMug(page);
    await cell(page, 'value', 1).fill('0,31');
    await cell(page, 'value', 2).fill('0.01');
    await cell(page, 'below', 2).check();
    await press(page, 'Hold against the limits');
    const table = page.getByRole('table', { name: /How the figures stand/ });
    expect(await table.getByRole('columnheader').allInnerTexts()).toEqual(
      expect.arrayContaining([expect.stringContaining('Substance'), expect.stringContaining('United States')]),
    );
    expect(await table.getByRole('rowheader').allInnerTexts()).toEqual(
      expect.arrayContaining([expect.stringMatching(/Lead \(Pb\), Vessel/), expect.stringMatching(/Cadmium \(Cd\), Vessel/)]),
    );
    expect(await table.innerText()).toMatch(/Within the limit|Over the limit|Test more pieces|Cannot tell/);
    expect(await table.innerText()).toMatch(/Compared: 0\.31/);
    expect(await table.innerText()).toMatch(/at most 0\.01/);
    await table.getByText('How it is decided, and the source').first().click();
    expect(await table.getByRole('link', { name: 'The rule in full' }).count()).toBeGreaterThan(0);
    expect(await page.getByText('This list is not proof.').first().isVisible()).toBe(true);
    const chart = page.getByRole('img', { name: /Lead \(Pb\), Vessel: reading and limits/ }).first();
    expect(await chart.locator('desc').textContent()).toMatch(/Logarithmic scale from .* limit .* reading/s);
    expect(await page.getByRole('heading', { name: /Whom to ask in/ }).count()).toBe(3);
    expect(await page.locator('main').innerText()).not.toMatch(/\b(safe|food-safe|compliant|certified|approved)\b/i);
  });

  test('pasted rows are shown line by line before anything is held against a limit', async () => {
    const page = await (await visit(browser, { script })).newPage();
    await page.goto('/readings?region=eu');
    await page
      .locator('textarea[name="readings.pasted"]')
      .fill('Sample\tElement\tResult (mg/L)\tRemark\nA\tPb\t0,31\tblue\nA\tCd\t< 0,01\t\nB\tPb\t1.234\t');
    await press(page, 'Show what was understood');
    const preview = page.getByRole('table', { name: /2 lines were understood, one was not/ });
    expect(await preview.getByRole('row').count()).toBe(5);
    expect(await preview.innerText()).toMatch(/Remark/);
    expect(await preview.innerText()).toMatch(/below 0\.01/);
    expect(await preview.innerText()).toMatch(/Not understood\. We cannot tell whether this mark/);
    expect(await page.locator('textarea[name="readings.pasted"]').inputValue()).toMatch(/^Sample\tElement/);
    expect(await page.getByRole('table', { name: /How the figures stand/ }).count()).toBe(0);
  });

  test('a refused entry comes back as typed, says what to mend, and Back works', async () => {
    const page = await (await visit(browser, { script })).newPage();
    await page.goto('/readings?region=eu');
    await page.locator('select[name="form"]').selectOption('bowl');
    await page.locator('input[name="depth-mm"]').fill('about sixty');
    await cell(page, 'value', 1).fill('1.234');
    await cell(page, 'specimen', 1).fill('Bowl 7');
    await press(page, 'Hold against the limits');
    const first = page.url();
    const summary = page.getByRole('group', { name: '2 entries need another look' });
    expect(await summary.innerText()).toMatch(/Row 1: we cannot tell whether this mark/);
    expect(await page.locator('input[name="depth-mm"]').inputValue()).toBe('about sixty');
    expect(await cell(page, 'value', 1).inputValue()).toBe('1.234');
    expect(await cell(page, 'specimen', 1).inputValue()).toBe('Bowl 7');
    expect(await page.locator('select[name="form"]').inputValue()).toBe('bowl');
    await page.locator('input[name="depth-mm"]').fill('60');
    await cell(page, 'value', 1).fill('1.2');
    await press(page, 'Hold against the limits');
    expect(await page.getByRole('table', { name: /How the figures stand/ }).count()).toBe(1);
    await page.goBack();
    await page.waitForURL(first);
    expect(await page.getByRole('group', { name: '2 entries need another look' }).count()).toBe(1);
  });

  test('a profile is drawn, its measures are shown, and they count once the maker says so', async () => {
    const page = await (await visit(browser, { script })).newPage();
    await page.goto('/readings?region=eu');
    for (const [point, radius, height] of [
      [1, '0', '10'],
      [2, '40', '10'],
      [3, '40', '110'],
    ] as const) {
      await page.locator(`input[name="profile.radius.${String(point)}"]`).fill(radius);
      await page.locator(`input[name="profile.height.${String(point)}"]`).fill(height);
    }
    await press(page, 'Draw the profile');
    expect(await page.getByRole('img', { name: 'Half section from your points' }).count()).toBe(1);
    expect(await page.locator('#drawn').innerText()).toMatch(/100 mm/);
    expect(await page.locator('#drawn').innerText()).toMatch(/502\.65\d? mL/);
    await page.locator('input[name="profile.use"]').check();
    await cell(page, 'value', 1).fill('0.31');
    await press(page, 'Hold against the limits');
    expect(await page.getByRole('table', { name: /How the figures stand/ }).count()).toBe(1);
  });

  test('more rows keep what was typed', async () => {
    const page = await (await visit(browser, { script })).newPage();
    await page.goto('/readings');
    await cell(page, 'value', 1).fill('0.31');
    expect(await cell(page, 'value', 7).count()).toBe(0);
    await press(page, 'More rows');
    expect(await cell(page, 'value', 12).count()).toBe(1);
    expect(await cell(page, 'value', 1).inputValue()).toBe('0.31');
  });
});

test('J6 the result prints', async () => {
  const page = await (await visit(browser)).newPage();
  await page.goto('/readings?region=eu');
  await cell(page, 'value', 1).fill('0.31');
  await page.locator('input[name="depth-mm"]').press('Enter');
  await page.waitForURL(SHEET);
  const pdf = await page.pdf({ format: 'A4' });
  expect(pdf.subarray(0, 5).toString()).toBe('%PDF-');
  expect(pdf.length).toBeGreaterThan(10_000);
  await page.emulateMedia({ media: 'print' });
  expect(await page.getByRole('button', { name: 'Hold against the limits again' }).isVisible()).toBe(false);
  expect(await page.getByText('This list is not proof.').first().isVisible()).toBe(true);
});

test('J6 the page of a substance shows its limits place by place, and a substance without any says so', async () => {
  const page = await (await visit(browser)).newPage();
  await page.goto('/substances/pb');
  expect(await page.getByRole('table', { name: /Limits on Lead \(Pb\)/ }).innerText()).toMatch(/European Union/);
  expect(await page.getByRole('link', { name: 'Denmark' }).count()).toBeGreaterThan(0);
  await page.goto('/substances/u');
  expect(await page.getByRole('heading', { name: 'We found no limit in' }).count()).toBe(1);
  expect((await page.goto('/substances/xx'))?.status()).toBe(404);
});
