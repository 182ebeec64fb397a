import { randomUUID } from 'node:crypto';
import { existsSync } from 'node:fs';
import fc from 'fast-check';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { DEMO_PASSWORD, DEMO_PEOPLE } from '@/content/seed/demo-people';
import { db } from '@/db/connection';
import { hashPassword } from '@/lib/server/password';
import { linkIn, mailsTo, nextMail } from '../builders/mailbox';
import { startSiteProcess, type SiteProcess } from '../builders/site-process';
import { SITE } from './browser';
import { cookieIn, hiddenFields, packed, post, send, type Answer, type Fields } from './plain-form';
import { aPerson, cookieOf } from './signed-in';

/*
 * What the doors of accounts answer to whoever writes requests by hand, on a process of its own that believes X-Forwarded-For from this
 * machine: so each request can come from an address of its own, and no limit stands in the way.
 */

const PASSWORD = 'slow wheel, wet hands';
const OFTEN = process.env['FOOTRING_EVERY_WIDTH'] === 'yes';

let own: SiteProcess;
let site = '';
let passwordHash = '';

beforeAll(async () => {
  own = await startSiteProcess({ FOOTRING_PROXIES: '127.0.0.1' });
  site = own.address;
  passwordHash = await hashPassword(PASSWORD);
});
afterAll(async () => {
  own.child.kill('SIGTERM');
  await own.ended;
  await db.destroy();
});

let callers = 0;
/** An address nobody else has called from. */
function from(): { readonly 'x-forwarded-for': string } {
  callers += 1;
  return { 'x-forwarded-for': `10.${String(callers >> 16)}.${String((callers >> 8) & 255)}.${String(callers & 255)}` };
}

async function withPassword() {
  const person = await aPerson('maker');
  await db('accounts').where({ id: person.id }).update({ password_hash: passwordHash, second_factor_on_at: null });
  return person;
}

const hexadecimal = (): string => randomUUID().replaceAll('-', '');
/** As long as the address of a person made by `aPerson`. */
const nobody = (): string => `nobod-${randomUUID()}@example.test`;

/** An answer without what is new in each: nonces, keys, the instant, and the address that was asked about. */
function bare({ status, headers, text }: Answer, email: string): string {
  const { date: _date, ...rest } = headers;
  return `${String(status)} ${JSON.stringify(rest)}\n${text}`
    .replaceAll(email, 'ADDRESS')
    .replaceAll(email.replace('@', '%40'), 'ADDRESS')
    .replace(/nonce-[A-Za-z0-9+/=]+/g, 'NONCE')
    .replace(/nonce([\\"'=:]+)[A-Za-z0-9+/=]+/g, 'NONCE$1')
    .replace(/[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}/g, 'KEY');
}

const median = (list: readonly number[]): number => list.toSorted((a, b) => a - b)[Math.floor(list.length / 2)] ?? 0;

type Ask = (email: string) => Promise<Answer>;

/** Asks for a known and an unknown address in turn; answers with the different answers there were. */
async function differing(name: string, known: readonly string[], ask: Ask): Promise<readonly string[]> {
  const seen = new Set<string>();
  const times = { known: [] as number[], unknown: [] as number[] };
  for (const there of known) {
    for (const which of ['known', 'unknown'] as const) {
      const email = which === 'known' ? there : nobody();
      const began = performance.now();
      const answer = await ask(email);
      times[which].push(performance.now() - began);
      seen.add(bare(answer, email));
    }
  }
  console.log(
    `S14 ${name}, ${String(known.length)} each: known ${median(times.known).toFixed(1)} ms, unknown ${median(times.unknown).toFixed(1)} ms`,
  );
  return [...seen];
}

const SAMPLES = OFTEN ? 200 : 25;

test('S14 signing in, a reset, a link and a sign-up answer for known and unknown addresses alike, to the byte', async () => {
  const people = await Promise.all(Array.from({ length: SAMPLES / 5 }, withPassword));
  // One in five: no more than the limit of mails goes to any address, so that the limit itself shows no difference.
  const known = people.flatMap(({ email }) => Array.from({ length: 5 }, () => email));
  const door = async (path: string, fields: Readonly<Record<string, string>>): Promise<Ask> => {
    const hidden = await hiddenFields(site, path);
    return (email) => post(site, path, hidden, { ...fields, email }, from());
  };
  const answers = {
    signIn: await differing('sign-in', known, await door('/sign-in', { password: 'wrong' })),
    reset: await differing('reset', known, await door('/reset', {})),
    link: await differing('link', known, await door('/sign-in/link', {})),
    signUp: await differing('sign-up', known, await door('/sign-up', { name: 'Mara Lindqvist', password: PASSWORD })),
  };
  expect(Object.values(answers).map((different) => different.length)).toEqual([1, 1, 1, 1]);
  expect(answers.signIn[0]).toContain('do not belong together');
  for (const sent of [answers.reset, answers.link, answers.signUp]) expect(sent[0]).toMatch(/^303 .*\/sent/);
}, 600_000);

test('S12 twenty sign in at once while a page is read: all come in', async () => {
  const person = await withPassword();
  const hidden = await hiddenFields(site, '/sign-in');
  const times: number[] = [];
  const reading = { goesOn: true };
  const reader = (async () => {
    while (reading.goesOn) {
      const began = performance.now();
      expect((await send(site, '/regions/dk', {})).status).toBe(200);
      times.push(performance.now() - began);
    }
  })();
  const entered = await Promise.all(
    Array.from({ length: 20 }, () => post(site, '/sign-in', hidden, { email: person.email, password: PASSWORD }, from())),
  );
  reading.goesOn = false;
  await reader;
  const p95 = times.toSorted((a, b) => a - b)[Math.floor(times.length * 0.95)] ?? 0;
  console.log(`S12 20 sign-ins at once: ${String(times.length)} pages read meanwhile, p95 ${p95.toFixed(0)} ms`);
  expect(entered.map(({ status }) => status)).toEqual(Array.from({ length: 20 }, () => 303));
  expect(new Set(entered.map(cookieIn)).size).toBe(20);
});

test('S16 S10 a cookie planted before signing in is of no use after it, and the new one is another', async () => {
  const person = await withPassword();
  const planted = await cookieOf(await aPerson('maker', 'Whoever planted it'));
  expect((await send(site, '/bench', { cookie: planted })).status).toBe(200);
  const hidden = await hiddenFields(site, '/sign-in', { cookie: planted });
  const entered = await post(site, '/sign-in', hidden, { email: person.email, password: PASSWORD }, { ...from(), cookie: planted });
  const cookie = cookieIn(entered);
  expect([entered.status, cookie === '' || cookie === planted]).toEqual([303, false]);
  expect(String(entered.headers['set-cookie'])).toMatch(/footring=[^;]+; Path=\/; .*HttpOnly; SameSite=lax/i);
  expect((await send(site, '/bench', { cookie: planted })).status).toBe(307);
  expect((await send(site, '/bench', { cookie })).text).toContain(person.name);
});

const EVIL = 'evil.example.test';
const OWN_HOST = new URL(SITE).host;
const HOSTS: readonly (readonly [what: string, headers: readonly string[]])[] = [
  ['Host', ['host', EVIL]],
  ['X-Forwarded-Host', ['host', OWN_HOST, 'x-forwarded-host', EVIL]],
  ['X-Forwarded-Proto', ['host', OWN_HOST, 'x-forwarded-proto', 'https']],
  ['Forwarded', ['host', OWN_HOST, 'forwarded', `for=10.0.0.1;host=${EVIL};proto=https`]],
  ['two Host', ['host', OWN_HOST, 'host', EVIL]],
  ['two X-Forwarded-Host', ['host', OWN_HOST, 'x-forwarded-host', OWN_HOST, 'x-forwarded-host', EVIL]],
  ['two X-Forwarded-Host, the other way round', ['host', OWN_HOST, 'x-forwarded-host', EVIL, 'x-forwarded-host', OWN_HOST]],
  ['X-Original-Host and X-Host', ['host', OWN_HOST, 'x-original-host', EVIL, 'x-host', EVIL, 'x-forwarded-server', EVIL]],
];

test.each(HOSTS)('S20 a reset asked for with another %s is refused, or its mail leads to our own site', async (_, headers) => {
  const person = await withPassword();
  const hidden = await hiddenFields(site, '/reset');
  const { type, body } = await packed([...hidden.filter(([name]) => name !== 'email'), ['email', person.email]]);
  const sent = [
    ...headers,
    'origin',
    SITE,
    'content-type',
    type,
    'content-length',
    String(body.length),
    'x-forwarded-for',
    from()['x-forwarded-for'],
  ];
  const { status, text, headers: told } = await send(site, '/reset', sent, body);
  expect([303, 400, 403, 421]).toContain(status);
  expect(text + String(told['location'])).not.toContain(EVIL);
  if (status !== 303) {
    expect(await mailsTo(person.email)).toEqual([]);
    return;
  }
  const mail = await nextMail(person.email, { about: 'Set a new password' });
  expect(mail.text + mail.html).not.toContain(EVIL);
  expect(mail.text).toContain(`${SITE}${linkIn(mail)}`);
});

test('S23 there is no second door to sessions, and no start without a secret', async () => {
  for (const path of ['/api/auth/session', '/api/auth/signin', '/api/auth/callback/credentials', '/api/auth/csrf', '/api/auth/providers']) {
    for (const method of ['GET', 'POST']) {
      const asked = { origin: SITE, host: OWN_HOST, 'content-type': 'application/json', 'content-length': 16 };
      expect([path, method, (await send(site, path, asked, Buffer.from('{"role":"admin"}'), method)).status]).toEqual([path, method, 404]);
    }
  }
  await expect(startSiteProcess({ FOOTRING_SECRET: '' })).rejects.toThrow(/FOOTRING_SECRET/);
});

test('S07 no answer lets another site read what a cookie opens', async () => {
  const cookie = await cookieOf(await aPerson('maker'));
  for (const path of [
    '/',
    '/sign-in',
    '/bench',
    '/bench/account',
    '/nope',
    '/regions/dk',
    '/api/health',
    '/api/v1/regions',
    '/api/v1/search?q=lead',
  ]) {
    for (const method of ['GET', 'OPTIONS']) {
      const { headers } = await send(
        site,
        path,
        { cookie, origin: `https://${EVIL}`, 'access-control-request-method': 'POST' },
        undefined,
        method,
      );
      const allowed = headers['access-control-allow-origin'];
      expect([path, method, headers['access-control-allow-credentials']]).toEqual([path, method, undefined]);
      expect([path, method, path.startsWith('/api/') ? (allowed ?? '*') : allowed]).toEqual([
        path,
        method,
        path.startsWith('/api/') ? '*' : undefined,
      ]);
    }
  }
});

const ODD = [
  '',
  '0',
  'false',
  'null',
  '[]',
  '{}',
  '[[0]]',
  "' or 1=1-- ",
  '\\',
  '\u0000',
  '\u202e',
  '1e400',
  '%00',
  '../../etc',
  'x'.repeat(5000),
];
const FORMS: Readonly<Record<string, Readonly<Record<string, string>>>> = {
  '/sign-in': { email: 'odd@example.test', password: 'odd', next: '/regions' },
  '/sign-in/link': { email: 'odd@example.test' },
  '/reset': { email: 'odd@example.test' },
  '/sign-up': { email: 'odd@example.test', name: 'Odd', password: PASSWORD },
  '/bench/account/name': { name: 'Odd' },
  '/bench/account/address': { email: 'odd@example.test' },
  '/bench/account/preferences': { region: 'dk', currency: 'DKK', units: 'metric' },
  '/bench/account/password': { current: 'odd', password: PASSWORD },
  '/bench/ask': { why: 'odd', regions: 'dk' },
};

test.each(Object.entries(FORMS))('S32 odd values in the fields of %s break nothing and reach nobody else', async (path, fields) => {
  const victim = await withPassword();
  const rowOf = async (): Promise<unknown> => db('accounts').where({ id: victim.id }).first();
  const before = await rowOf();
  const cookie = await cookieOf(await withPassword());
  const hidden = await hiddenFields(site, path, { cookie });
  expect(hidden.length).toBeGreaterThan(0);
  const sent: (readonly [field: string, odd: string, Answer])[] = [];
  for (const field of ['key', ...Object.keys(fields)]) {
    const one = (odd: string): Promise<Answer> => post(site, path, hidden, { ...fields, [field]: odd }, { ...from(), cookie });
    sent.push(...(await Promise.all(ODD.map(async (odd) => [field, odd, await one(odd)] as const))));
    const twice: Fields = [...hidden, ...Object.entries(fields), [field, 'a'], [field, 'b']];
    const { type, body } = await packed(twice);
    const head = { host: OWN_HOST, origin: SITE, 'content-type': type, 'content-length': body.length, cookie, ...from() };
    sent.push([field, 'twice', await send(site, path, head, body)]);
  }
  expect(sent.filter(([, , { status }]) => status >= 500).map(([field, odd]) => [field, odd.slice(0, 20)])).toEqual([]);
  for (const [, , { text, headers }] of sent) expect(text + String(headers['location'])).not.toMatch(/broken\?id=|Something broke/);
  expect(await rowOf()).toEqual(before);
});

/** The id of the action behind the form of a page. */
async function actionAt(path: string, cookie: string): Promise<string> {
  const hidden = await hiddenFields(site, path, { cookie });
  const found = hidden.map(([name, value]) => (/^\$ACTION_ID_([0-9a-f]+)$/.exec(name) ?? /"id":"([0-9a-f]+)"/.exec(value))?.[1]);
  return found.find((id) => id !== undefined) ?? '';
}

const call = (path: string, action: string, cookie: string, body: string, type = 'text/plain;charset=UTF-8'): Promise<Answer> => {
  const bytes = Buffer.from(body);
  const head = {
    host: OWN_HOST,
    origin: SITE,
    'next-action': action,
    'content-type': type,
    'content-length': bytes.length,
    cookie,
    ...from(),
  };
  return send(site, path, head, bytes);
};

test.each(['/sign-in', '/reset', '/bench/account/name', '/bench/account/preferences'])(
  'S32 S36 the action of %s takes no other value for a form',
  async (path) => {
    const person = await aPerson('maker');
    const cookie = await cookieOf(person);
    const action = await actionAt(path, cookie);
    expect(action).not.toBe('');
    for (const args of [
      '[null,0]',
      '[null,false]',
      '[null,null]',
      '[null,[]]',
      '[null,{"name":"Taken"}]',
      '[null,"name=Taken"]',
      '[]',
      '[0,[[0]]]',
    ]) {
      expect([args, (await call(path, action, cookie, args)).status]).toEqual([args, 200]);
    }
    expect(await db('accounts').where({ id: person.id }).pluck('name')).toEqual([person.name]);
  },
);

const CANARY = `/tmp/footring-canary-${String(process.pid)}`;
const piece = fc.oneof(
  fc.constantFrom(
    '__proto__',
    'constructor',
    'then',
    '$@0',
    '$@1',
    '$F1',
    '$K1',
    '$Q1',
    '$W1',
    '$i1',
    '$o1',
    '$r1',
    '$B1',
    '$1:constructor:constructor',
    '$1:__proto__:then',
    '$ACTION_REF_1',
    '$undefined',
    '$n9999999999',
    '$-Infinity',
    '$D2026-99-99',
    `require("fs").writeFileSync("${CANARY}","x")`,
  ),
  fc.string(),
  fc.integer(),
  fc.boolean(),
  fc.constant(null),
);
const value = fc.letrec((tie) => ({
  any: fc.oneof(
    { depthSize: 'small' },
    piece,
    fc.array(tie('any'), { maxLength: 4 }),
    fc.dictionary(fc.oneof(piece.map(String), fc.string()), tie('any'), { maxKeys: 4 }),
  ),
})).any;
const malformed = fc.oneof(
  value.map((args) => ['text/plain;charset=UTF-8', JSON.stringify(args)] as const),
  fc.tuple(value, fc.nat(80)).map(([args, at]) => ['text/plain;charset=UTF-8', JSON.stringify(args).slice(0, at)] as const),
  fc.integer({ min: 1, max: 4000 }).map((deep) => ['text/plain;charset=UTF-8', `${'['.repeat(deep)}${']'.repeat(deep)}`] as const),
  fc.tuple(value, value).map(([one, two]) => {
    const part = (name: string, said: unknown) =>
      `--b\r\nContent-Disposition: form-data; name="${name}"\r\n\r\n${JSON.stringify(said)}\r\n`;
    return ['multipart/form-data; boundary=b', `${part('0', one)}${part('1', two)}--b--\r\n`] as const;
  }),
  fc
    .string()
    .map(
      (text) =>
        ['multipart/form-data; boundary=b', `--b\r\nContent-Disposition: form-data; name="1_$ACTION_REF_1"\r\n\r\n${text}`] as const,
    ),
);

test('S06 S36 malformed calls of an action end no process, run nothing, and are answered', async () => {
  const person = await aPerson('maker');
  const cookie = await cookieOf(person);
  const path = '/bench/account/name';
  const action = await actionAt(path, cookie);
  const times: number[] = [];
  await fc.assert(
    fc.asyncProperty(malformed, async ([type, body]) => {
      const began = performance.now();
      const { status } = await call(path, action, cookie, body, type);
      times.push(performance.now() - began);
      expect(status).toBeGreaterThanOrEqual(200);
    }),
    { numRuns: OFTEN ? 2000 : 250, seed: 20261201 },
  );
  console.log(
    `S06 ${String(times.length)} malformed calls: p99 ${(times.toSorted((a, b) => a - b)[Math.floor(times.length * 0.99)] ?? 0).toFixed(0)} ms`,
  );
  expect([own.child.exitCode, existsSync(CANARY)]).toEqual([null, false]);
  expect((await send(site, path, { cookie })).text).toContain(person.name);
  expect((await call(path, action, cookie, '[null,null]')).status).toBe(200);
}, 300_000);

/** What a row keeps of somebody, in every way it might be written. */
async function secretsOf(id: string): Promise<readonly string[]> {
  const found: unknown[] = [
    ...((await db('accounts').where({ id }).pluck('password_hash')) as unknown[]),
    ...((await db('accounts').where({ id }).pluck('second_factor_secret')) as unknown[]),
    ...((await db('sessions').where({ account_id: id }).pluck('id')) as unknown[]),
    ...((await db('account_tokens').where({ account_id: id }).pluck('hash')) as unknown[]),
  ];
  return found.flatMap((kept) => {
    if (kept instanceof Buffer) return [kept.toString('hex'), kept.toString('base64'), kept.toString('base64url')];
    return typeof kept === 'string' ? [kept] : [];
  });
}

const PUBLIC = [
  '/',
  '/sign-in',
  '/regions',
  '/regions/dk',
  '/changes',
  '/day-book',
  '/coverage',
  '/search?q=victim',
  '/sitemap.xml',
  '/api/v1/regions',
  '/api/v1/search?q=victim',
];
const OF_A_MAKER = ['/bench', '/bench/ask', '/bench/account', '/bench/account/sessions', '/bench/account/export'];

test('S29 no page, no data of a page and no API holds a hash, a token, an address or an e-mail of somebody else', async () => {
  const name = `Victim ${hexadecimal()}`;
  const victim = await aPerson('maker', name);
  await db('accounts')
    .where({ id: victim.id })
    .update({ password_hash: passwordHash, second_factor_secret: Buffer.from(hexadecimal()) });
  const cookie = await cookieOf(victim);
  await post(site, '/reset', await hiddenFields(site, '/reset'), { email: victim.email }, { 'x-forwarded-for': '10.222.111.99' });
  const token =
    linkIn(await nextMail(victim.email))
      .split('/')
      .at(-1) ?? '';
  const secrets = [...(await secretsOf(victim.id)), token, cookie.split('=')[1] ?? '', '10.222.111.99'];
  expect(secrets.every((secret) => secret.length > 10) && secrets.length >= 9).toBe(true);
  const people = { anon: '', maker: await cookieOf(await aPerson('maker')), moderator: await cookieOf(await aPerson('moderator')) };
  const steward = await cookieOf(await aPerson('steward'));
  const desk = ['/stewards?q=victim', `/stewards/accounts/${victim.id}`, '/stewards/requests', '/stewards/outbox', '/stewards/health'];
  const lookAt = async (paths: readonly string[], by: string, forbidden: readonly string[]): Promise<readonly string[]> => {
    const leaks: string[] = [];
    for (const path of paths) {
      for (const asked of [{}, { rsc: '1' }]) {
        const { text } = await send(site, path, { ...asked, ...(by === '' ? {} : { cookie: by }) });
        leaks.push(...forbidden.filter((secret) => text.includes(secret)).map((secret) => `${path} holds ${secret.slice(0, 12)}`));
      }
    }
    return leaks;
  };
  for (const by of Object.values(people)) {
    expect(await lookAt([...PUBLIC, ...OF_A_MAKER, ...desk], by, [...secrets, victim.email, name])).toEqual([]);
  }
  // A steward finds people by name and address: that is what the desk is for. Nothing else of theirs is there.
  expect(await lookAt([...PUBLIC, ...desk], steward, secrets)).toEqual([]);
  expect((await send(site, desk[0] ?? '', { cookie: steward })).text).toContain(name);
});

test('S17 S23 a cookie of our making but changed, and one of nobody, sign in nobody', async () => {
  const [maker] = DEMO_PEOPLE;
  const hidden = await hiddenFields(site, '/sign-in');
  const cookie = cookieIn(await post(site, '/sign-in', hidden, { email: maker?.email ?? '', password: DEMO_PASSWORD }, from()));
  expect((await send(site, '/bench', { cookie })).status).toBe(200);
  const [, token = ''] = cookie.split('=');
  const changed = token.slice(0, -8) + (token.endsWith('AAAAAAAA') ? 'BBBBBBBB' : 'AAAAAAAA');
  for (const bad of [changed, token.slice(0, 40), `${token}.`, '', 'null', '{"sid":"x"}', 'x'.repeat(4000)]) {
    expect([bad.slice(0, 9), (await send(site, '/bench', { cookie: `footring=${bad}` })).status]).toEqual([bad.slice(0, 9), 307]);
  }
});
