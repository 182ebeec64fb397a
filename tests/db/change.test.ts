import { randomUUID } from 'node:crypto';
import { beforeAll, beforeEach, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { writeDayBook } from '@/db/day-book';
import { enqueueMail } from '@/db/outbox';
import type { Trx } from '@/db/transaction';
import { err, ok, type Result } from '@/lib/kernel/result';
import { change, type ChangeRequest } from '@/lib/server/change';
import type { Ctx } from '@/lib/server/ctx';

const ctx: Ctx = { db, now: new Date('2026-12-01T10:00:00Z') };
const request = (over: Partial<ChangeRequest> = {}): ChangeRequest => ({
  key: randomUUID(),
  who: 'guest-1',
  act: 'tests.count',
  input: { by: 1 },
  ...over,
});

/** A use case of the usual shape: reads what decides, changes it, writes the day book and a mail. */
async function count(trx: Trx): Promise<Result<{ readonly points: number }, { kind: 'full' }>> {
  await trx('limits').insert({ key: 'tests', points: 0 }).onConflict('key').ignore();
  const row = await trx<{ key: string; points: number }>('limits').where({ key: 'tests' }).forUpdate().first();
  const points = (row?.points ?? 0) + 1;
  if (points > 1000) return err({ kind: 'full' });
  await trx('limits').where({ key: 'tests' }).update({ points });
  const at = ctx.now;
  await enqueueMail(trx, {
    accountId: null,
    address: 'mira@example.test',
    kind: 'tests',
    mail: { subject: 's', text: 't', html: 'h' },
    at,
  });
  await writeDayBook(trx, { actorId: null, did: 'tests.count', subject: { kind: 'count', id: 'tests' }, reason: null, details: {}, at });
  return ok({ points });
}

async function state() {
  const [points = 0] = await db<{ key: string; points: number }>('limits').where({ key: 'tests' }).pluck('points');
  const rows = async (table: string) => (await db(table).select('*')).length;
  return { points, keys: await rows('request_keys'), mails: await rows('outbox'), acts: await rows('day_book') };
}

let actsBefore = 0;
beforeEach(async () => {
  await db('limits').del();
  await db('request_keys').del();
  await db('outbox').del();
  actsBefore = (await db('day_book').select('number')).length;
});
beforeAll(async () => {
  await change(ctx, request(), count); // the first act ever makes the row that lines up the others
});

test('SRV-1 F09 fifty at once with one key are one change, and all hear the same answer', async () => {
  const one = request();
  const answers = await Promise.all(Array.from({ length: 50 }, () => change(ctx, one, count)));
  expect(answers).toEqual(Array.from({ length: 50 }, () => ok({ points: 1 })));
  expect(await state()).toEqual({ points: 1, keys: 1, mails: 1, acts: actsBefore + 1 });
});

test('SRV-1 F09 fifty at once with a key each are fifty changes, once those told to come back have come back', async () => {
  const requests = Array.from({ length: 50 }, () => request());
  const answers = await Promise.allSettled(requests.map((one) => change(ctx, one, count)));
  // Whoever was told to come back may have been served all the same: the key knows, and nobody is served twice.
  for (const [place, answer] of answers.entries()) {
    if (answer.status === 'fulfilled') expect(answer.value.ok).toBe(true);
    else expect(answer.reason).toMatchObject({ name: 'Unavailable' });
    const again = requests[place];
    if (again !== undefined) expect((await change(ctx, again, count)).ok).toBe(true);
  }
  expect(await state()).toEqual({ points: 50, keys: 50, mails: 50, acts: actsBefore + 50 });
});

test('SRV-2 the same key with another person, act or input is refused and changes nothing', async () => {
  const one = request();
  await change(ctx, one, count);
  for (const other of [{ who: 'guest-2' }, { act: 'tests.other' }, { input: { by: 2 } }]) {
    expect(await change(ctx, { ...one, ...other }, count)).toEqual(err({ kind: 'key-reused' }));
  }
  expect(await state()).toMatchObject({ points: 1, keys: 1, mails: 1 });
});

test('SRV-3 a refusal leaves nothing behind, its key too, and the same form may be sent again', async () => {
  await db('limits').insert({ key: 'tests', points: 1000 });
  const one = request();
  expect(await change(ctx, one, count)).toEqual(err({ kind: 'full' }));
  expect(await state()).toEqual({ points: 1000, keys: 0, mails: 0, acts: actsBefore });
  await db('limits').where({ key: 'tests' }).update({ points: 7 });
  expect(await change(ctx, one, count)).toEqual(ok({ points: 8 }));
});

test('SRV-3 a throw leaves nothing behind and reaches the caller', async () => {
  const broken = async (trx: Trx): Promise<Result<null, never>> => {
    await count(trx);
    throw new Error('slip');
  };
  await expect(change(ctx, request(), broken)).rejects.toThrow('slip');
  expect(await state()).toEqual({ points: 0, keys: 0, mails: 0, acts: actsBefore });
});
