import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';

/** Address of the built site under test. */
export const SITE = process.env['FOOTRING_SITE'] ?? 'http://localhost:3000';

/** Whether pages are looked at in every width and theme there is, as `npm run test:long` does. */
export const EVERY_LOOK = process.env['FOOTRING_EVERY_WIDTH'] === 'yes';

/** With script and without; where both go the same way, `npm test` goes the harder one, without. */
export const WITH_SCRIPT: readonly boolean[] = EVERY_LOOK ? [true, false] : [false];

/** Widths in CSS pixels at which axe looks at pages: the narrowest each time, all of them when every look is asked for. */
export const WIDTHS: readonly number[] = EVERY_LOOK ? [320, 1280] : [320];

const FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/** Debian's Chromium without a window. */
export const openBrowser = (): Promise<Browser> => chromium.launch({ executablePath: '/usr/bin/chromium', args: FLAGS });

export type Setting = { readonly script?: boolean; readonly width?: number; readonly dark?: boolean };

/** A fresh visitor. */
export function visit(browser: Browser, { script = true, width = 1280, dark = false }: Setting = {}): Promise<BrowserContext> {
  return browser.newContext({
    baseURL: SITE,
    javaScriptEnabled: script,
    viewport: { width, height: 900 },
    colorScheme: dark ? 'dark' : 'light',
    reducedMotion: 'reduce',
    locale: 'en-GB',
  });
}

/** Presses "Carry on" and waits for the page it leads to. */
export async function carryOn(page: Page): Promise<void> {
  const before = page.url();
  await page.getByRole('button', { name: 'Carry on' }).click();
  await page.waitForURL((url) => url.href !== before);
}

export type Said = Readonly<Record<string, string | readonly string[]>>;

/** Answers the page of questions shown: by what is in `said`, and everything else with "I don't know yet". */
export async function answerPage(page: Page, said: Said): Promise<void> {
  const asked = await page.locator('input[name="asked"]').evaluateAll((inputs) => inputs.map((input) => (input as HTMLInputElement).value));
  for (const id of asked) await answerQuestion(page, id, said[id]);
  await carryOn(page);
}

async function answerQuestion(page: Page, id: string, answer: string | readonly string[] | undefined): Promise<void> {
  if (answer === undefined) {
    const box = page.locator(`[id="${id}.unknown"]`);
    if ((await box.count()) > 0) await box.check();
    else await page.locator(`input[name="${id}"][value="unknown"]`).check();
    return;
  }
  if (typeof answer !== 'string') {
    for (const option of answer) await page.locator(`input[name="${id}"][value="${option}"]`).check();
    return;
  }
  const radio = page.locator(`input[type="radio"][name="${id}"][value="${answer}"]`);
  if ((await radio.count()) > 0) return radio.check();
  const select = page.locator(`select[name="${id}"]`);
  if ((await select.count()) > 0) {
    await select.selectOption(answer);
    return;
  }
  const field = page.locator(`input[name="${id}"]`);
  if ((await field.count()) > 0) return field.fill(answer);
  const [currency = '', amount = ''] = answer.split(' ');
  await page.locator(`input[name="${id}.${currency}"]`).fill(amount);
}

/** Unfolds the part of the world a place stands in and ticks it. */
export async function choosePlace(page: Page, place: string): Promise<void> {
  const box = page.locator(`input[name="region"][value="${place}"]`);
  const part = page.locator('details', { has: box });
  if ((await part.getAttribute('open')) === null) await part.locator('summary').click();
  await box.check();
}

/** Begins a check for these places and answers until nothing is left to ask. Ends on the review page. */
export async function checkPiece(page: Page, places: readonly string[], said: Said): Promise<readonly string[]> {
  await page.goto('/check');
  for (const place of places) await choosePlace(page, place);
  await page.getByRole('button', { name: 'Begin with the questions' }).click();
  await page.waitForURL(/\/check\/[^/]+\/use/);
  const asked: string[] = [];
  while (!page.url().endsWith('/review') && asked.length < 60) {
    asked.push(new URL(page.url()).pathname.split('/').at(-1) ?? '');
    await answerPage(page, said);
  }
  return asked;
}

/** Begins a check and answers just these questions, each on its page. Ends on the review page. */
export async function checkBriefly(page: Page, places: readonly string[], said: Said): Promise<void> {
  await page.goto(`/check?${places.map((place) => `region=${place}`).join('&')}`);
  await page.getByRole('button', { name: 'Begin with the questions' }).click();
  await page.waitForURL(/\/check\/[^/]+\/use/);
  const base = page.url().replace(/\/use$/, '');
  for (const question of Object.keys(said)) {
    await page.goto(`${base}/${question}`);
    await answerPage(page, said);
  }
  await page.goto(`${base}/review`);
}

/** A glazed mug for acidic and hot drinks: 95 mm deep, 350 mL, fired to 1240 °C. */
export const MUG: Said = {
  use: 'food',
  form: 'mug',
  'holds-liquid': 'yes',
  'depth-mm': '95',
  'capacity-ml': '350',
  'drinking-rim': 'yes',
  'rim-decorated': 'no',
  lidded: 'no',
  'metal-parts': 'no',
  contact: ['acidic', 'hot-drink'],
  'cooked-in': 'no',
  'packaging-or-storage': 'no',
  inside: 'glazed',
  'peak-c': '1240',
  'lead-or-cadmium-in-materials': 'yes',
  colourants: ['lead'],
  'seller-region': 'dk',
  'pieces-a-year': '1001',
  'turnover-a-year': 'DKK 20000',
};
