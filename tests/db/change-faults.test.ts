import { randomUUID } from 'node:crypto';
import { afterAll, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { writeDayBook } from '@/db/day-book';
import { enqueueMail } from '@/db/outbox';
import type { Trx } from '@/db/transaction';
import { ok, type Result } from '@/lib/kernel/result';
import { change } from '@/lib/server/change';
import { FAULTS, openFaultyPool, type Fault, type FaultyPool } from './faulty';

const NOW = new Date('2026-12-01T10:00:00Z');
const pools: FaultyPool[] = [];
const openPool = (): FaultyPool => {
  const pool = openFaultyPool();
  pools.push(pool);
  return pool;
};
afterAll(async () => {
  for (const { db: own } of pools) await own.destroy();
});

/** Counts under a name, writes a mail and a line of the day book: all that must be true together. */
const counting =
  (name: string) =>
  async (trx: Trx): Promise<Result<{ readonly points: number }, never>> => {
    await trx('limits').where({ key: name }).forUpdate().select('points');
    await trx('limits').where({ key: name }).increment('points', 1);
    const mail = { subject: 's', text: 't', html: 'h' };
    await enqueueMail(trx, { accountId: null, address: name, mail, kind: 'tests', at: NOW });
    await writeDayBook(trx, { actorId: null, did: 'tests.count', subject: { kind: 'n', id: name }, reason: null, details: {}, at: NOW });
    return ok({ points: 1 });
  };

async function state(name: string) {
  const rows = async (table: string, where: object) => (await db(table).where(where).select('*')).length;
  const points: unknown = await db('limits').where({ key: name }).pluck('points');
  return {
    points: Number(String(points)),
    keys: await rows('request_keys', { id: name }),
    mails: await rows('outbox', { address: name }),
    lines: await rows('day_book', { subject_id: name }),
  };
}
const BEFORE = { points: 0, keys: 0, mails: 0, lines: 0 };
const AFTER = { points: 1, keys: 1, mails: 1, lines: 1 };

/** Sends the form of that name. */
const send = (pool: FaultyPool, name: string) =>
  change({ db: pool.db, now: NOW }, { key: name, who: 'guest', act: 'tests.count', input: null }, counting(name));

async function freshName(): Promise<string> {
  const name = randomUUID();
  await db('limits').insert({ key: name, points: 0 });
  return name;
}

async function statementsOfAChange(pool: FaultyPool): Promise<number> {
  pool.plan('rolled-back', () => false);
  await send(pool, await freshName());
  return pool.seen();
}

test.each(FAULTS)(
  'SRV-4 OUT-9 F03 one statement of a change is %s, whichever it is: the change is carried out once',
  async (fault) => {
    const pool = openPool();
    const statements = await statementsOfAChange(pool);
    expect(statements).toBeGreaterThanOrEqual(10); // BEGIN, key, three of the work and three of the day book, answer, COMMIT
    for (let failing = 1; failing <= statements; failing += 1) {
      const name = await freshName();
      pool.plan(fault, (statement) => statement === failing);
      expect(await send(pool, name), `statement ${String(failing)}`).toEqual(ok({ points: 1 }));
      expect(await state(name), `statement ${String(failing)}`).toEqual(AFTER);
    }
  },
  60_000,
);

async function failFrom(fault: Fault, fromEnd: number): Promise<void> {
  const pool = openPool();
  const failing = (await statementsOfAChange(pool)) - fromEnd;
  const name = await freshName();
  pool.plan(fault, (statement) => statement >= failing);
  const said = `${fault} from statement ${String(failing)} on`;
  await expect(send(pool, name), said).rejects.toMatchObject({ name: 'Unavailable' });
  expect([BEFORE, AFTER], said).toContainEqual(await state(name));
  pool.plan(fault, () => false);
  expect(await send(pool, name), said).toEqual(ok({ points: 1 }));
  expect(await state(name), said).toEqual(AFTER);
}

test('SRV-4 F03 when all fails from one statement on, nobody hears yes to what did not happen, and the key tells later', async () => {
  await Promise.all(FAULTS.flatMap((fault) => [0, 1, 5].map((fromEnd) => failFrom(fault, fromEnd))));
}, 60_000);
