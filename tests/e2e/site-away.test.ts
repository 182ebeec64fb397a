import { afterAll, beforeAll, expect, test } from 'vitest';
import { z } from 'zod';
import { linkIn, nextMail } from '../builders/mailbox';
import { openHaltingLine, type HaltingLine } from '../builders/halting-line';
import { startSiteProcess, type SiteProcess } from '../builders/site-process';
import { SITE } from './browser';
import { cookieIn, hiddenFields, post, send, type Answer } from './plain-form';

/* A process of its own, whose database hangs when we say so; and what it writes into its log meanwhile. */

let line: HaltingLine;
let own: SiteProcess;
let site = '';
/** What it wrote before anybody asked it for anything. */
let began = 0;

beforeAll(async () => {
  line = await openHaltingLine(process.env['DATABASE_URL'] ?? '');
  own = await startSiteProcess({ DATABASE_URL: line.url });
  site = own.address;
  began = own.log().length;
});
afterAll(async () => {
  own.child.kill('SIGTERM');
  await own.ended;
  line.end();
});

const FIRST = 'slow wheel, wet hands, first';
const SECOND = 'slow wheel, wet hands, second';
const email = `ronja-${crypto.randomUUID()}@example.test`;

/** Fills in and sends the form of a page. */
async function fill(path: string, fields: Readonly<Record<string, string>>, cookie = ''): Promise<Answer> {
  const more = cookie === '' ? {} : { cookie };
  return post(site, path, await hiddenFields(site, path, more), fields, more);
}

let cookie = '';
const said: string[] = [];

test('one signs up, confirms, signs in, forgets the password and sets another', async () => {
  expect((await fill('/sign-up', { email, name: 'Ronja Kestrel', password: FIRST })).status).toBe(303);
  const confirming = await nextMail(email, { about: 'Confirm' });
  expect((await fill(linkIn(confirming), {})).status).toBe(303);
  cookie = cookieIn(await fill('/sign-in', { email, password: FIRST }));
  await fill('/sign-in', { email, password: `${FIRST}, but wrong` });
  await fill('/reset', { email });
  const reset = await nextMail(email, { about: 'Set a new password' });
  expect((await fill(linkIn(reset), { password: SECOND })).headers['location']).toMatch(/done=reset/);
  const earlier = cookie;
  cookie = cookieIn(await fill('/sign-in', { email, password: SECOND }));
  expect((await send(site, '/bench', { cookie })).text).toContain('Ronja Kestrel');
  said.push(earlier, cookie, ...[confirming, reset].map((mail) => linkIn(mail).split('/').at(-1) ?? ''));
  expect(said.every((secret) => secret.length > 40)).toBe(true);
});

/** Lets the database answer again, and waits for the last connections that were being opened meanwhile to have failed. */
async function goOn(): Promise<void> {
  line.goOn();
  for (let well = 0; well < 5;) well = (await send(site, '/api/health', {})).status === 200 ? well + 1 : 0;
}

const READ = ['/regions', '/regions/dk', '/day-book', '/limits?region=dk', '/search?q=lead', '/sign-in', '/coverage'];

test('SRV-20 S50 S54 while the database hangs, pages answer 503 and when to come back, in plain words; afterwards all is as before', async () => {
  const asked = [
    ...READ.map((path) => [path, {}] as const),
    ...['/bench', '/bench/account', '/privacy'].map((path) => [path, { cookie }] as const),
  ];
  const all = () =>
    Promise.all(
      asked.map(async ([path, headers]) => {
        const since = performance.now();
        return { path, ...(await send(site, path, headers)), ms: performance.now() - since };
      }),
    );
  expect((await all()).map(({ path, status }) => [path, status])).toEqual(asked.map(([path]) => [path, 200]));
  line.halt();
  const hanging = await all();
  const slowest = Math.max(...hanging.map(({ ms }) => ms));
  console.log(`S50 ${String(asked.length)} pages while the database hung: the slowest answer took ${(slowest / 1000).toFixed(1)} s`);
  for (const { path, status, headers, text } of hanging) {
    expect([path, status, headers['retry-after']]).toEqual([path, 503, '5']);
    expect(text).toContain('We cannot look this up right now');
    expect([path, /select |mysql|PROTOCOL|Knex|at \/|\.js:\d/.test(text.replace(/<script[^>]*src=[^>]*>/g, ''))]).toEqual([path, false]);
  }
  expect(slowest).toBeLessThan(10_000);
  const health = await send(site, '/api/health', {});
  expect(health.status).toBe(503);
  expect((await send(site, '/privacy', {})).status).toBe(200); // asks the database nothing
  await goOn();
  expect((await all()).map(({ path, status }) => [path, status])).toEqual(asked.map(([path]) => [path, 200]));
}, 60_000);

const entry = z.object({ at: z.iso.datetime(), level: z.enum(['info', 'warn', 'error']) });

test('SRV-21 S40 S51 the log holds one entry a line, none of anybody’s making, and no password, token, cookie or secret', async () => {
  const link = `/reset/${said.at(-1) ?? ''}`;
  const forms = {
    signIn: await hiddenFields(site, '/sign-in'),
    signUp: await hiddenFields(site, '/sign-up'),
    again: await hiddenFields(site, '/reset'),
  };
  line.halt();
  await Promise.all([
    post(site, '/sign-in', forms.signIn, { email, password: SECOND }),
    post(site, '/sign-up', forms.signUp, { email: `x${email}`, name: 'Ronja', password: FIRST }),
    post(site, '/reset', forms.again, { email }),
    send(site, link, {}),
    send(site, '/bench/account', { cookie }),
    send(site, '/regions/dk?x=%0a{"level":"fake"}', { cookie, 'user-agent': 'x\\n{"level":"fake"}' }),
  ]);
  await goOn();
  await send(site, '/%0a{"level":"fake"}', { 'x-forwarded-host': '{"level":"fake"}' });
  await fill('/sign-in', { email: '\n{"level":"fake"}', password: SECOND });
  const evil = { origin: SITE, 'x-forwarded-host': 'x\t{"level":"fake"}\u009b', cookie };
  await post(site, '/sign-in', forms.signIn, { email, password: SECOND }, evil);

  const written = own.log().slice(began);
  const lines = written.split('\n').filter((one) => one !== '');
  expect(lines.length).toBeGreaterThan(5);
  for (const one of lines) expect(() => entry.parse(JSON.parse(one)), one.slice(0, 300)).not.toThrow();
  expect(/[\u0000-\u0009\u000b-\u001f\u007f-\u009f\u2028\u2029\u202e]/.test(written)).toBe(false);
  const password = new URL(process.env['DATABASE_URL'] ?? '').password;
  const secrets = [
    FIRST,
    SECOND,
    ...said,
    ...said.map((one) => one.replace('footring=', '')),
    password,
    process.env['FOOTRING_SECRET'] ?? '',
    '$argon2',
  ];
  for (const secret of secrets)
    expect([secret.slice(0, 6), secret.length > 5, written.includes(secret)]).toEqual([secret.slice(0, 6), true, false]);
}, 60_000);
