import { spawn, type ChildProcess } from 'node:child_process';
import { mkdtempSync, readdirSync, rmSync, statSync } from 'node:fs';
import { request } from 'node:http';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { createInterface } from 'node:readline';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { z } from 'zod';
import { makeMailer } from '@/lib/server/mailer';
import { linkIn, mailsTo, nextMail } from '../../builders/mailbox';

const folder = mkdtempSync(path.join(tmpdir(), 'footring-mail-'));
let standIn: ChildProcess;
let http = 0;
let smtp = 0;

beforeAll(async () => {
  const child = spawn(process.execPath, ['scripts/mail-stand-in.mjs', folder], { stdio: ['ignore', 'pipe', 'inherit'] });
  standIn = child;
  for await (const line of createInterface(child.stdout)) {
    ({ smtp, http } = z.object({ smtp: z.number(), http: z.number() }).parse(JSON.parse(line)));
    break;
  }
  process.env['FOOTRING_MAILBOX'] = `http://localhost:${String(http)}`;
});
afterAll(() => {
  standIn.kill('SIGKILL');
  rmSync(folder, { recursive: true });
  delete process.env['FOOTRING_MAILBOX'];
});

const send = (address: string, subject: string, text: string) =>
  makeMailer({ url: `smtp://127.0.0.1:${String(smtp)}`, from: 'footring@footring.example.test' }).send({
    id: '1',
    kind: 'tests',
    address,
    subject,
    text,
    html: '<p>Hello</p>',
    leaveUrl: null,
    messageId: '<1@footring.example.test>',
    tries: 1,
  });

const get = (place: string, host: string) =>
  new Promise<{ status: number; headers: NodeJS.Dict<string | string[]>; body: string }>((resolve, reject) => {
    request({ port: http, host: '127.0.0.1', path: place, headers: { host } }, (answer) => {
      const chunks: Buffer[] = [];
      answer.on('data', (chunk: Buffer) => chunks.push(chunk));
      answer.on('end', () => {
        resolve({ status: answer.statusCode ?? 0, headers: answer.headers, body: Buffer.concat(chunks).toString() });
      });
    })
      .on('error', reject)
      .end();
  });

test('the stand-in takes a mail by SMTP and shows it as it was written, whatever is in it', async () => {
  const text = `Hello Mëra 🏺,\n\n${'a long line '.repeat(40)}\n.\n=3D\n\nhttp://footring.example.test/reset/${'x'.repeat(90)}?a=1&b=2\n`;
  expect(await send('mira@example.test', 'Clay – Ton 🏺', text)).toMatchObject({ kind: 'taken' });
  const letter = await nextMail('mira@example.test');
  expect(letter.subject).toBe('Clay – Ton 🏺');
  expect(letter.text.trim()).toBe(text.trim());
  expect(letter.envelope.to).toEqual(['mira@example.test']);
  expect(linkIn(letter)).toBe(`/reset/${'x'.repeat(90)}?a=1&b=2`);
});

test('one can wait for a mail that has not come yet, and for the one after it', async () => {
  const waiting = nextMail('jon@example.test', { about: 'second' });
  await send('jon@example.test', 'first', 'one');
  await send('jon@example.test', 'second', 'two');
  expect((await waiting).text.trim()).toBe('two');
  expect((await mailsTo('jon@example.test')).map(({ subject }) => subject)).toEqual(['first', 'second']);
  const [first] = await mailsTo('jon@example.test');
  if (first === undefined) throw new Error('no mail');
  expect((await nextMail('jon@example.test', { after: first })).subject).toBe('second');
});

test('its pages run nothing: text is escaped, links can be pressed, no name but this machine’s is answered', async () => {
  await send('ana@example.test', '<script>alert(1)</script>', '<img src=x onerror=alert(1)> http://footring.example.test/a"onx="1');
  const { name } = await nextMail('ana@example.test');
  const list = await get('/', `localhost:${String(http)}`);
  expect(list.headers['content-security-policy']).toContain("default-src 'none'");
  expect(list.body).toContain('&lt;script&gt;alert(1)&lt;/script&gt;');
  const shown = await get(`/mail/${name}`, `127.0.0.1:${String(http)}`);
  expect(shown.body).toContain('&lt;img src=x');
  expect(shown.body).toContain('<a href="http://footring.example.test/a');
  expect(shown.body).not.toMatch(/<script|<img|onx="/);
  expect((await get('/', 'evil.example.test')).status).toBe(421);
  for (const place of ['/mail/../../../etc/passwd', '/mail/%2e%2e%2fpackage.json', '/mail/', '/x']) {
    expect((await get(place, 'localhost')).status, place).toBe(404);
  }
});

test('mails are files that only their owner can read', () => {
  const modes = readdirSync(folder).map((name) => statSync(path.join(folder, name)).mode & 0o077);
  expect(new Set(modes)).toEqual(new Set([0]));
});
