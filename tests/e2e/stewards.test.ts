import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { enqueueMail } from '@/db/outbox';
import { inTransaction } from '@/db/transaction';
import { ok } from '@/lib/kernel/result';
import { nextMail } from '../builders/mailbox';
import { faultsOf } from './axe';
import { openBrowser, SITE, visit, WITH_SCRIPT } from './browser';
import { aPerson, cookieOf, signIn, visitAs, type Person } from './signed-in';

let browser: Browser;
let steward: Person;

beforeAll(async () => {
  browser = await openBrowser();
  steward = await aPerson('steward', 'Runa Steward');
});
afterAll(async () => {
  await browser.close();
  await db.destroy();
});

async function changeRole(page: Page, person: Person, role: string, reason: string): Promise<void> {
  await page.goto(`/stewards/accounts/${person.id}`);
  await page.getByRole('link', { name: 'Change the role' }).click();
  await page.waitForURL(/\/role$/);
  await page.locator('select[name="role"]').selectOption(role);
  await page.locator('textarea[name="reason"]').fill(reason);
  await page.getByRole('button', { name: 'Change the role' }).click();
  await page.waitForURL(/done=role/);
}

describe.each(WITH_SCRIPT)('with script: %s', (script) => {
  test('ROL-5 S17 a role granted and taken while signed in takes hold at the next request, in another browser', async () => {
    const maker = await aPerson('maker');
    const desk = await (await visitAs(browser, steward, { script })).newPage();
    const theirs = await visitAs(browser, maker, { script });
    const bench = await theirs.newPage();
    await bench.goto('/bench');
    expect(await bench.locator('main').textContent()).toContain('Maker.');

    await changeRole(desk, maker, 'moderator', 'Knows the law of three countries.');
    const granted = Date.now();
    await bench.goto('/bench');
    expect([new URL(bench.url()).pathname, Date.now() - granted < 5000]).toEqual(['/sign-in', true]);
    await signIn(theirs, maker);
    await bench.goto('/bench');
    expect(await bench.locator('main').textContent()).toContain('Moderator.');

    await changeRole(desk, maker, 'maker', 'Has no time any more.');
    const taken = Date.now();
    await bench.goto('/bench');
    expect([new URL(bench.url()).pathname, Date.now() - taken < 5000]).toEqual(['/sign-in', true]);

    const first = await nextMail(maker.email, { about: 'role' });
    const second = await nextMail(maker.email, { after: first, about: 'role' });
    expect([first.text.includes('Knows the law of three countries.'), second.text.includes('Has no time any more.')]).toEqual([true, true]);
    await desk.goto('/day-book?kind=roles');
    const book = (await desk.locator('table').textContent()) ?? '';
    expect([book.includes('Has no time any more.'), book.includes(maker.name), book.includes(steward.name)]).toEqual([true, false, false]);
  });

  test('ROL-8 a maker asks to become an editor, a steward answers, and the bench shows it', async () => {
    const maker = await aPerson('maker');
    const theirs = await visitAs(browser, maker, { script });
    const bench = await theirs.newPage();
    await bench.goto('/bench/ask');
    await bench.locator('textarea[name="why"]').fill('I read the Danish rules every year.');
    await bench.getByRole('button', { name: 'Send to the stewards' }).click();
    await bench.waitForURL(/done=ask/);

    const desk = await (await visitAs(browser, steward, { script })).newPage();
    await desk.goto('/stewards/requests');
    await desk.getByRole('link', { name: `Read and answer: ${maker.name}` }).click();
    await desk.waitForURL(/requests\/[0-9a-f-]{36}/);
    await desk.locator('textarea[name="said"]').fill('Welcome to the sheets.');
    await desk.getByRole('button', { name: 'Send the answer' }).click();
    await desk.locator('#faults').waitFor();
    expect(await desk.locator('textarea[name="said"]').inputValue()).toBe('Welcome to the sheets.');
    await desk.locator('select[name="answer"]').selectOption('granted');
    await desk.getByRole('button', { name: 'Send the answer' }).click();
    await desk.waitForURL(/done=answered/);

    expect((await nextMail(maker.email, { about: 'editor' })).text).toContain('Welcome to the sheets.');
    await signIn(theirs, maker);
    await bench.goto('/bench/ask');
    expect(await bench.locator('main').textContent()).toMatch(/an editor already[\s\S]*Granted on[\s\S]*Welcome to the sheets\./);
  });

  test('ROL-7 a refused reason keeps what was typed and says what to mend; an account closed is out, and one’s own is not closed', async () => {
    const maker = await aPerson('maker', `Ottilie Brack`);
    const theirs = await (await visitAs(browser, maker, { script })).newPage();
    const desk = await (await visitAs(browser, steward, { script })).newPage();
    await desk.goto(`/stewards/accounts/${maker.id}/close`);
    await desk.locator('textarea[name="reason"]').fill('Ottilie Brack sent advertising.');
    await desk.getByRole('button', { name: 'Close the account' }).click();
    await desk.locator('#faults').waitFor();
    expect(await desk.locator('textarea[name="reason"]').inputValue()).toBe('Ottilie Brack sent advertising.');
    await desk.locator('textarea[name="reason"]').fill('Sent advertising.');
    await desk.getByRole('button', { name: 'Close the account' }).click();
    await desk.waitForURL(/done=closed/);
    await theirs.goto('/bench');
    expect(new URL(theirs.url()).pathname).toBe('/sign-in');
    await desk.goto(`/stewards/accounts/${steward.id}/close`);
    await desk.locator('textarea[name="reason"]').fill('Tired.');
    await desk.getByRole('button', { name: 'Close the account' }).click();
    await desk.locator('#faults').waitFor();
    expect(await desk.locator('#faults').textContent()).toContain('You cannot close your own account here');
  });

  test('ROL-9 a mail that was given up is tried again and goes out', async () => {
    const address = `parked-${String(script)}-${steward.id}@example.test`;
    await inTransaction(db, async (trx) => {
      const mail = { subject: 'Clay at last', text: 'Clay', html: '<p>Clay</p>' };
      await enqueueMail(trx, { accountId: null, address, mail, kind: 'tests', at: new Date() });
      await trx('outbox').where({ address }).update({ state: 'parked', tries: 8 });
      return ok(null);
    });
    const desk = await (await visitAs(browser, steward, { script })).newPage();
    await desk.goto('/stewards/outbox?part=parked');
    await desk.getByRole('button', { name: `Try again: mail to ${address}` }).click();
    await desk.waitForURL(/done=retried/);
    expect((await nextMail(address)).subject).toBe('Clay at last');
  });
});

test('W1 light and dark: axe finds nothing at the desk, and no page of it scrolls sideways', async () => {
  const maker = await aPerson('maker', 'Theodora Featherstonehaugh-Cholmondeley');
  const paths = [
    '/stewards',
    '/stewards?q=zzzz',
    `/stewards/accounts/${maker.id}`,
    `/stewards/accounts/${maker.id}/role`,
    `/stewards/accounts/${maker.id}/close`,
    '/stewards/requests',
    '/stewards/outbox',
    '/stewards/outbox?part=parked',
    '/stewards/health',
    '/day-book',
    '/day-book?kind=roles&from=2026-02-30',
  ];
  const open = async (width: number) => (await visitAs(browser, steward, { width })).newPage();
  expect(await faultsOf(open, paths)).toEqual([]);
}, 900_000);

/** The hidden fields of the form a steward sees: what Next needs to know which action is meant. */
async function formAt(page: Page, path: string): Promise<FormData> {
  await page.goto(path);
  const fields = await page
    .locator('main form:has(input[name="key"]) input[type="hidden"]')
    .evaluateAll((inputs) => inputs.map((input) => [(input as HTMLInputElement).name, (input as HTMLInputElement).value] as const));
  const form = new FormData();
  for (const [name, value] of fields) form.append(name, value);
  return form;
}

test('ROL-1 S03 S25 every act of the desk, caught as a steward and sent by everybody else, changes nothing', async () => {
  const target = await aPerson('maker');
  const page = await (await visitAs(browser, steward, { script: false })).newPage();
  const others = [null, ...(await Promise.all((['maker', 'editor', 'moderator'] as const).map((role) => aPerson(role))))];
  const here = `/stewards/accounts/${target.id}`;
  const acts = [
    { path: `${here}/role`, fields: { role: 'steward', reason: 'Because.' } },
    { path: `${here}/close`, fields: { reason: 'Because.' } },
  ];
  const before = await db('day_book').count({ lines: '*' }).first();
  for (const { path, fields } of acts) {
    for (const other of others) {
      const form = await formAt(page, path);
      for (const [name, value] of Object.entries(fields)) form.append(name, value);
      const headers = { origin: SITE, ...(other === null ? {} : { cookie: await cookieOf(other) }) };
      const answer = await fetch(`${SITE}${path}`, { method: 'POST', body: form, redirect: 'manual', headers });
      expect([path, other?.role ?? 'anon', answer.status < 500, /done=/.test(answer.headers.get('location') ?? '')]).toEqual([
        path,
        other?.role ?? 'anon',
        true,
        false,
      ]);
    }
  }
  expect(await db('accounts').where({ id: target.id }).first('role', 'state')).toEqual({ role: 'maker', state: 'open' });
  expect(await db('day_book').count({ lines: '*' }).first()).toEqual(before);
  const form = await formAt(page, `${here}/close`);
  form.append('reason', 'Because.');
  const sent = { method: 'POST', body: form, redirect: 'manual' } as const;
  await fetch(`${SITE}${here}/close`, { ...sent, headers: { origin: SITE, cookie: await cookieOf(steward) } });
  expect(await db('accounts').where({ id: target.id }).first('state')).toEqual({ state: 'closed' });
});

test('ROL-10 S18 the desk asks for the password again after ten minutes, and for the second step first', async () => {
  const other = await aPerson('steward');
  const page = await (await visitAs(browser, other)).newPage();
  await db('sessions')
    .where({ account_id: other.id })
    .update({ fresh_at: new Date(Date.now() - 601_000) });
  await page.goto(`/stewards/accounts/${steward.id}/role`);
  expect(new URL(page.url()).pathname).toBe('/sign-in/again');
  await db('sessions').where({ account_id: other.id }).update({ second_factor_at: null });
  await page.goto('/stewards');
  expect(new URL(page.url()).pathname).toBe('/sign-in/second-factor');
  await db('accounts').where({ id: other.id }).update({ second_factor_on_at: null });
  await page.goto('/stewards');
  expect(new URL(page.url()).pathname).toBe('/sign-in/second-factor');
  await db('accounts').where({ id: other.id }).update({ role: 'maker' });
});

test('S55 nothing of the house is served', async () => {
  const context = await visit(browser);
  const page = await context.newPage();
  await page.goto('/');
  const script = await page.locator('script[src*="/_next/static/"]').first().getAttribute('src');
  const paths = [
    '/.env',
    '/.env.local',
    '/.git/config',
    '/.git/HEAD',
    '/package.json',
    '/.data/secrets.json',
    '/_next/mcp',
    '/__nextjs_original-stack-frame',
  ];
  for (const path of [
    ...paths,
    `${script ?? ''}.map`,
    '/_next/static/../../package.json',
    '/_next/webpack-hmr',
    '/api',
    '/api/auth/session',
  ]) {
    expect([path, (await fetch(SITE + path, { redirect: 'manual' })).status]).toEqual([path, 404]);
  }
  await context.close();
});
