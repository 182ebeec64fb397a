import { expect, test } from 'vitest';
import { DEMO_PASSWORD, DEMO_PEOPLE } from '../../content/seed/demo-people';
import { openBrowser, SITE, visit } from './browser';

const PRIVATE = ['/bench', '/bench/account', '/bench/account/sessions', '/bench/account/name', '/bench/ask'];

/** The cookie of the demonstration's maker, and what her pages say. */
async function signedIn(): Promise<{ readonly cookie: string; readonly name: string; readonly email: string }> {
  const person = DEMO_PEOPLE.find(({ role }) => role === 'maker');
  if (person === undefined) throw new Error('There is no maker among the demo accounts');
  const browser = await openBrowser();
  const context = await visit(browser, { script: false });
  const page = await context.newPage();
  await page.goto('/sign-in');
  await page.getByLabel('E-mail address').fill(person.email);
  await page.getByLabel('Password', { exact: true }).fill(DEMO_PASSWORD);
  await page.getByRole('main').getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL('**/bench');
  const kept = (await context.cookies()).find(({ name }) => name === 'footring');
  expect(kept).toMatchObject({ httpOnly: true, sameSite: 'Lax', path: '/' }); // S10
  await browser.close();
  return { cookie: `footring=${kept?.value ?? ''}`, name: person.name, email: person.email };
}

/** Follows no redirect but the one by which the framework gives an address of its data the mark it wants. */
async function get(path: string, headers: Record<string, string> = {}): Promise<Response> {
  const answer = await fetch(SITE + path, { headers, redirect: 'manual' });
  const led = new URL(answer.headers.get('location') ?? '/', SITE);
  return led.searchParams.has('_rsc') && led.pathname === path ? fetch(led, { headers, redirect: 'manual' }) : answer;
}

test('S10 S11 S29 private pages are nobody else’s, are kept by nobody, and hold no secret', async () => {
  const { cookie, name } = await signedIn();
  for (const path of PRIVATE) {
    for (const asked of [{}, { rsc: '1' }, { 'next-router-prefetch': '1', rsc: '1' }]) {
      const own = await get(path, { ...asked, cookie });
      expect([path, own.headers.get('cache-control')]).toEqual([path, expect.stringMatching(/private.*no-store/)]);
      const text = await own.text();
      expect(text).not.toMatch(/argon2|password_?hash|second_?factor_?secret/i);
      const stranger = await get(path, asked);
      expect([path, (await stranger.text()).includes(name)]).toEqual([path, false]);
    }
  }
});

test('S04 S05 a form that does not come from our own pages is refused, and handlers take no other method', async () => {
  const { cookie } = await signedIn();
  for (const origin of [undefined, 'null', 'https://evil.example', `${SITE}.evil.example`]) {
    for (const more of [{}, { 'x-forwarded-host': 'evil.example', 'x-forwarded-proto': 'https' }]) {
      const answer = await fetch(`${SITE}/bench/account/name`, {
        method: 'POST',
        headers: { cookie, ...(origin === undefined ? {} : { origin }), ...more, 'content-type': 'application/x-www-form-urlencoded' },
        body: 'name=Taken',
        redirect: 'manual',
      });
      expect([origin, answer.status]).toEqual([origin, 403]);
    }
  }
  for (const path of ['/too-many', '/bench/account/export/0190a000-0000-4000-8000-000000000000']) {
    const answer = await fetch(SITE + path, { method: 'POST', headers: { cookie, origin: SITE, 'content-length': '0' } });
    expect([path, answer.status]).toEqual([path, 405]);
  }
  expect(await (await get('/bench', { cookie })).text()).not.toContain('Taken');
});

test('S15 too many tries are answered with 429 and when to try again', async () => {
  const answer = await get('/too-many?s=540');
  expect([answer.status, answer.headers.get('retry-after')]).toEqual([429, '540']);
  expect((await get('/too-many?s=%3Cscript%3E')).headers.get('retry-after')).toBe('60');
});
