import knex, { type Knex } from 'knex';
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import { z } from 'zod';
import { db } from '@/db/connection';
import { listDayBook, writeDayBook } from '@/db/day-book';
import { connectionTo, knexSettings } from '@/db/knex-settings';
import { inTransaction } from '@/db/transaction';
import { err, ok } from '@/lib/kernel/result';
import { verifyDayBook } from '@/lib/day-book/verify-day-book';
import { change } from '@/lib/server/change';
import { newId } from '@/lib/server/new-id';

const NOW = new Date('2026-12-01T10:00:00.123Z');
const ctx = { db, now: NOW };
const STEWARD = newId(NOW);

/** What only somebody with the owner's account can do. */
let owner: Knex;
beforeAll(() => {
  owner = knex({ ...knexSettings({ most: 1 }), connection: connectionTo(z.string().parse(process.env['DATABASE_OWNER_URL'])) });
});
afterAll(async () => {
  await owner.destroy();
});

const write = (did: string, reason: string | null = null, details = {}, at = NOW) =>
  inTransaction(db, async (trx) => {
    await writeDayBook(trx, { actorId: STEWARD, did, subject: { kind: 'account', id: 'a1' }, reason, details, at });
    return ok(null);
  });

beforeEach(async () => {
  await owner('day_book').del();
  await owner('day_book_ends').del();
  for (const did of ['role.grant', 'role.take', 'account.close']) await write(did, `because of ${did}`, { role: 'editor' });
});

test('DAY-1 lines are numbered without a gap and come back as they were written, newest first', async () => {
  const [newest, ...rest] = await listDayBook(db, { limit: 100 });
  expect(newest).toMatchObject({
    number: 3,
    at: NOW,
    actorId: STEWARD,
    did: 'account.close',
    subject: { kind: 'account', id: 'a1' },
    reason: 'because of account.close',
    details: { role: 'editor' },
  });
  expect(rest.map(({ number }) => number)).toEqual([2, 1]);
  expect(await verifyDayBook(ctx)).toEqual(ok({ lines: 3 }));
});

test('DAY-1 a book without a line holds', async () => {
  await owner('day_book').del();
  await owner('day_book_ends').del();
  expect(await verifyDayBook(ctx)).toEqual(ok({ lines: 0 }));
});

test('DAY-2 S31 the application can neither change nor remove a line', async () => {
  await expect(db('day_book').where({ number: 1 }).update({ reason: 'other' })).rejects.toMatchObject({ errno: 1142 });
  await expect(db('day_book').del()).rejects.toMatchObject({ errno: 1142 });
});

test.each([
  ['its reason', { reason: 'other' }],
  ['its details', { details: '{"role":"steward"}' }],
  ['its time', { at: new Date('2026-11-30T00:00:00Z') }],
  ['who did it', { actor_id: null }],
  ['what was done', { did: 'role.take2' }],
  ['to whom', { subject_id: 'a2' }],
])('DAY-3 a line of which somebody changed %s is named', async (_, changed) => {
  await owner('day_book').where({ number: 2 }).update(changed);
  expect(await verifyDayBook(ctx)).toEqual(err({ number: 2, why: 'changed' }));
});

test('DAY-3 a line that was taken out, one that was put in its place, and an end that was cut off are named', async () => {
  await owner('day_book').where({ number: 2 }).del();
  expect(await verifyDayBook(ctx)).toEqual(err({ number: 2, why: 'missing' }));
  await owner('day_book').where({ number: 3 }).update({ number: 2 });
  expect(await verifyDayBook(ctx)).toEqual(err({ number: 2, why: 'not-bound' }));
  await owner('day_book').where('number', '>', 1).del();
  expect(await verifyDayBook(ctx)).toEqual(err({ number: 2, why: 'cut-off' }));
});

test('DAY-3 the break is found on whichever page of a long book it stands', async () => {
  for (let line = 0; line < 520; line += 1) await write('tests.long');
  expect(await verifyDayBook(ctx)).toEqual(ok({ lines: 523 }));
  await owner('day_book').where({ number: 501 }).update({ did: 'tests.other' });
  expect(await verifyDayBook(ctx)).toEqual(err({ number: 501, why: 'changed' }));
}, 60_000);

test('DAY-4 forty acts at once give forty lines of one chain', async () => {
  const act = (n: number) =>
    change(ctx, { key: newId(NOW), who: STEWARD, act: 'tests.act', input: n }, async (trx) => {
      await trx('limits').select('points').first(); // an earlier read, as use cases have
      await writeDayBook(trx, {
        actorId: STEWARD,
        did: 'tests.act',
        subject: { kind: 'n', id: String(n) },
        reason: null,
        details: {},
        at: NOW,
      });
      return ok(null);
    });
  const acts = await Promise.allSettled(Array.from({ length: 40 }, (_, n) => act(n)));
  const done = acts.filter(({ status }) => status === 'fulfilled').length;
  expect(done).toBeGreaterThan(0);
  expect(await verifyDayBook(ctx)).toEqual(ok({ lines: 3 + done }));
});

test('DAY-5 a line is only there when its act was carried out', async () => {
  await inTransaction(db, async (trx) => {
    await writeDayBook(trx, {
      actorId: STEWARD,
      did: 'role.grant',
      subject: { kind: 'account', id: 'a1' },
      reason: null,
      details: {},
      at: NOW,
    });
    return err({ kind: 'refused' });
  });
  expect(await verifyDayBook(ctx)).toEqual(ok({ lines: 3 }));
});

test('DAY-6 lines are found by act, subject, person and time, a page at a time', async () => {
  await write('role.grant', null, {}, new Date('2026-12-02T00:00:00Z'));
  const numbers = async (filter: object) => (await listDayBook(db, { limit: 100, ...filter })).map(({ number }) => number);
  expect(await numbers({ did: ['role.grant', 'account.close'] })).toEqual([4, 3, 1]);
  expect(await numbers({ from: new Date('2026-12-01T00:00:00Z'), until: new Date('2026-12-02T00:00:00Z') })).toEqual([3, 2, 1]);
  expect(await numbers({ subject: { kind: 'account', id: 'a2' } })).toEqual([]);
  expect(await numbers({ actorId: STEWARD, limit: 2 })).toEqual([4, 3]);
  expect(await numbers({ before: 3, limit: 2 })).toEqual([2, 1]);
});

test('DAY-7 what cannot be stored as it was typed does not break the chain', async () => {
  await write('tests.odd', 'half \ud83c of a pot, 🏺, \u0000, \r\n', { odd: '\ud83c', deep: { b: [1, 0.1, null], a: '🏺' } });
  expect(await verifyDayBook(ctx)).toEqual(ok({ lines: 4 }));
});
