import { randomUUID } from 'node:crypto';
import knex, { type Knex } from 'knex';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { z } from 'zod';
import { db } from '@/db/connection';
import { listDayBook, writeDayBook } from '@/db/day-book';
import { enqueueJob } from '@/db/jobs';
import { connectionTo, knexSettings } from '@/db/knex-settings';
import { enqueueMail } from '@/db/outbox';
import { inTransaction } from '@/db/transaction';
import type { AccountId } from '@/lib/access/domain/actor';
import { listAccounts } from '@/lib/accounts/list-accounts';
import { accountSearch } from '@/lib/accounts/steward-schema';
import { checkDayBook } from '@/lib/day-book/check-day-book';
import { readChainState } from '@/lib/day-book/read-chain-state';
import { readDayBook } from '@/lib/day-book/read-day-book';
import { dayBookQuery } from '@/lib/day-book/schema';
import { err, ok } from '@/lib/kernel/result';
import { readOutbox } from '@/lib/notices/read-outbox';
import { readServiceState } from '@/lib/notices/read-service-state';
import { retryParked } from '@/lib/notices/retry-parked';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { anAccount, NOW, someone } from '../builders/people';

let steward: { readonly id: AccountId; readonly ctx: ActorCtx };
let owner: Knex;

beforeAll(() => {
  owner = knex({ ...knexSettings({ most: 1 }), connection: connectionTo(z.string().parse(process.env['DATABASE_OWNER_URL'])) });
});
afterAll(async () => {
  await owner.destroy();
});
beforeEach(async () => {
  for (const table of ['role_requests', 'sessions', 'outbox', 'jobs', 'request_keys', 'accounts', 'day_book_checks']) await db(table).del();
  for (const table of ['day_book', 'day_book_ends']) await owner(table).del();
  steward = await someone('steward');
});

const write = (did: string, at = NOW) =>
  inTransaction(db, async (trx) => {
    const subject = { kind: 'account', id: steward.id };
    await writeDayBook(trx, { actorId: steward.id, did, subject, reason: null, details: {}, at });
    return ok(null);
  });

describe('ROL-11 a steward looks accounts up', () => {
  const find = async (query: Record<string, string>) => {
    const found = await listAccounts(steward.ctx, accountSearch.parse(query));
    return found.ok ? found.value : { accounts: [], next: null };
  };
  const names = async (query: Record<string, string>) => (await find(query)).accounts.map(({ name }) => name).toSorted();

  test('by a part of the name or the address, in any case, taken letter for letter', async () => {
    await anAccount({ name: 'Mira Veld', email: 'mira@example.test' });
    await anAccount({ name: '100% clay', email: 'clay_one@example.test' });
    await anAccount({ name: 'Ole', email: 'clayxone@example.test' });
    expect(await names({ q: 'VEL' })).toEqual(['Mira Veld']);
    expect(await names({ q: 'MIRA@' })).toEqual(['Mira Veld']);
    expect(await names({ q: '%' })).toEqual(['100% clay']);
    expect(await names({ q: 'y_o' })).toEqual(['100% clay']);
    expect(await names({ q: "' or 1=1 -- " })).toEqual([]);
    expect(await names({ q: '\\' })).toEqual([]);
  });

  test('by role, and never people who left', async () => {
    await anAccount({ role: 'editor', name: 'Edda' });
    const gone = await anAccount({ role: 'editor' });
    await db('accounts').where({ id: gone }).update({ email: null, name: '', state: 'gone' });
    expect(await names({ role: 'editor' })).toEqual(['Edda']);
    expect((await find({})).accounts.length).toBe(2);
  });

  test('fifty at a time, each once', async () => {
    for (let at = 0; at < 60; at += 1) await anAccount();
    const first = await find({});
    const second = await find({ after: first.next ?? '' });
    const seen = new Set([...first.accounts, ...second.accounts].map(({ id }) => id));
    expect([first.accounts.length, second.accounts.length, seen.size, second.next]).toEqual([50, 11, 61, null]);
  });

  test('what cannot be read asks for nothing', () => {
    expect(accountSearch.parse({ q: ['a', 'b'], role: 'king', after: "1' or '1" })).toEqual({ q: 'a', role: undefined, after: undefined });
  });
});

describe('ROL-9 what was given up is tried again', () => {
  const aMail = async (state: string): Promise<string> => {
    const mail = { subject: 's', text: 'secret text', html: 'h' };
    await inTransaction(db, async (trx) => {
      await enqueueMail(trx, { accountId: null, address: `${state}@example.test`, kind: 'tests', mail, at: NOW });
      return ok(null);
    });
    const [id] = z.array(z.string()).parse(
      await db('outbox')
        .where({ address: `${state}@example.test` })
        .pluck('id'),
    );
    await db('outbox').where({ id }).update({ state, tries: 8, ended_at: NOW });
    return id ?? '';
  };
  const press = (what: 'mail' | 'job', id: string, key: string = randomUUID()) => retryParked(steward.ctx, { key, what, id });

  test('a mail, once, with one line; pressed twice it is one try', async () => {
    const id = await aMail('parked');
    const key = randomUUID();
    expect(await Promise.all([press('mail', id, key), press('mail', id, key)])).toEqual([ok(null), ok(null)]);
    expect(await db('outbox').where({ id }).first()).toMatchObject({ state: 'waiting', tries: 0, ended_at: null });
    expect(await press('mail', id)).toEqual(err({ kind: 'not-parked' }));
    expect((await listDayBook(db, { limit: 10 })).map(({ did, subject }) => [did, subject])).toEqual([
      ['outbox.retry', { kind: 'mail', id }],
    ]);
  });

  test('nothing but what was given up', async () => {
    for (const state of ['waiting', 'sending', 'sent', 'bounced']) {
      expect([state, await press('mail', await aMail(state))]).toEqual([state, err({ kind: 'not-parked' })]);
    }
    expect(await press('mail', randomUUID())).toEqual(err({ kind: 'not-parked' }));
    expect(await listDayBook(db, { limit: 10 })).toEqual([]);
  });

  test('a job as well; the page tells how far it is and never what it is about', async () => {
    const id = await inTransaction(db, async (trx) =>
      ok(await enqueueJob(trx, { kind: 'tests', input: { secret: 1 }, accountId: null, at: NOW })),
    );
    await db('jobs').update({ state: 'parked', done_count: 2, total_count: 5, failure: 'Error' });
    await aMail('bounced');
    const seen = await readOutbox(steward.ctx, { part: 'bounced' });
    expect(seen).toMatchObject({ value: { counts: { bounced: 1 }, jobs: [{ kind: 'tests', state: 'parked', done: 2, total: 5 }] } });
    expect(JSON.stringify(seen)).not.toMatch(/secret/);
    expect(await press('job', id.value)).toEqual(ok(null));
    expect(await readServiceState(steward.ctx)).toMatchObject({ value: { jobs: { waiting: 1, parked: 0 }, mails: { bounced: 1 } } });
  });
});

describe('DAY-9 the page says how far the day book holds', () => {
  test('before anybody has read it all, after a worker has, and as lines are added', async () => {
    expect(await readChainState({ db, now: NOW })).toEqual({ lines: 0, written: 0, checkedAt: null, break: null });
    for (const did of ['role.grant', 'role.take', 'account.close']) await write(did);
    expect(await readChainState({ db, now: NOW })).toEqual({ lines: 3, written: 3, checkedAt: null, break: null });
    expect(await checkDayBook({ db, now: NOW })).toBe(0);
    await write('role.grant');
    expect(await readChainState({ db, now: NOW })).toEqual({ lines: 4, written: 4, checkedAt: NOW, break: null });
  });

  test('a line changed after a worker has read it is found by the next reading, one after that at once', async () => {
    for (const did of ['role.grant', 'role.take', 'account.close']) await write(did);
    await checkDayBook({ db, now: NOW });
    await write('account.reopen');
    await owner('day_book').where({ number: 4 }).update({ did: 'account.close' });
    expect(await readChainState({ db, now: NOW })).toMatchObject({ lines: 3, break: { number: 4, why: 'changed' } });
    await owner('day_book').where({ number: 2 }).update({ did: 'role.grant' });
    expect(await checkDayBook({ db, now: NOW })).toBe(1);
    expect(await readChainState({ db, now: NOW })).toMatchObject({ lines: 1, written: 4, break: { number: 2, why: 'changed' } });
  });

  test('an end that was cut off is named, before and after the last reading', async () => {
    for (const did of ['role.grant', 'role.take', 'account.close']) await write(did);
    await checkDayBook({ db, now: NOW });
    await write('account.reopen');
    await owner('day_book').where({ number: 4 }).del();
    expect(await readChainState({ db, now: NOW })).toMatchObject({ break: { number: 4, why: 'cut-off' } });
    await owner('day_book_ends').update({ number: 2 });
    expect(await readChainState({ db, now: NOW })).toMatchObject({ break: { number: 3, why: 'cut-off' } });
  });
});

test('DAY-6 the page is asked by kind and day, both days included, and what cannot be read asks for nothing', async () => {
  await write('role.grant', new Date('2026-11-30T23:59:59.999Z'));
  await write('role.take', new Date('2026-12-01T00:00:00Z'));
  await write('account.close', new Date('2026-12-01T23:59:59.999Z'));
  await write('role.grant', new Date('2026-12-02T00:00:00Z'));
  const numbers = async (query: Record<string, string>) =>
    (await readDayBook({ db, now: NOW }, dayBookQuery.parse(query))).lines.map(({ number }) => number);
  expect(await numbers({})).toEqual([4, 3, 2, 1]);
  expect(await numbers({ from: '2026-12-01', until: '2026-12-01' })).toEqual([3, 2]);
  expect(await numbers({ kind: 'roles', from: '2026-12-01' })).toEqual([4, 2]);
  expect(await numbers({ kind: 'accounts' })).toEqual([3]);
  expect(await numbers({ before: '3', kind: 'roles' })).toEqual([2, 1]);
  expect(await numbers({ kind: 'all', from: '2026-02-30', until: 'soon', before: '-1' })).toEqual([4, 3, 2, 1]);
});
