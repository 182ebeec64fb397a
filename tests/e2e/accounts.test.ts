import { Secret, TOTP } from 'otpauth';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { linkIn, mailsTo, nextMail } from '../builders/mailbox';
import { axeFinds, COLOUR_RULES } from './axe';
import { openBrowser, visit } from './browser';

let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(async () => {
  await browser.close();
});

const PASSWORD = 'slow wheel, wet hands';

async function press(page: Page, name: string | RegExp): Promise<void> {
  const button = page.getByRole('main').getByRole('button', { name });
  await button.click();
}

async function signIn(page: Page, email: string, password = PASSWORD): Promise<void> {
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await press(page, 'Sign in');
}

/** What a page is like for whoever cannot see it, narrow and in both themes. The checker is a script: it needs a page that runs them. */
async function faultsOf(page: Page, script: boolean): Promise<readonly unknown[]> {
  if (!script) return [];
  const faults = await axeFinds(page);
  await page.emulateMedia({ colorScheme: 'dark' });
  const dark = await axeFinds(page, COLOUR_RULES);
  await page.emulateMedia({ colorScheme: 'light' });
  const wider = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
  return [...faults, ...dark, ...(wider > 0 ? [`${page.url()} is ${String(wider)} px wider than the screen`] : [])];
}

/** Does what sends a mail, and answers with the address in it. */
async function mailedBy(email: string, about: string, act: () => Promise<void>): Promise<string> {
  const seen = (await mailsTo(email)).at(-1);
  await act();
  return linkIn(await nextMail(email, seen === undefined ? { about } : { after: seen, about }));
}

async function makeAccount(page: Page, email: string, name: string): Promise<string> {
  await page.goto('/sign-up');
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Name').fill(name);
  await page.getByLabel('Password').fill(PASSWORD);
  const link = await mailedBy(email, 'Confirm', async () => {
    await press(page, 'Make the account');
    await page.waitForURL('**/sign-up/sent');
  });
  await page.goto(link);
  await press(page, 'Confirm my address');
  await page.waitForURL(/\/sign-in\?done=confirmed$/);
  return link;
}

const codeOf = (secret: string): string =>
  new TOTP({ secret: Secret.fromBase32(secret.replace(/\s/g, '')) }).generate({ timestamp: Date.now() });

describe.each([
  ['with script', true],
  ['without script', false],
])('accounts %s', (how, script) => {
  const email = `mara.${script ? 'scripted' : 'plain'}@example.test`;
  let secret = '';
  let codes: readonly string[] = [];

  test(`ACT-19 one signs up, is shown what to mend, confirms by mail, and signs in (${how})`, async () => {
    const page = await (await visit(browser, { script, width: 320 })).newPage();
    await page.goto('/sign-up');
    await page.getByLabel('E-mail address').fill('mara@example.test, other@example.test');
    await page.getByLabel('Name').fill('Mara Lindqvist');
    await page.getByLabel('Password').fill('password');
    await press(page, 'Make the account');
    await page.getByRole('group', { name: /answer needs another look/ }).waitFor();
    expect(await page.getByLabel('Name').inputValue()).toBe('Mara Lindqvist');
    expect(await page.getByLabel('E-mail address').inputValue()).toBe('mara@example.test, other@example.test');
    expect(await page.getByLabel('Password').inputValue()).toBe('');
    if (!script) {
      const stranger = await (await visit(browser, { script })).newPage();
      await stranger.goto(page.url());
      expect(await stranger.getByLabel('Name').inputValue()).toBe('');
      await stranger.context().close();
    }
    const faults = [...(await faultsOf(page, script))];
    await page.getByLabel('E-mail address').fill(email);
    await page.getByLabel('Password').fill('password');
    await press(page, 'Make the account');
    await page.getByRole('link', { name: /Very many people use this password/ }).waitFor();
    const link = await makeAccount(page, email, 'Mara Lindqvist');
    await page.goto(link);
    await page.getByRole('heading', { name: 'This link is of no use any more' }).waitFor();
    await page.goto('/bench');
    await page.waitForURL(/\/sign-in\?/);
    await signIn(page, email);
    await page.waitForURL('**/bench');
    await page.getByRole('heading', { level: 1, name: /Mara Lindqvist/ }).waitFor();
    faults.push(...(await faultsOf(page, script)));
    expect(faults).toEqual([]);
    await page.context().close();
  });

  test(`five wrong passwords say so each time, keep the address alone, and lock nobody out (${how})`, async () => {
    const page = await (await visit(browser, { script })).newPage();
    await page.goto('/sign-in?next=/regions');
    for (let tries = 0; tries < 5; tries += 1) {
      await signIn(page, email, `wrong ${String(tries)}`);
      await page.getByRole('link', { name: /do not belong together/ }).waitFor();
      expect(await page.getByLabel('E-mail address').inputValue()).toBe(email);
      await expect.poll(() => page.getByLabel('Password', { exact: true }).inputValue()).toBe('');
    }
    await signIn(page, email);
    await page.waitForURL('**/regions');
    await page.context().close();
  });

  test(`a forgotten password is set anew by mail, and ends every session (${how})`, async () => {
    const other = await (await visit(browser, { script: false })).newPage();
    await other.goto('/sign-in');
    await signIn(other, email);
    await other.waitForURL('**/bench');
    const page = await (await visit(browser, { script })).newPage();
    await page.goto('/reset');
    await page.getByLabel('E-mail address').fill(email.toUpperCase());
    const link = await mailedBy(email, 'Set a new password', async () => {
      await press(page, 'Send me the link');
      await page.waitForURL('**/reset/sent');
    });
    await page.goto(link);
    await page.getByLabel('New password').fill('slow wheel, dry hands');
    await press(page, 'Set the password');
    await page.waitForURL(/\/sign-in\?done=reset$/);
    await signIn(page, email, 'slow wheel, dry hands');
    await page.waitForURL('**/bench');
    await other.goto('/bench');
    expect(other.url()).toContain('/sign-in');
    await page.goto('/bench/account/password');
    await page.getByLabel('Your password until now').fill('slow wheel, dry hands');
    await page.getByLabel('New password').fill(PASSWORD);
    await press(page, 'Change the password');
    await page.waitForURL(/done=password$/);
    await page.context().close();
    await other.context().close();
  });

  test(`a link by mail signs in, and a second step can be set up after the password (${how})`, async () => {
    const page = await (await visit(browser, { script, width: 320 })).newPage();
    await page.goto('/sign-in/link');
    await page.getByLabel('E-mail address').fill(email);
    const link = await mailedBy(email, 'link to sign in', async () => {
      await press(page, 'Send me a link');
      await page.waitForURL('**/sign-in/link/sent');
    });
    await page.goto(link);
    await press(page, 'Sign me in');
    await page.waitForURL('**/bench');
    await page.goto('/bench/account/second-factor');
    await page.getByRole('heading', { name: 'Type your password again to go on' }).waitFor();
    await page.getByLabel('Password').fill(PASSWORD);
    await press(page, 'Go on');
    await page.waitForURL('**/bench/account/second-factor');
    secret = (await page.locator('.code-text').innerText()).trim();
    const faults = [...(await faultsOf(page, script))];
    await page.getByLabel('The code it shows now').fill('000000');
    await press(page, 'Turn the second step on');
    await page.getByRole('link', { name: /This code does not fit/ }).waitFor();
    expect((await page.locator('.code-text').innerText()).trim()).toBe(secret);
    await page.getByLabel('The code it shows now').fill(codeOf(secret));
    await press(page, 'Turn the second step on');
    await page.waitForURL('**/second-factor/codes?*');
    codes = await page.getByRole('list', { name: 'Recovery codes' }).getByRole('listitem').allInnerTexts();
    expect(codes).toHaveLength(10);
    faults.push(...(await faultsOf(page, script)));
    const stranger = await (await visit(browser, { script: false })).newPage();
    await stranger.goto(page.url());
    expect(stranger.url()).toContain('/sign-in');
    expect(faults).toEqual([]);
    await page.context().close();
    await stranger.context().close();
  });

  test(`the second step is asked for, takes a recovery code once, and sessions elsewhere can be ended (${how})`, async () => {
    const [code = ''] = codes;
    const enter = async (given: string): Promise<Page> => {
      const page = await (await visit(browser, { script })).newPage();
      await page.goto('/sign-in');
      await signIn(page, email);
      await page.waitForURL(/second-factor/);
      await page.goto('/bench/account');
      expect(page.url()).toContain('/sign-in/second-factor');
      await page.getByLabel('Code').fill(given);
      await press(page, 'Go on');
      return page;
    };
    const first = await enter(code);
    await first.waitForURL('**/bench/account');
    const again = await enter(code);
    await again.getByRole('link', { name: /This code does not fit/ }).waitFor();
    await again.getByLabel('Code').fill(codes[1] ?? '');
    await press(again, 'Go on');
    await again.waitForURL('**/bench/account');
    await again.goto('/bench/account/sessions');
    await press(again, 'Sign out everywhere else');
    await again.waitForURL(/done=others$/);
    await first.goto('/bench');
    expect(first.url()).toContain('/sign-in');
    await again.goto('/bench');
    await again.getByRole('banner').getByRole('button', { name: 'Sign out' }).click();
    await again.waitForURL(/done=out$/);
    await again.goto('/bench');
    expect(again.url()).toContain('/sign-in');
    await first.context().close();
    await again.context().close();
  });
});
