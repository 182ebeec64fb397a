import { request } from 'node:http';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { enqueueMail } from '@/db/outbox';
import { insertRoleRequest } from '@/db/role-requests';
import { inTransaction } from '@/db/transaction';
import { ok } from '@/lib/kernel/result';
import { newId } from '@/lib/server/new-id';
import { openBareSite, type BareSite } from './bare-site';
import { SITE } from './browser';
import { aPerson, cookieOf, type Person } from './signed-in';

/*
 * Every page that is not for everybody, asked for in every way known to have opened such pages somewhere: of the site as it was built, and
 * of the same build without proxy.ts, which must protect nothing by itself.
 */

/** A page, and a text that stands on it and nowhere else that its reader may see. */
type Guarded = { readonly path: string; readonly canary: string };

const CANARY = 'kestrelglaze';
let desk: readonly Guarded[] = [];
let bench: readonly Guarded[] = [];
let bare: BareSite;
let cookies: Readonly<Record<'maker' | 'editor' | 'moderator' | 'steward', string>>;

beforeAll(async () => {
  bare = await openBareSite();
  const victim = await aPerson('maker', `Victim ${CANARY}`);
  const people = {
    maker: await aPerson('maker'),
    editor: await aPerson('editor'),
    moderator: await aPerson('moderator'),
    steward: await aPerson('steward'),
  };
  const cookie = (person: Person): Promise<string> => cookieOf(person);
  cookies = {
    maker: await cookie(people.maker),
    editor: await cookie(people.editor),
    moderator: await cookie(people.moderator),
    steward: await cookie(people.steward),
  };
  const requestId = newId(new Date());
  await inTransaction(db, async (trx) => {
    const at = new Date();
    await insertRoleRequest(trx, { id: requestId, accountId: victim.id, why: `Because of ${CANARY}`, regions: [], at });
    const mail = { subject: 's', text: 't', html: 'h' };
    await enqueueMail(trx, { accountId: victim.id, address: `${CANARY}@example.test`, mail, kind: 'tests', at });
    await trx('outbox').where({ account_id: victim.id }).update({ state: 'parked' });
    return ok(null);
  });
  const account = `/stewards/accounts/${victim.id}`;
  desk = [
    '/stewards?q=victim',
    account,
    `${account}/role`,
    `${account}/close`,
    '/stewards/requests',
    `/stewards/requests/${requestId}`,
    '/stewards/outbox?part=parked',
  ].map((path) => ({ path, canary: CANARY }));
  desk = [...desk, { path: '/stewards/health', canary: 'Background work' }];
  bench = [
    { path: '/bench', canary: 'What you can do here' },
    { path: '/bench/ask', canary: 'Editors write amendments' },
    { path: '/bench/account', canary: people.maker.email },
    { path: '/bench/account/name', canary: 'Keep this name' },
    { path: '/bench/account/address', canary: people.maker.email },
    { path: '/bench/account/password', canary: 'You have no password yet' },
    { path: '/bench/account/preferences', canary: 'Keep these choices' },
    { path: '/bench/account/second-factor', canary: 'The second step is on' },
    { path: '/bench/account/sessions', canary: 'Your sessions' },
    { path: '/bench/account/export', canary: 'Put the archive together' },
    { path: '/bench/account/delete', canary: 'Delete my account' },
  ];
});
afterAll(async () => {
  await bare.end();
  // Nobody of these stays in the way of a count of stewards or of mail.
  await db('outbox').where('address', 'like', `${CANARY}%`).del();
  await db('accounts')
    .where({ name: `Victim ${CANARY}` })
    .update({ name: 'Nobody' });
  await db.destroy();
});

type Way = { readonly name: string; readonly headers?: Readonly<Record<string, string>>; readonly path?: (path: string) => string };

const beforeQuery = (path: string, change: (place: string) => string): string => {
  const [place = '', query] = path.split('?');
  return query === undefined ? change(place) : `${change(place)}?${query}`;
};
const withQuery = (path: string, query: string): string => `${path}${path.includes('?') ? '&' : '?'}${query}`;
const RSC = { rsc: '1' };
const five = (name: string): string => Array.from({ length: 5 }, () => name).join(':');

const WAYS: readonly Way[] = [
  { name: 'plain' },
  { name: 'RSC', headers: RSC },
  { name: '?_rsc', headers: RSC, path: (path) => withQuery(path, '_rsc=1abcd') },
  { name: '?_rsc without header', path: (path) => withQuery(path, '_rsc=1abcd') },
  { name: '.rsc', path: (path) => beforeQuery(path, (place) => `${place}.rsc`) },
  { name: 'prefetch', headers: { ...RSC, 'next-router-prefetch': '1' } },
  { name: 'prefetch of a segment', headers: { ...RSC, 'next-router-prefetch': '1', 'next-router-segment-prefetch': '/_tree' } },
  { name: 'a segment', path: (path) => beforeQuery(path, (place) => `${place}.segments/_full.segment.rsc`) },
  ...['middleware', 'src/middleware', 'pages/_middleware', five('middleware'), five('src/middleware'), five('proxy')].map((value) => ({
    name: `x-middleware-subrequest: ${value}`,
    headers: { 'x-middleware-subrequest': value },
  })),
  { name: 'x-nextjs-data', headers: { 'x-nextjs-data': '1' } },
  { name: 'x-rewrite-url', headers: { 'x-original-url': '/', 'x-rewrite-url': '/' } },
  { name: '//', path: (path) => `/${path}` },
  { name: '%2e', path: (path) => `/%2e${path}` },
  { name: '/x/..', path: (path) => `/regions/..${path}` },
  { name: '%2e%2e', path: (path) => `/regions/%2e%2e${path}` },
  { name: 'trailing slash', path: (path) => beforeQuery(path, (place) => `${place}/`) },
  { name: 'upper case', path: (path) => beforeQuery(path, (place) => place.toUpperCase()) },
];

type Answer = { readonly status: number; readonly text: string };
type Headers = Readonly<Record<string, string>>;

/** Sends the path and the headers as they are written; `fetch` would tidy them up first. With a body it is a POST. */
function ask(site: string, path: string, headers: Headers, body?: Buffer): Promise<Answer> {
  const { hostname, port } = new URL(site);
  return new Promise((resolve, reject) => {
    const sent = request({ hostname, port, path, headers, method: body === undefined ? 'GET' : 'POST' }, (answer) => {
      const parts: Buffer[] = [];
      answer.on('data', (part: Buffer) => parts.push(part));
      answer.on('end', () => {
        resolve({ status: answer.statusCode ?? 0, text: Buffer.concat(parts).toString('utf8') });
      });
    });
    sent.on('error', reject);
    sent.end(body);
  });
}

/** Of some pages, those that some way opened to whoever sends this cookie. */
async function opened(site: string, pages: readonly Guarded[], cookie: string | null): Promise<readonly string[]> {
  const found: string[] = [];
  for (const { path, canary } of pages) {
    const answers = await Promise.all(
      WAYS.map(async ({ name, headers = {}, path: write = (given) => given }) => ({
        name,
        ...(await ask(site, write(path), { ...headers, ...(cookie === null ? {} : { cookie }) })),
      })),
    );
    found.push(
      ...answers
        .filter(({ text, status }) => text.includes(canary) || status >= 500)
        .map(({ name, status }) => `${path} by ${name}: ${status}`),
    );
  }
  return found;
}

describe.each([
  ['as it was built', () => SITE],
  ['without proxy.ts', () => bare.site],
])('S02 of the site %s, pages that are not for everybody', (_, siteOf) => {
  test('are there for whom they are, with the text that is looked for', async () => {
    for (const [pages, cookie] of [[desk, cookies.steward] as const, [bench, cookies.maker] as const]) {
      for (const { path, canary } of pages) {
        const { status, text } = await ask(siteOf(), path, { cookie });
        expect([path, status, text.includes(canary)]).toEqual([path, 200, true]);
      }
    }
  });

  test('ROL-14 are drawn for nobody who is not signed in', async () => {
    expect(await opened(siteOf(), [...desk, ...bench], null)).toEqual([]);
  });

  test.each(['maker', 'editor', 'moderator'] as const)('of the desk are drawn for no %s', async (role) => {
    expect(await opened(siteOf(), desk, cookies[role])).toEqual([]);
  });
});

test('S02 the second site does without proxy.ts: it sets no policy with a nonce, the first does', async () => {
  const policyOf = async (site: string) => (await fetch(`${site}/day-book`)).headers.get('content-security-policy') ?? '';
  expect([(await policyOf(SITE)).includes('nonce-'), (await policyOf(bare.site)).includes('nonce-')]).toEqual([true, false]);
});

/** The fields that the form of a page sends along unseen. */
async function hiddenFields(path: string, cookie: string): Promise<FormData> {
  const { text } = await ask(SITE, path, { cookie });
  const main = text.slice(text.indexOf('<main'), text.indexOf('</main'));
  const form = new FormData();
  for (const [, name = '', value = ''] of main.matchAll(/<input type="hidden" name="([^"]+)"(?: value="([^"]*)")?/g)) {
    form.append(name, value.replaceAll('&quot;', '"').replaceAll('&amp;', '&'));
  }
  return form;
}

test('S56 S04 a form drawn by one process is carried out by another; sent from elsewhere it is by none, with or without proxy.ts', async () => {
  const person = await aPerson('maker');
  const cookie = await cookieOf(person);
  const send = async (site: string, name: string, origin: string | null): Promise<number> => {
    const form = await hiddenFields('/bench/account/name', cookie);
    form.set('name', name);
    const packed = new Response(form);
    const body = Buffer.from(await packed.arrayBuffer());
    const type = packed.headers.get('content-type') ?? '';
    // A front server hands on the name that the browser asked for, whichever process it chooses.
    const sent = { cookie, host: new URL(SITE).host, 'content-type': type, 'content-length': String(body.length) };
    return (await ask(site, '/bench/account/name', { ...sent, ...(origin === null ? {} : { origin }) }, body)).status;
  };
  const nameNow = async (): Promise<unknown> => (await db('accounts').where({ id: person.id }).pluck('name'))[0];
  for (const site of [SITE, bare.site]) {
    for (const origin of ['https://evil.example.test', 'null', null]) await send(site, 'Stolen', origin);
  }
  expect(await nameNow()).toBe(person.name);
  expect([await send(bare.site, 'Taken over', SITE), await nameNow()]).toEqual([303, 'Taken over']);
});

test('S11 S05 such pages are told to no cache, and reading them changes nothing', async () => {
  const tables = ['accounts', 'role_requests', 'day_book', 'account_tokens', 'recovery_codes', 'account_exports'];
  const sum = async (): Promise<string> =>
    JSON.stringify(
      (await Promise.all(tables.map((table) => db.raw<readonly unknown[]>('CHECKSUM TABLE ??', [table])))).map(([rows]) => rows),
    );
  const before = await sum();
  for (const [pages, cookie] of [[desk, cookies.steward] as const, [bench, cookies.maker] as const]) {
    for (const { path } of pages) {
      const answer = await fetch(SITE + path, { headers: { cookie } });
      expect([path, answer.headers.get('cache-control')]).toEqual([path, expect.stringMatching(/private.*no-store|no-store.*private/)]);
      await answer.text();
    }
  }
  expect(await sum()).toBe(before);
});
