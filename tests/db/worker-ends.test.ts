import { afterEach, beforeEach, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { enqueueMail, listMails } from '@/db/outbox';
import { inTransaction } from '@/db/transaction';
import { ok } from '@/lib/kernel/result';
import { openMailServer, type MailServer } from '../builders/mail-server';
import { startWorkerProcess, type WorkerProcess } from '../builders/worker-process';

const NOW = new Date('2026-12-01T10:00:00Z');
let server: MailServer;
let worker: WorkerProcess | undefined;

beforeEach(async () => {
  await db('outbox').del();
});
afterEach(async () => {
  worker?.child.kill('SIGKILL');
  await server.close();
});

const enqueue = (count: number) =>
  inTransaction(db, async (trx) => {
    for (let n = 0; n < count; n += 1) {
      const mail = { subject: 's', text: 't', html: 'h' };
      await enqueueMail(trx, { accountId: null, address: `maker${String(n)}@example.test`, mail, kind: 'tests', at: NOW });
    }
    return ok(null);
  });

test('SRV-7 F14 a worker that is told to end while mails are on their way finishes those, begins no other, and leaves with 0', async () => {
  let onTheWay = 0;
  let letGo = (): void => undefined;
  const held = new Promise<null>((resolve) => {
    letGo = () => {
      resolve(null);
    };
  });
  let arrived = (): void => undefined;
  const first = new Promise<void>((resolve) => (arrived = resolve));
  server = await openMailServer({
    onMail: () => {
      onTheWay += 1;
      arrived();
      return held;
    },
  });
  await enqueue(40);
  worker = startWorkerProcess(server.url);
  await first;
  const told = Date.now();
  worker.child.kill('SIGTERM');
  setTimeout(letGo, 500);
  expect(await worker.ended).toBe(0);
  expect(Date.now() - told).toBeLessThan(15_000);
  const sent = await listMails(db, ['sent'], { limit: 100 });
  expect(sent).toHaveLength(onTheWay);
  expect(sent.length).toBeLessThanOrEqual(4);
  expect(await listMails(db, ['sending'], { limit: 100 })).toEqual([]);
  expect(await listMails(db, ['waiting'], { limit: 100 })).toHaveLength(40 - onTheWay);
}, 60_000);

test('SRV-17 a worker without a secret does not start in production', async () => {
  server = await openMailServer();
  const secret = process.env['FOOTRING_SECRET'];
  process.env['FOOTRING_SECRET'] = '';
  worker = startWorkerProcess(server.url);
  process.env['FOOTRING_SECRET'] = secret;
  expect(await worker.ended).toBe(1);
}, 60_000);
