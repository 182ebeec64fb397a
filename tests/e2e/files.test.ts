import { spawnSync } from 'node:child_process';
import { randomUUID } from 'node:crypto';
import { existsSync, mkdtempSync, readdirSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:http';
import { connect, type AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import type { Browser } from 'playwright-core';
import { afterAll, afterEach, beforeAll, describe, expect, test } from 'vitest';
import { z } from 'zod';
import { db } from '@/db/connection';
import {
  aPackedBomb,
  aPdf,
  aPdfOfItself,
  aPdfWithPage,
  aPictureWithPage,
  aPngBomb,
  aScriptedDrawing,
  aScriptInGif,
} from '../builders/evil-files';
import { startObjectServer, type ObjectServer } from '../builders/object-server';
import { startSiteProcess, type SiteProcess } from '../builders/site-process';
import { openBrowser, SITE } from './browser';
import { aPerson, cookieOf, visitAs, type Person } from './signed-in';

const STORE = process.env['FOOTRING_STORE_DIR'] ?? '.data/store';
const LARGEST = 15 * 1024 * 1024;

let browser: Browser;
let people: Readonly<Record<'maker' | 'editor' | 'other' | 'moderator', Person>>;
let cookies: Readonly<Record<keyof typeof people, string>>;
let further: SiteProcess | undefined;

beforeAll(async () => {
  browser = await openBrowser();
  people = {
    maker: await aPerson('maker'),
    editor: await aPerson('editor'),
    other: await aPerson('editor'),
    moderator: await aPerson('moderator'),
  };
  cookies = {
    maker: await cookieOf(people.maker),
    editor: await cookieOf(people.editor),
    other: await cookieOf(people.other),
    moderator: await cookieOf(people.moderator),
  };
});
afterEach(() => {
  further?.child.kill('SIGKILL');
  further = undefined;
});
afterAll(async () => {
  await browser.close();
  await db('files').del();
  await db.destroy();
});

/** What is being received at this moment, and what was left behind by it. */
const incoming = (store = STORE): readonly string[] => (existsSync(join(store, 'incoming')) ? readdirSync(join(store, 'incoming')) : []);
const countFiles = async (): Promise<number> => ((await db('files').pluck('id')) as readonly unknown[]).length;

function formOf(bytes: Uint8Array, over: Readonly<Record<string, string>> = {}): FormData {
  const { fileName = 'page.pdf', ...fields } = over;
  const form = new FormData();
  for (const [name, value] of Object.entries({ key: randomUUID(), back: '/bench?a=1', source: 'law', ...fields })) form.set(name, value);
  form.set('file', new File([new Uint8Array(bytes)], fileName));
  return form;
}

type Sent = { readonly site?: string; readonly cookie?: string; readonly headers?: Readonly<Record<string, string>> };
const JSON_TOO = { accept: 'application/json' };

const send = (body: FormData | string, { site = SITE, cookie = cookies.editor, headers = JSON_TOO }: Sent = {}): Promise<Response> =>
  fetch(`${site}/api/files`, { method: 'POST', body, redirect: 'manual', headers: { origin: SITE, cookie, ...headers } });

const keptFile = z.object({ file: z.object({ id: z.string(), sha256: z.string(), type: z.string(), bytes: z.number() }) });
async function keep(bytes: Uint8Array, over: Readonly<Record<string, string>> = {}): Promise<z.output<typeof keptFile>['file']> {
  const answer = await send(formOf(bytes, over));
  expect(answer.status).toBe(201);
  return keptFile.parse(await answer.json()).file;
}

/** Sends what is written, byte for byte, and reads what comes back until the line is closed or a head and some body are there. */
function speak(text: string, tail?: () => Buffer | null): Promise<{ readonly said: string; readonly sent: number }> {
  const { hostname, port } = new URL(SITE);
  return new Promise((resolve) => {
    const socket = connect(Number(port), hostname);
    let said = '';
    let sent = 0;
    const done = (): void => {
      socket.destroy();
      resolve({ said, sent });
    };
    const pump = (): void => {
      for (;;) {
        const piece = tail?.() ?? null;
        if (piece === null || socket.destroyed) return;
        sent += piece.byteLength;
        if (!socket.write(piece)) {
          socket.once('drain', pump);
          return;
        }
      }
    };
    socket.on('data', (bytes: Buffer) => {
      said += bytes.toString('latin1');
      if (tail === undefined && said.includes('\r\n\r\n')) done();
    });
    socket.on('error', done);
    socket.on('close', done);
    socket.setTimeout(15_000, done);
    socket.write(text, pump);
  });
}

describe('a file is sent', () => {
  test('FILE-8 and led back from, and is there for its owner and moderators, to be saved', async () => {
    const answer = await send(formOf(aPdf(), { fileName: '../../Blei §3.pdf' }), { headers: {} });
    expect(answer.status).toBe(303);
    const place = new URL(answer.headers.get('location') ?? '', SITE);
    expect([place.pathname, place.searchParams.get('a'), place.searchParams.get('source')]).toEqual(['/bench', '1', 'law']);
    const get = (cookie: string): Promise<Response> =>
      fetch(`${SITE}/api/files/${place.searchParams.get('file') ?? ''}`, { headers: { cookie }, redirect: 'manual' });
    const own = await get(cookies.editor);
    expect(Buffer.from(await own.arrayBuffer()).equals(aPdf())).toBe(true);
    const headersOf = ({ headers }: Response): readonly (string | null)[] =>
      ['content-type', 'x-content-type-options', 'cache-control', 'content-disposition', 'access-control-allow-origin'].map((name) =>
        headers.get(name),
      );
    expect(headersOf(own)).toEqual([
      'application/pdf',
      'nosniff',
      'private, no-store',
      `attachment; filename="Blei _3.pdf"; filename*=UTF-8''Blei%20%C2%A73.pdf`,
      null,
    ]);
    expect(own.headers.get('content-security-policy')).toContain("sandbox; default-src 'none'");
    const statuses = await Promise.all(
      [cookies.moderator, cookies.other, cookies.maker, ''].map(async (cookie) => (await get(cookie)).status),
    );
    expect(statuses).toEqual([200, 404, 404, 404]);
  });

  test.each([
    ['a page', 'wrong-type', 415, () => Buffer.from('<!doctype html><p>x')],
    ['a drawing with a script', 'wrong-type', 415, aScriptedDrawing],
    ['a script that is a picture', 'wrong-type', 415, aScriptInGif],
    ['an archive that is small only while packed', 'wrong-type', 415, aPackedBomb],
    ['a picture of 196 million pixels', 'too-many-pixels', 413, () => aPngBomb(14_000)],
    ['nothing', 'empty', 422, () => Buffer.alloc(0)],
    ['16 MB', 'too-large', 413, () => Buffer.concat([aPdf(), Buffer.alloc(16 * 1024 * 1024)])],
    ['one byte more than may be', 'too-large', 413, () => Buffer.concat([aPdf(), Buffer.alloc(LARGEST - aPdf().length + 1)])],
  ] as const)('S44 S45 S46 and refused in words that is %s (%s)', async (_, kind, status, make) => {
    const before = await countFiles();
    const answer = await send(formOf(make()));
    expect(answer.headers.get('content-type')).toBe('application/problem+json');
    expect([answer.status, await answer.json()]).toEqual([status, expect.objectContaining({ kind, status })]);
    const led = await send(formOf(make()), { headers: { referer: `${SITE}/bench?b=2` } });
    expect([led.status, new URL(led.headers.get('location') ?? '', SITE).searchParams.get('refused')]).toEqual([303, kind]);
    expect([await countFiles(), incoming()]).toEqual([before, []]);
  });

  test('S46 a PDF that names itself a million times is kept unread', async () => {
    expect((await keep(aPdfOfItself())).bytes).toBe(aPdfOfItself().length);
  });

  test.each([['maker', 403, 'not-allowed'] as const, ['nobody', 401, 'sign-in'] as const])(
    'and refused of %s',
    async (who, status, kind) => {
      const answer = await send(formOf(aPdf()), { cookie: who === 'nobody' ? '' : cookies[who] });
      expect([answer.status, await answer.json()]).toEqual([status, expect.objectContaining({ kind })]);
    },
  );

  test('and led to the door when nobody is signed in, and from there back', async () => {
    const answer = await send(formOf(aPdf()), { cookie: '', headers: {} });
    expect([answer.status, answer.headers.get('location')]).toEqual([303, '/sign-in?why=go-on&next=%2Fbench%3Fa%3D1']);
  });

  test.each([
    'https://evil.example.test/x',
    '//evil.example.test/x',
    '/\\evil.example.test',
    'javascript:alert(1)',
    '\t//evil.example.test',
  ])('and never led to another site (%j)', async (back) => {
    const answer = await send(formOf(aPdf(), { back }), { headers: {} });
    const place = new URL(answer.headers.get('location') ?? '', SITE);
    expect([answer.status, place.origin]).toEqual([303, new URL(SITE).origin]);
  });

  test('S05 S04 and refused when it comes from anywhere but our pages, or is no form', async () => {
    const before = await countFiles();
    const strange = [
      { origin: 'https://evil.example.test' },
      { origin: 'null' },
      { origin: '' },
      { 'sec-fetch-site': 'cross-site' },
      { 'sec-fetch-site': 'same-site' },
    ];
    for (const headers of strange) expect((await send(formOf(aPdf()), { headers })).status).toBe(403);
    for (const type of ['application/json', 'text/plain', 'application/x-www-form-urlencoded', 'multipart/form-data']) {
      expect((await send('{}', { headers: { ...JSON_TOO, 'content-type': type } })).status).toBe(415);
    }
    for (const body of ['', '--x', '--x\r\nX: y\r\n\r\n', '--x--']) {
      expect((await send(body, { headers: { ...JSON_TOO, 'content-type': 'multipart/form-data; boundary=x' } })).status).toBe(400);
    }
    expect(await countFiles()).toBe(before);
  });
});

describe('FILE-4 S47 a gigabyte', () => {
  const head = (rest: string): string =>
    `POST /api/files HTTP/1.1\r\nHost: ${new URL(SITE).host}\r\nOrigin: ${SITE}\r\nCookie: ${cookies.editor}\r\nAccept: application/json\r\nContent-Type: multipart/form-data; boundary=x\r\n${rest}\r\n\r\n`;
  const begin = (): string =>
    `--x\r\nContent-Disposition: form-data; name="key"\r\n\r\n${randomUUID()}\r\n--x\r\nContent-Disposition: form-data; name="file"; filename="a"\r\n\r\n`;
  const piece = Buffer.alloc(64 * 1024, 'x');
  const gigabyte = (wrap: (bytes: Buffer) => Buffer) => {
    let left = 16_384;
    return () => (left-- > 0 ? wrap(piece) : null);
  };
  const chunk = (bytes: Buffer): Buffer => Buffer.concat([Buffer.from(`${bytes.length.toString(16)}\r\n`), bytes, Buffer.from('\r\n')]);

  test.each([
    ['in pieces of which nobody knows how many', 411, 'Transfer-Encoding: chunked', chunk],
    ['that says what it is', 413, `Content-Length: ${String(1024 ** 3)}`, (bytes: Buffer) => bytes],
  ] as const)('%s is refused before it is read (%i), and cut off', async (_, status, length, wrap) => {
    const opening = (): string => head(length) + wrap(Buffer.from(begin())).toString();
    expect((await speak(opening())).said.slice(0, 12)).toBe(`HTTP/1.1 ${String(status)}`);
    const { said, sent } = await speak(opening(), gigabyte(wrap));
    console.info(`S47 ${length}: cut off when ${String(Math.round(sent / 1024))} kB had left the sender`);
    // Some of it was only handed to the machine's own buffers. Who goes on sending into a closed line may not get to read the answer.
    expect([['', `HTTP/1.1 ${String(status)}`].includes(said.slice(0, 12)), sent < LARGEST]).toEqual([true, true]);
    expect(incoming()).toEqual([]);
  });

  test('cut short by the sender leaves nothing', async () => {
    const before = await countFiles();
    let left = 20;
    const { hostname, port } = new URL(SITE);
    await new Promise<void>((resolve) => {
      const socket = connect(Number(port), hostname, () => {
        socket.write(head('Content-Length: 10000000') + begin());
        while (left-- > 0) socket.write(piece);
        socket.end(() => socket.destroy());
      });
      socket.once('close', () => {
        resolve();
      });
    });
    await expect.poll(incoming).toEqual([]);
    expect(await countFiles()).toBe(before);
  });
});

describe('S44 in a browser', () => {
  test('what is a PDF and a page is saved and never opened, and words are no script', async () => {
    const [both, words] = [await keep(aPdfWithPage()), await keep(Buffer.from('document.title = "ran";'), { fileName: 'a.js' })];
    const context = await visitAs(browser, people.editor);
    const page = await context.newPage();
    await page.goto('/bench');
    const saved = page.waitForEvent('download');
    await page.goto(`/api/files/${both.id}`).catch(() => null); // a download is no page to go to
    expect((await saved).suggestedFilename()).toBe('page.pdf');
    const end = await page.evaluate(
      (src) =>
        new Promise((resolve) => {
          const script = Object.assign(document.createElement('script'), {
            src,
            onload: () => {
              resolve('ran');
            },
            onerror: () => {
              resolve('refused');
            },
          });
          document.body.append(script);
        }),
      `/api/files/${words.id}`,
    );
    expect([end, await page.title()]).toEqual(['refused', expect.not.stringContaining('ran')]);
    await context.close();
  });

  test.each([
    ['a picture that is a page too', 'file', aPictureWithPage],
    ['a file of 16 MB', 'refused', () => Promise.resolve(Buffer.alloc(16 * 1024 * 1024))],
  ] as const)('%s: the form of a page ends at that page, which says "%s" in its address', async (_, told, make) => {
    const photo = join(mkdtempSync(join(tmpdir(), 'footring-photo-')), 'photo.jpg');
    writeFileSync(photo, await make());
    const context = await visitAs(browser, people.editor);
    const page = await context.newPage();
    await page.goto('/bench');
    await page.evaluate((key) => {
      const form = document.createElement('form');
      Object.assign(form, { method: 'post', action: '/api/files', enctype: 'multipart/form-data', id: 'sending' });
      for (const [name, value] of [['key', key] as const, ['back', '/bench'] as const])
        form.append(Object.assign(document.createElement('input'), { type: 'hidden', name, value }));
      form.append(Object.assign(document.createElement('input'), { type: 'file', name: 'file' }));
      document.body.append(form);
    }, randomUUID());
    await page.setInputFiles('#sending input[type=file]', photo);
    await page.evaluate(() => {
      (document.querySelector('#sending') as HTMLFormElement).submit();
    });
    await page.waitForURL((url) => url.pathname === '/bench' && url.searchParams.has(told));
    await context.close();
    rmSync(dirname(photo), { recursive: true });
  });
});

test('FILE-5 S43 no way of writing an address of a file leads out of the store, and none breaks', async () => {
  const ways = [
    '../../../etc/passwd',
    '..%2f..%2f..%2fetc%2fpasswd',
    '%2e%2e/%2e%2e/etc/passwd',
    '..\\..\\etc\\passwd',
    '%00',
    'a%00.pdf',
    '/etc/passwd',
    'file:///etc/passwd',
    'x'.repeat(300),
  ];
  for (const way of ways) {
    const { said } = await speak(
      `GET /api/files/${way} HTTP/1.1\r\nHost: ${new URL(SITE).host}\r\nCookie: ${cookies.moderator}\r\nConnection: close\r\n\r\n`,
    );
    expect([way, Number(said.slice(9, 12)) < 500, said.includes('root:')]).toEqual([way, true, false]);
  }
});

describe('FILE-14 S42 the site fetches nothing for anybody', () => {
  test('no picture by the address that would make it smaller, and no line handed on', async () => {
    let hits = 0;
    const trap = createServer((_, answer) => {
      hits += 1;
      answer.end('x');
    });
    await new Promise<void>((resolve) =>
      trap.listen(0, () => {
        resolve();
      }),
    );
    const port = String((trap.address() as AddressInfo).port);
    const hosts = ['127.0.0.1', '[::1]', '0x7f000001', '2130706433', 'localhost', '127.1', '0.0.0.0'];
    const urls = [
      ...hosts.map((host) => `http://${host}:${port}/a.png`),
      `//127.0.0.1:${port}/a.png`,
      '/api/health',
      '/icon.svg',
      '/api/files/x',
      `${SITE}/icon.svg`,
    ];
    for (const url of urls) {
      const answer = await fetch(`${SITE}/_next/image?url=${encodeURIComponent(url)}&w=640&q=75`, { redirect: 'manual' });
      expect([url, [400, 404].includes(answer.status)]).toEqual([url, true]);
      await answer.text();
    }
    for (const place of [`http://127.0.0.1:${port}/`, `//127.0.0.1:${port}/`, '/']) {
      const { said } = await speak(
        `GET ${place} HTTP/1.1\r\nHost: 127.0.0.1:${port}\r\nConnection: Upgrade\r\nUpgrade: websocket\r\nSec-WebSocket-Version: 13\r\nSec-WebSocket-Key: dGhlIHNhbXBsZSBub25jZQ==\r\n\r\n`,
      );
      expect([place, said.startsWith('HTTP/1.1 101')]).toEqual([place, false]);
    }
    expect(hits).toBe(0);
    await new Promise((resolve) => trap.close(resolve));
  });
});

describe('FILE-10 F07 a site whose store of objects', () => {
  let server: ObjectServer;
  beforeAll(async () => {
    server = await startObjectServer();
  });
  afterAll(() => server.end());

  test('is well, broken, breaks off, never answers: files are kept or refused with 503 within ten seconds, and pages are read', async () => {
    const { endpoint, bucket, key, secret } = server.settings;
    further = await startSiteProcess({
      FOOTRING_S3_ENDPOINT: endpoint ?? '',
      FOOTRING_S3_BUCKET: bucket,
      FOOTRING_S3_KEY: key,
      FOOTRING_S3_SECRET: secret,
    });
    const { address: site } = further;
    const kept = await send(formOf(aPdf()), { site });
    expect([kept.status, server.objects.size]).toEqual([201, 1]);
    for (const mood of ['broken', 'cut', 'lying', 'down'] as const) {
      server.feel(mood);
      const began = Date.now();
      const answer = await send(formOf(aPdf()), { site });
      const tookMs = Date.now() - began;
      expect([mood, answer.status, answer.headers.get('retry-after'), tookMs < 10_000]).toEqual([mood, 503, '60', true]);
      console.info(`F07 ${mood}: 503 after ${String(tookMs)} ms`);
      const page = await fetch(`${site}/regions`);
      expect(page.status).toBe(200);
      await page.text();
    }
    const health = await fetch(`${site}/api/health`);
    expect([health.status, await health.json()]).toEqual([200, expect.objectContaining({ status: 'ok', store: 'down' })]);
    expect(
      (await db('files').where({ state: 'ready' }).pluck('store_key')).filter((name) => server.objects.has(`/potshop/${String(name)}`)),
    ).toHaveLength(1);
  });
});

describe('FILE-10 F08 a site whose store is on a disk of 50 MB', () => {
  const volume = mkdtempSync(join(tmpdir(), 'footring-small-'));
  let isMounted = false;
  beforeAll(() => {
    isMounted = spawnSync('mount', ['-t', 'tmpfs', '-o', 'size=50m', 'tmpfs', volume]).status === 0;
    if (!isMounted) console.warn('F08 was not tried: this user may not mount a small disk.');
  });
  afterAll(() => {
    if (isMounted) spawnSync('umount', [volume]);
    rmSync(volume, { recursive: true, force: true });
  });

  test('refuses with 507 when it is full, leaves no half, is read all the while, and works again once there is room', async ({ skip }) => {
    skip(!isMounted, 'no small disk');
    further = await startSiteProcess({ FOOTRING_STORE_DIR: volume });
    const { address: site } = further;
    const cookie = await cookieOf(await aPerson('editor'));
    const large = (): FormData => formOf(Buffer.concat([aPdf(), Buffer.alloc(14_000_000)]));
    const first = keptFile.parse(await (await send(large(), { site, cookie })).json()).file;
    let status = 201;
    let count = 1;
    for (; status === 201; count += 1) status = (await send(large(), { site, cookie })).status;
    expect(status).toBe(507);
    const wholeOnes = readdirSync(join(volume, 'objects'), { recursive: true, encoding: 'utf8' }).filter((name) =>
      statSync(join(volume, 'objects', name)).isFile(),
    );
    expect([wholeOnes.length, incoming(volume)]).toEqual([count - 1, []]);
    const read = await fetch(`${site}/api/files/${first.id}`, { headers: { cookie } });
    expect([read.status, (await read.arrayBuffer()).byteLength]).toEqual([200, first.bytes]);
    const page = await fetch(`${site}/regions`);
    expect(page.status).toBe(200);
    await page.text();
    for (const name of wholeOnes.slice(1)) rmSync(join(volume, 'objects', name));
    await db('files')
      .where({ owner_id: await ownerOf(first.id) })
      .whereNot({ id: first.id })
      .del();
    expect((await send(large(), { site, cookie })).status).toBe(201);
  });

  const ownerOf = async (id: string): Promise<string> => z.tuple([z.string()]).parse(await db('files').where({ id }).pluck('owner_id'))[0];
});
