import { createServer, type Server, type Socket } from 'node:net';
import type { AddressInfo } from 'node:net';
import { setTimeout as wait } from 'node:timers/promises';
import { beforeEach, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { countMails, enqueueMail, listMails } from '@/db/outbox';
import { ok } from '@/lib/kernel/result';
import { change } from '@/lib/server/change';
import { makeMailer } from '@/lib/server/mailer';
import { newId } from '@/lib/server/new-id';
import { sendDueMails } from '@/lib/server/work/send-mails';
import { openMailServer } from '../builders/mail-server';
import { startWorkerProcess } from '../builders/worker-process';

const NOW = new Date('2026-12-01T10:00:00Z');
const FROM = 'footring@footring.example.test';
const mail = { subject: 's', text: 't', html: 'h' };

beforeEach(async () => {
  await db('outbox').del();
});

const enqueue = (address: string) =>
  change({ db, now: NOW }, { key: newId(NOW), who: 'guest', act: 'tests.mail', input: null }, async (trx) => {
    await enqueueMail(trx, { accountId: null, address, mail, kind: 'tests', at: NOW });
    return ok(null);
  });

/** A server that does what it likes with each connection. */
async function openOddServer(behave: (socket: Socket) => void): Promise<{ readonly url: string; readonly close: () => void }> {
  const sockets = new Set<Socket>();
  const server: Server = createServer((socket) => {
    sockets.add(socket.on('error', () => undefined));
    behave(socket);
  });
  await new Promise<void>((resolve) => {
    server.listen(0, '127.0.0.1', () => {
      resolve();
    });
  });
  const { port } = server.address() as AddressInfo;
  const close = (): void => {
    for (const socket of sockets) socket.destroy();
    server.close();
  };
  return { url: `smtp://127.0.0.1:${String(port)}`, close };
}

const ODD: Readonly<Record<string, (socket: Socket) => void>> = {
  'says nothing': () => undefined,
  'speaks TLS to those who do not': (socket) => void socket.write(Buffer.from([0x15, 3, 1, 0, 2, 2, 40])),
  'greets with 421': (socket) => void socket.end('421 busy\r\n'),
  'closes at once': (socket) => void socket.end(),
  'greets and leaves': (socket) => {
    socket.write('220 hello\r\n');
    socket.once('data', () => socket.end());
  },
  'greets a letter at a time': (socket) => {
    void (async () => {
      for (let n = 0; n < 60 && !socket.destroyed; n += 1) {
        socket.write('2');
        await wait(1000);
      }
    })();
  },
};

test.each(Object.keys(ODD))(
  'OUT-6 F06 a server that %s holds a mail no longer than half a minute and is not held against it',
  async (name) => {
    const server = await openOddServer(ODD[name] ?? (() => undefined));
    await enqueue('mira@example.test');
    const mailer = makeMailer({ url: server.url, from: FROM });
    const began = Date.now();
    const patience = { baseMs: 0, mostMs: 0 };
    const signal = new AbortController().signal;
    expect(await sendDueMails({ db, worker: newId(NOW), mailer, from: FROM, patience, signal })).toEqual({ tried: 1, away: true });
    expect(Date.now() - began).toBeLessThan(55_000);
    expect(await listMails(db, ['waiting'], { limit: 9 })).toMatchObject([{ tries: 0 }]);
    mailer.close();
    server.close();
  },
  90_000,
);

test('OUT-6 F04 a mail server that is away for a minute costs those who cause mail nothing, and no mail', async () => {
  const server = await openMailServer();
  const { port } = server;
  await server.close();
  const worker = startWorkerProcess(`smtp://127.0.0.1:${String(port)}`);
  await worker.begun;
  const times: number[] = [];
  for (let n = 0; n < 100; n += 1) {
    const began = performance.now();
    expect((await enqueue(`maker${String(n)}@example.test`)).ok).toBe(true);
    times.push(performance.now() - began);
  }
  await wait(60_000);
  const again = await openMailServer({ port });
  const returned = Date.now();
  await again.until(100);
  console.log(
    `95 of 100 within ${times.sort((a, b) => a - b)[94]?.toFixed(0) ?? ''} ms; all mail ${String(Date.now() - returned)} ms after the server was back`,
  );
  expect(Date.now() - returned).toBeLessThan(60_000);
  expect(new Set(again.received.map(({ to }) => to[0])).size).toBe(100);
  expect(again.received).toHaveLength(100);
  worker.child.kill('SIGTERM');
  expect(await worker.ended).toBe(0);
  expect((await countMails(db)).get('sent')).toBe(100);
  await again.close();
}, 180_000);
