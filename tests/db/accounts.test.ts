import { beforeEach, describe, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { findAccount, findAccountByEmail } from '@/db/accounts';
import { mailLink } from '@/lib/accounts/mail-link';
import { readMailedLink } from '@/lib/accounts/read-mailed-link';
import { resetPassword } from '@/lib/accounts/reset-password';
import { resetInput, signInInput, signUpInput, tokenInput } from '@/lib/accounts/schema';
import { signIn } from '@/lib/accounts/sign-in';
import { signUp } from '@/lib/accounts/sign-up';
import { spendConfirmation } from '@/lib/accounts/spend-confirmation';
import { spendSignInLink } from '@/lib/accounts/spend-sign-in-link';
import { aCtx, address, aPerson, aVisit, emptyTables, key, mailsOf, NOW, PASSWORD, READER, SITE, tokenIn } from './account-people';

const MARA = 'mara@example.test';
const later = (minutes: number): Date => new Date(NOW.getTime() + minutes * 60_000);
const join = (email = MARA, name = 'Mara Lindqvist', password = PASSWORD, ctx = aCtx()) =>
  signUp(ctx, { key: key(), email: address(email), name, password });
const enter = (password: string, from = '192.0.2.1', email = MARA) =>
  signIn(aCtx(READER, NOW, from), { key: key(), email: address(email), password }, 'test');
const ask = (kind: 'link' | 'reset', email = MARA, ctx = aCtx()) => mailLink(ctx, kind, { key: key(), email: address(email) });
const confirm = (token: string, now = NOW) => spendConfirmation(aCtx(READER, now), { key: key(), token });
const reset = (token: string, password = 'dry hands, slow wheel', now = NOW) =>
  resetPassword(aCtx(READER, now), { key: key(), token, password });
const byLink = (token: string, now = NOW) => spendSignInLink(aCtx(READER, now), { key: key(), token }, 'test');

beforeEach(emptyTables);

describe('signing up', () => {
  test('S12 S19 keeps the password as argon2id of 19 MiB, two rounds, one lane, and the token as a hash alone', async () => {
    expect(await join()).toEqual({ ok: true, value: null });
    const hashes: unknown[] = await db('accounts').where({ state: 'unconfirmed' }).pluck('password_hash');
    expect(hashes[0]).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    const token = await tokenIn('confirm-address');
    expect(Buffer.from(token, 'base64url')).toHaveLength(32);
    const [kept] = (await db('account_tokens').select('*')) as Record<string, unknown>[];
    expect(JSON.stringify(kept)).not.toContain(token);
  });

  test('ACT-7 S14 a known address is answered like an unknown one, and its owner alone is told', async () => {
    const mara = await aPerson(MARA);
    expect(await join()).toEqual(await join('other@example.test'));
    expect((await mailsOf()).map(({ kind, address: to }) => [kind, to])).toEqual([
      ['someone-tried-to-sign-up', MARA],
      ['confirm-address', 'other@example.test'],
    ]);
    expect((await findAccountByEmail(db, MARA))?.version).toBe(mara.version);
  });

  test('S22 an address in another spelling is the same account, and mail goes to the kept one', async () => {
    await aPerson(MARA);
    await join(' MARA@Example.Test ');
    expect(await db('accounts').count({ n: '*' })).toEqual([{ n: 1 }]);
    expect((await mailsOf()).map(({ address: to }) => to)).toEqual([MARA]);
  });

  test('ACT-8 an account never confirmed belongs to the newest sign-up, and the older link is of no use', async () => {
    await join(MARA, 'A stranger', 'a stranger chose this');
    const older = await tokenIn('confirm-address');
    await join();
    const newer = await tokenIn('confirm-address');
    expect(await confirm(older)).toMatchObject({ ok: false, error: { kind: 'link-over' } });
    expect(await confirm(newer)).toEqual({ ok: true, value: { what: 'account' } });
    expect(await enter('a stranger chose this')).toMatchObject({ ok: false });
    expect(await enter(PASSWORD)).toMatchObject({ ok: true, value: { then: 'in' } });
    expect((await findAccountByEmail(db, MARA))?.name).toBe('Mara Lindqvist');
  });

  test('two at once for one address make one account', async () => {
    await Promise.all(Array.from({ length: 6 }, () => join()));
    expect(await db('accounts').count({ n: '*' })).toEqual([{ n: 1 }]);
  });

  test('S20 the link leads to the site in the settings, whatever the request said', async () => {
    await join();
    expect((await mailsOf())[0]?.body_text).toContain(`${SITE}/confirm/`);
  });

  test.each(['role', 'state', 'id', 'version', 'confirmed_at', 'is_demo', 'password_hash', '__proto__', 'constructor'])(
    'S26 S36 a field %s is refused',
    (field) => {
      const body: unknown = JSON.parse(`{"key":"${key()}","email":"${MARA}","name":"Mara","password":"${PASSWORD}","${field}":"steward"}`);
      expect(signUpInput.safeParse(body).success).toBe(false);
      expect(Reflect.get({}, 'steward')).toBeUndefined();
    },
  );
});

describe('S32 odd values', () => {
  const ODD: readonly unknown[] = [
    0,
    false,
    true,
    null,
    [],
    {},
    [[0]],
    "' or 1=1-- ",
    '\\',
    Number.POSITIVE_INFINITY,
    ['a@example.test', 'b@example.test'],
  ];

  test.each(ODD.map((odd) => [odd]))('%j is no address and no token', async (odd) => {
    await aPerson(MARA);
    await ask('reset');
    expect(signInInput.safeParse({ key: key(), email: odd, password: PASSWORD }).success).toBe(false);
    expect(tokenInput.safeParse({ key: key(), token: odd }).success).toBe(false);
    expect(resetInput.safeParse({ key: key(), token: odd, password: PASSWORD }).success).toBe(false);
    expect(await readMailedLink({ db, now: NOW }, String(odd), ['reset', 'link', 'confirm', 'address'])).toBeNull();
  });
});

describe('signing in', () => {
  test('S14 a wrong password and an unknown address are answered alike, and take alike', async () => {
    await aPerson(MARA);
    const times: Record<'known' | 'unknown', number[]> = { known: [], unknown: [] };
    for (let i = 0; i < 8; i += 1) {
      for (const [which, email] of [
        ['known', MARA],
        ['unknown', 'nobody@example.test'],
      ] as const) {
        const began = performance.now();
        expect(await enter('wrong', `198.51.100.${String(i)}`, email)).toEqual({ ok: false, error: { kind: 'wrong' } });
        times[which].push(performance.now() - began);
      }
    }
    const median = (list: number[]): number => list.sort((a, b) => a - b)[list.length / 2] ?? 0;
    // A verification that was skipped would show as half the time or less.
    expect(median(times.unknown) / median(times.known)).toBeGreaterThan(0.6);
  }, 90_000);

  test('S15 a burst of tries passes no more than ten, the owner elsewhere is let in, and right ones are given back', async () => {
    await aPerson(MARA);
    const tries = await Promise.all(Array.from({ length: 14 }, () => enter('wrong')));
    const kinds = tries.map((tried) => (tried.ok ? 'in' : tried.error.kind));
    expect(kinds.filter((kind) => kind === 'wrong').length).toBe(10);
    expect(kinds.filter((kind) => kind === 'too-many').length).toBe(4);
    expect(await enter(PASSWORD)).toMatchObject({ ok: false, error: { kind: 'too-many' } });
    for (let i = 0; i < 11; i += 1) expect((await enter(PASSWORD, '203.0.113.7')).ok).toBe(true);
  });

  test('ACT-12 a password changed while another was looked at opens nothing', async () => {
    const mara = await aPerson(MARA);
    const tried = enter(PASSWORD);
    await db('accounts').where({ id: mara.id }).update({ version: 7 });
    const end = await tried;
    const sessions = (await db('sessions').select('account_id')).length;
    expect(end.ok ? 1 : 0).toBe(sessions);
  });

  test('S17 a closed account opens no session, and is told so only with the right password', async () => {
    await aPerson(MARA);
    await db('accounts').update({ state: 'closed' });
    expect(await enter('wrong')).toEqual({ ok: false, error: { kind: 'wrong' } });
    expect(await enter(PASSWORD)).toEqual({ ok: false, error: { kind: 'closed' } });
    expect(await db('sessions').select('account_id')).toEqual([]);
  });
});

describe('ACT-9 S19 a mailed link', () => {
  test('works once, of twenty who come with it at once', async () => {
    await aPerson(MARA);
    await ask('link');
    const token = await tokenIn('sign-in-link');
    const came = await Promise.all(Array.from({ length: 20 }, () => byLink(token)));
    expect(came.filter(({ ok }) => ok)).toHaveLength(1);
    expect(await db('sessions').count({ n: '*' })).toEqual([{ n: 1 }]);
    await ask('reset');
    const other = await tokenIn('reset-password');
    const set = await Promise.all(Array.from({ length: 20 }, () => reset(other)));
    expect(set.filter(({ ok }) => ok)).toHaveLength(1);
  });

  test('works for its time, and only the newest of its kind', async () => {
    await aPerson(MARA);
    await ask('link');
    const older = await tokenIn('sign-in-link');
    await ask('link');
    const newer = await tokenIn('sign-in-link');
    expect((await byLink(older)).ok).toBe(false);
    expect((await byLink(newer, later(15))).ok).toBe(false);
    expect((await byLink(newer, later(14.9))).ok).toBe(true);
    await ask('reset');
    expect((await reset(await tokenIn('reset-password'), PASSWORD, later(60))).ok).toBe(false);
  });

  test('is not spent by being looked at, and is of its own kind alone', async () => {
    await aPerson(MARA);
    await ask('link');
    const token = await tokenIn('sign-in-link');
    expect(await readMailedLink({ db, now: NOW }, token, ['link'])).toBe('link');
    expect(await readMailedLink({ db, now: NOW }, token, ['reset', 'confirm', 'address'])).toBeNull();
    expect((await reset(token)).ok).toBe(false);
    expect((await byLink(token)).ok).toBe(true);
  });

  test('signs in without the password being known: delicate acts ask for it', async () => {
    await aPerson(MARA);
    await ask('link');
    await byLink(await tokenIn('sign-in-link'));
    const kept: unknown = await db('sessions').where('fresh_at', '>', later(-10)).pluck('account_id');
    expect(kept).toEqual([]);
  });

  test('S49 the sixth mail within the hour is not sent, and is answered as the fifth', async () => {
    await aPerson(MARA);
    const answers = [];
    for (let i = 0; i < 6; i += 1) answers.push(await ask('reset'));
    expect(new Set(answers.map((answer) => JSON.stringify(answer))).size).toBe(1);
    expect(await mailsOf('reset-password')).toHaveLength(5);
  });

  test('S14 is mailed to nobody for an address without an account, with the same answer', async () => {
    await aPerson(MARA);
    expect(await ask('reset', 'nobody@example.test')).toEqual(await ask('reset'));
    expect((await mailsOf()).map(({ address: to }) => to)).toEqual([MARA]);
  });
});

test('ACT-10 S17 S19 a reset ends every session and every other link, signs nobody in, and is told by mail', async () => {
  const mara = await aPerson(MARA);
  const visit = await aVisit(mara);
  await ask('link');
  const link = await tokenIn('sign-in-link');
  await ask('reset');
  expect(await reset(await tokenIn('reset-password'), 'password')).toMatchObject({
    ok: false,
    error: { kind: 'password', fault: 'common' },
  });
  expect(await visit.isLive()).toBe(true);
  expect(await reset(await tokenIn('reset-password'))).toEqual({ ok: true, value: null });
  expect(await visit.isLive()).toBe(false);
  expect((await byLink(link)).ok).toBe(false);
  expect(await db('sessions').select('account_id')).toEqual([]);
  expect(await mailsOf('password-changed')).toHaveLength(1);
  expect((await enter(PASSWORD)).ok).toBe(false);
  expect((await enter('dry hands, slow wheel')).ok).toBe(true);
  expect((await findAccount(db, mara.id))?.state).toBe('open');
});
