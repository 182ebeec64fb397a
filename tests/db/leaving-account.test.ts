import { strFromU8, unzipSync } from 'fflate';
import { beforeEach, describe, expect, test } from 'vitest';
import { findAccount, findAccountByEmail } from '@/db/accounts';
import { db } from '@/db/connection';
import { askAddressChange } from '@/lib/accounts/ask-address-change';
import { askForRole } from '@/lib/accounts/ask-for-role';
import { beginExport } from '@/lib/accounts/begin-export';
import { forgetLeavers } from '@/lib/accounts/forget-leavers';
import { keepAccount } from '@/lib/accounts/keep-account';
import { leaveAccount } from '@/lib/accounts/leave-account';
import { makeExport } from '@/lib/accounts/make-export';
import { readArchive } from '@/lib/accounts/read-export';
import { turnOnSecondFactor } from '@/lib/accounts/turn-on-second-factor';
import { sessionOf } from '@/lib/server/session';
import { DAY, NOW, READER, SECRET, aCtx, aPerson, aPlace, aVisit, address, codeAt, emptyTables, key, later } from './account-people';

const MARA = 'mara@example.test';

beforeEach(emptyTables);

describe('ACT-15 S57 leaving', () => {
  const leave = async (): Promise<void> => {
    const visit = await aVisit(await aPerson(MARA, { name: 'Mara Unverwechselbar' }));
    expect((await leaveAccount(visit.ctx, { key: key() })).ok).toBe(true);
    expect(await visit.isLive()).toBe(false);
  };

  test('can be taken back for 14 days', async () => {
    await leave();
    const mara = await findAccountByEmail(db, MARA);
    if (mara === null) throw new Error('no account');
    expect(await forgetLeavers({ db, now: later(14 * DAY - 1) })).toBe(0);
    const { ctx } = await aVisit(mara, { now: later(13 * DAY) });
    expect((await keepAccount(ctx, { key: key() })).ok).toBe(true);
    expect(await forgetLeavers({ db, now: later(20 * DAY) })).toBe(0);
    expect((await findAccount(db, mara.id))?.state).toBe('open');
  });

  test('leaves nothing that says who it was in any table', async () => {
    await aPlace();
    await aPerson('stays@example.test', { name: 'Stays Behind' });
    await leave();
    const mara = await findAccountByEmail(db, MARA);
    if (mara === null) throw new Error('no account');
    const { ctx, session } = await aVisit(mara);
    await askForRole(ctx, { key: key(), why: 'Unverwechselbar words of mine', regions: ['dk'] });
    await makeExport({ db, now: NOW }, { accountId: mara.id, archive: key() }, () => Promise.resolve());
    await askAddressChange(ctx, { key: key(), email: address('mara.unverwechselbar@example.test') });
    expect(await forgetLeavers({ db, now: later(14 * DAY) })).toBe(1);
    const tables = (await db('information_schema.tables')
      .where({ table_schema: db.raw('database()') })
      .pluck('table_name')) as string[];
    const left: string[] = [];
    for (const table of tables) {
      const text = JSON.stringify(await db(table).select('*'));
      if (/unverwechselbar|mara@example|mara\./i.test(text)) left.push(table);
      if (text.includes(mara.id)) left.push(`${table} by id`);
    }
    expect(left.sort()).toEqual(['accounts by id', 'day_book by id']);
    expect(await sessionOf({ db, now: later(14 * DAY) }, session.id)).toBeNull();
    expect((await findAccountByEmail(db, 'stays@example.test'))?.name).toBe('Stays Behind');
  });

  test('ACT-16 S30 is refused to the last steward', async () => {
    const [one, two] = [await aPerson('one@example.test', { role: 'steward' }), await aPerson('two@example.test', { role: 'steward' })];
    const both = [await aVisit(one), await aVisit(two)];
    const ends = await Promise.all(both.map(({ ctx }) => leaveAccount(ctx, { key: key() })));
    expect(ends.map((end) => (end.ok ? 'left' : end.error.kind)).sort()).toEqual(['last-steward', 'left']);
  });
});

describe('ACT-17 S57 an archive', () => {
  const make = async (id: string, archive: string): Promise<unknown> =>
    makeExport({ db, now: NOW }, { accountId: id, archive }, () => Promise.resolve());

  test('holds one’s own alone, without secrets', async () => {
    await aPerson('other@example.test', { name: 'Otherwise' });
    const mara = await aPerson(MARA);
    const visit = await aVisit(mara);
    await turnOnSecondFactor(visit.ctx, { key: key(), secret: SECRET, code: codeAt(NOW) }, visit.session, 'test');
    const archive = key();
    await make(mara.id, archive);
    const { ctx } = await aVisit(mara, { secondFactorAt: NOW });
    const read = await readArchive(ctx, archive);
    const files = Object.entries(unzipSync(new Uint8Array(read.ok ? read.value : [])));
    const text = files.map(([name, bytes]) => name + strFromU8(bytes)).join('\n');
    expect(text).toContain(MARA);
    expect(text).not.toMatch(/otherwise|other@|argon2|secret"|hash"|"id":\{/i);
    for (const [name, bytes] of files) if (name.endsWith('.json')) JSON.parse(strFromU8(bytes));
  });

  test('is nobody else’s, asks for the password again, and is kept for a day', async () => {
    const mara = await aPerson(MARA);
    const archive = key();
    await make(mara.id, archive);
    const read = (ctx: Parameters<typeof readArchive>[0]) => readArchive(ctx, archive);
    const { ctx: other } = await aVisit(await aPerson('other@example.test'));
    expect(await read(other)).toEqual({ ok: false, error: { kind: 'not-found' } });
    expect(await read(aCtx(READER))).toEqual({ ok: false, error: { kind: 'sign-in' } });
    const { ctx: stale } = await aVisit(mara, { freshAt: later(-600_000) });
    expect(await read(stale)).toEqual({ ok: false, error: { kind: 'sign-in-again' } });
    expect(await beginExport(stale, { key: key() })).toEqual({ ok: false, error: { kind: 'sign-in-again' } });
    const { ctx: next } = await aVisit(mara, { now: later(DAY) });
    expect(await read(next)).toEqual({ ok: false, error: { kind: 'not-found' } });
  });
});
