import { setTimeout as wait } from 'node:timers/promises';
import { beforeEach, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { countMails, enqueueMail } from '@/db/outbox';
import { inTransaction } from '@/db/transaction';
import { ok } from '@/lib/kernel/result';
import { MAILS_AT_ONCE } from '@/lib/server/work/send-mails';
import { openMailServer, type Received } from '../builders/mail-server';
import { startWorkerProcess } from '../builders/worker-process';

const NOW = new Date('2026-12-01T10:00:00Z');
const MAILS = 500;
/** After so many mails more the worker is killed. */
const KILL_AFTER = [40, 110, 37, 90, 61];

beforeEach(async () => {
  await db('outbox').del();
});

async function enqueue(count: number): Promise<void> {
  await inTransaction(db, async (trx) => {
    for (let n = 0; n < count; n += 1) {
      const mail = { subject: 's', text: `mail ${String(n)}`, html: 'h' };
      await enqueueMail(trx, { accountId: null, address: `maker${String(n)}@example.test`, mail, kind: 'tests', at: NOW });
    }
    return ok(null);
  });
}

/** A claim of a worker that is gone would hold for a minute and a half: the test does not wait for that. */
const endClaims = () =>
  db('outbox')
    .where({ state: 'sending' })
    .update({ claimed_until: db.raw('UTC_TIMESTAMP(3)') });

const idsByAddress = (received: readonly Received[]): ReadonlyMap<string, readonly string[]> => {
  const found = new Map<string, string[]>();
  for (const { to, messageId } of received) found.set(to[0] ?? '', [...(found.get(to[0] ?? '') ?? []), messageId]);
  return found;
};

test('OUT-4 F05 five hundred mails while the worker is killed five times: none lost, few twice, those under the same Message-ID', async () => {
  const server = await openMailServer();
  await enqueue(MAILS);
  for (const more of KILL_AFTER) {
    const worker = startWorkerProcess(server.url);
    await server.until(server.received.length + more);
    worker.child.kill('SIGKILL');
    await worker.ended;
    await endClaims();
  }
  const last = startWorkerProcess(server.url);
  while ((await countMails(db)).get('sent') !== MAILS) await wait(100); // what arrived last is noted a little later
  last.child.kill('SIGTERM');
  expect(await last.ended).toBe(0);
  const arrived = idsByAddress(server.received);
  const twice = server.received.length - MAILS;
  console.log(`${String(MAILS)} mails, ${String(KILL_AFTER.length)} kills, ${String(twice)} arrived twice`);
  expect(arrived.size).toBe(MAILS);
  expect(twice).toBeLessThanOrEqual(KILL_AFTER.length * MAILS_AT_ONCE);
  for (const [address, ids] of arrived) expect(new Set(ids).size, address).toBe(1);
  await server.close();
}, 300_000);
