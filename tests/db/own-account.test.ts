import { Secret } from 'otpauth';
import { beforeEach, describe, expect, test } from 'vitest';
import { findAccount, findAccountByEmail } from '@/db/accounts';
import { db } from '@/db/connection';
import { askAddressChange } from '@/lib/accounts/ask-address-change';
import { askForRole } from '@/lib/accounts/ask-for-role';
import { changePassword } from '@/lib/accounts/change-password';
import { endOtherSessions } from '@/lib/accounts/end-other-sessions';
import { endOwnSession } from '@/lib/accounts/end-own-session';
import { giveSecondFactor } from '@/lib/accounts/give-second-factor';
import { listDemoPeople } from '@/lib/accounts/list-demo-people';
import { listOwnSessions } from '@/lib/accounts/list-own-sessions';
import { makeSteward } from '@/lib/accounts/make-steward';
import { putDemoPeople } from '@/lib/accounts/put-demo-people';
import { renameAccount } from '@/lib/accounts/rename-account';
import { renewRecoveryCodes } from '@/lib/accounts/renew-recovery-codes';
import { preferencesInput, renameInput, roleAskInput } from '@/lib/accounts/schema';
import { signInAgain } from '@/lib/accounts/sign-in-again';
import { spendConfirmation } from '@/lib/accounts/spend-confirmation';
import { turnOffSecondFactor } from '@/lib/accounts/turn-off-second-factor';
import { turnOnSecondFactor } from '@/lib/accounts/turn-on-second-factor';
import { withdrawRoleRequest } from '@/lib/accounts/withdraw-role-request';
import { actorOf, sessionOf } from '@/lib/server/session';
import {
  DAY,
  NOW,
  PASSWORD,
  SECRET,
  SITE,
  aCtx,
  aPerson,
  aPlace,
  aVisit,
  address,
  codeAt,
  emptyTables,
  key,
  later,
  mailsOf,
  tokenIn,
} from './account-people';

const MARA = 'mara@example.test';

beforeEach(emptyTables);

describe('S18 a session', () => {
  test('ends after 7 days unseen and 30 days in all, and a visit is noted at most every five minutes', async () => {
    const visit = await aVisit(await aPerson(MARA));
    const seen = async (): Promise<unknown> => ((await db('sessions').pluck('seen_at')) as unknown[])[0];
    expect(await visit.isLive(later(4 * 60_000))).toBe(true);
    expect(await seen()).toEqual(NOW);
    expect(await visit.isLive(later(7 * DAY - 1))).toBe(true);
    expect(await seen()).toEqual(later(7 * DAY - 1));
    expect(await visit.isLive(later(14 * DAY - 1))).toBe(false);
    await db('sessions').update({ seen_at: later(29 * DAY) });
    expect(await visit.isLive(later(30 * DAY - 1))).toBe(true);
    await db('sessions').update({ seen_at: later(30 * DAY - 1) });
    expect(await visit.isLive(later(30 * DAY))).toBe(false);
  });

  test('S19 is kept as a hash, so that the table lets nobody in', async () => {
    const { session } = await aVisit(await aPerson(MARA));
    const ids: unknown = await db('sessions').pluck('id');
    expect(ids).toEqual([session.id]);
    expect(await sessionOf({ db, now: NOW }, Buffer.from(session.id.toString('base64url')))).toBeNull();
  });

  test.each(['closed', 'gone'])('S17 of a %s account is over at once', async (state) => {
    const visit = await aVisit(await aPerson(MARA));
    await db('accounts').update({ state, ...(state === 'gone' ? { email: null, name: '', password_hash: null } : {}) });
    expect(await visit.isLive()).toBe(false);
  });
});

test('ACT-13 S17 one ends sessions of one’s own, and nobody else’s', async () => {
  const mara = await aPerson(MARA);
  const [first, second, third] = [await aVisit(mara), await aVisit(mara), await aVisit(mara)];
  const other = await aVisit(await aPerson('other@example.test'));
  const listed = await listOwnSessions(first.ctx, first.session.id);
  const lines = listed.ok ? listed.value : [];
  expect(lines.filter(({ here }) => here)).toHaveLength(1);
  expect(JSON.stringify(lines)).not.toContain(first.session.id.toString('hex'));
  const elsewhere = lines.find(({ here }) => !here)?.handle ?? '';
  await endOwnSession(other.ctx, { key: key(), handle: elsewhere });
  expect(await db('sessions').count({ n: '*' })).toEqual([{ n: 4 }]);
  await endOwnSession(first.ctx, { key: key(), handle: elsewhere });
  expect(await db('sessions').count({ n: '*' })).toEqual([{ n: 3 }]);
  await endOtherSessions(first.ctx, first.session.id);
  expect(await Promise.all([first, second, third, other].map((visit) => visit.isLive()))).toEqual([true, false, false, true]);
});

test('S13 S16 S17 a new password wants the old one, ends every session, and gives this browser a new one', async () => {
  const mara = await aPerson(MARA);
  const [here, there] = [await aVisit(mara), await aVisit(mara)];
  const asked = { key: key(), current: PASSWORD, password: 'dry hands, slow wheel' };
  const change = (input: typeof asked) => changePassword(here.ctx, input, here.session, 'test');
  expect(await change({ ...asked, key: key(), current: 'not this one' })).toEqual({ ok: false, error: { kind: 'wrong' } });
  expect(await here.isLive()).toBe(true);
  const changed = await change(asked);
  expect(changed.ok).toBe(true);
  expect([await here.isLive(), await there.isLive()]).toEqual([false, false]);
  expect(await db('sessions').count({ n: '*' })).toEqual([{ n: 1 }]);
  expect((await mailsOf('password-changed')).map(({ address: to }) => to)).toEqual([MARA]);
});

describe('ACT-11 S17 a change of address', () => {
  test('waits for the new one, then ends every session and tells the old one', async () => {
    const mara = await aPerson(MARA);
    const visit = await aVisit(mara);
    expect((await askAddressChange(visit.ctx, { key: key(), email: address('new@example.test') })).ok).toBe(true);
    expect((await findAccount(db, mara.id))?.email).toBe(MARA);
    expect((await mailsOf()).map(({ address: to }) => to)).toEqual(['new@example.test']);
    const token = await tokenIn('address-changes');
    expect(await spendConfirmation(aCtx(), { key: key(), token })).toEqual({ ok: true, value: { what: 'address' } });
    expect((await findAccount(db, mara.id))?.email).toBe('new@example.test');
    expect(await visit.isLive()).toBe(false);
    expect((await mailsOf('address-changed')).map(({ address: to }) => to)).toEqual([MARA]);
  });

  test('to a taken one is answered alike, tells its owner, and changes nothing', async () => {
    await aPerson('taken@example.test');
    const visit = await aVisit(await aPerson(MARA));
    expect(await askAddressChange(visit.ctx, { key: key(), email: address('taken@example.test') })).toEqual({ ok: true, value: null });
    expect((await mailsOf()).map(({ kind, address: to }) => [kind, to])).toEqual([['someone-tried-to-sign-up', 'taken@example.test']]);
  });

  test('S18 asks for the password again first', async () => {
    const visit = await aVisit(await aPerson(MARA), { freshAt: later(-600_000) });
    const ask = (ctx = visit.ctx) => askAddressChange(ctx, { key: key(), email: address('new@example.test') });
    expect(await ask()).toEqual({ ok: false, error: { kind: 'sign-in-again' } });
    expect(await signInAgain(visit.ctx, { key: key(), password: 'wrong' }, visit.session.id)).toMatchObject({
      ok: false,
      error: { kind: 'wrong' },
    });
    expect((await signInAgain(visit.ctx, { key: key(), password: PASSWORD }, visit.session.id)).ok).toBe(true);
    const now = await sessionOf({ db, now: NOW }, visit.session.id);
    expect((await ask(aCtx(actorOf(now)))).ok).toBe(true);
  });
});

describe('S24 the second step', () => {
  const turnOn = async (): Promise<{ readonly codes: readonly string[] }> => {
    const mara = await aPerson(MARA);
    const visit = await aVisit(mara);
    const on = await turnOnSecondFactor(visit.ctx, { key: key(), secret: SECRET, code: codeAt(NOW) }, visit.session, 'test');
    if (!on.ok) throw new Error(on.error.kind);
    expect(await visit.isLive()).toBe(false);
    return on.value;
  };
  const give = async (code: string, now = NOW) => {
    const mara = await findAccountByEmail(db, MARA);
    if (mara === null) throw new Error('no account');
    const waiting = await aVisit(mara, { now });
    const given = await giveSecondFactor(waiting.ctx, { key: key(), code }, waiting.session, 'test');
    return { given, isOld: await waiting.isLive(now) };
  };

  test('ACT-5 ACT-6 S16 takes each code once, in a new session, and keeps the secret sealed', async () => {
    await turnOn();
    const [sealed] = (await db('accounts').pluck('second_factor_secret')) as Buffer[];
    expect(sealed).toHaveLength(48);
    expect(sealed?.includes(Buffer.from(Secret.fromBase32(SECRET).bytes))).toBe(false);
    expect((await give(codeAt(NOW))).given).toMatchObject({ ok: false, error: { kind: 'wrong-code' } });
    const next = later(30_000);
    const first = await give(codeAt(next), next);
    expect([first.given.ok, first.isOld]).toEqual([true, false]);
    expect((await give(codeAt(next), next)).given).toMatchObject({ ok: false, error: { kind: 'wrong-code' } });
    expect((await give(codeAt(NOW), next)).given).toMatchObject({ ok: false, error: { kind: 'wrong-code' } });
  });

  test('ACT-14 takes a recovery code once, and ten new ones end the earlier', async () => {
    const { codes } = await turnOn();
    const [one = '', two = '', three = ''] = codes;
    expect((await give(one.toUpperCase().replaceAll('-', ' '))).given.ok).toBe(true);
    expect((await give(one)).given.ok).toBe(false);
    expect((await mailsOf('second-factor-changed')).length).toBe(2);
    const mara = await findAccountByEmail(db, MARA);
    if (mara === null) throw new Error('no account');
    const { ctx } = await aVisit(mara, { secondFactorAt: NOW });
    expect((await give(two)).given.ok).toBe(true);
    const renewed = await renewRecoveryCodes(ctx);
    expect((await give(three)).given.ok).toBe(false);
    expect((await give(renewed.ok ? (renewed.value.codes[0] ?? '') : '')).given.ok).toBe(true);
  });

  test('S15 is asked ten times in a quarter of an hour, wherever the tries come from', async () => {
    await turnOn();
    const tries = [];
    for (let i = 0; i < 11; i += 1) tries.push((await give('000000')).given);
    expect(tries.map((tried) => (tried.ok ? 'in' : tried.error.kind))).toEqual([
      ...Array.from({ length: 10 }, () => 'wrong-code'),
      'too-many',
    ]);
  });

  test('turned off leaves neither secret nor codes, and is told by mail', async () => {
    await turnOn();
    const mara = await findAccountByEmail(db, MARA);
    if (mara === null) throw new Error('no account');
    const visit = await aVisit(mara, { secondFactorAt: NOW });
    expect((await turnOffSecondFactor(visit.ctx, { key: key() }, visit.session.id)).ok).toBe(true);
    expect(await db('recovery_codes').count({ n: '*' })).toEqual([{ n: 0 }]);
    expect(await db('accounts').select('second_factor_secret')).toEqual([{ second_factor_secret: null }]);
    expect(await mailsOf('second-factor-changed')).toHaveLength(2);
  });
});

describe('ACT-18 asking to become an editor', () => {
  test('waits one at a time, for places we know, and is withdrawn by nobody else', async () => {
    await aPlace();
    const { ctx } = await aVisit(await aPerson(MARA));
    const { ctx: other } = await aVisit(await aPerson('other@example.test'));
    const ask = (regions: readonly string[], asker = ctx) =>
      askForRole(asker, { key: key(), why: 'I know the rules here', regions: [...regions] });
    expect(await ask(['zz'])).toEqual({ ok: false, error: { kind: 'unknown-region', code: 'zz' } });
    const ends = await Promise.all([ask(['dk']), ask(['dk'])]);
    expect(ends.map(({ ok }) => ok).sort()).toEqual([false, true]);
    const id = ends.flatMap((end) => (end.ok ? [end.value.id] : []))[0] ?? '';
    expect(await withdrawRoleRequest(other, { key: key(), id })).toEqual({ ok: false, error: { kind: 'not-found' } });
    expect((await withdrawRoleRequest(ctx, { key: key(), id })).ok).toBe(true);
    expect((await ask(['dk'])).ok).toBe(true);
  });

  test('is for makers with a confirmed address', async () => {
    const { ctx } = await aVisit(await aPerson(MARA, { role: 'editor' }));
    expect(await askForRole(ctx, { key: key(), why: 'x', regions: [] })).toEqual({ ok: false, error: { kind: 'not-allowed' } });
  });
});

describe('S26 what a form may say', () => {
  test.each([
    [renameInput, { name: 'Mara' }],
    [preferencesInput, { units: 'metric' }],
    [roleAskInput, { why: 'x' }],
  ])('a field that is none of its own is refused', (schema, fields) => {
    expect(schema.safeParse({ key: key(), ...fields }).success).toBe(true);
    for (const field of ['role', 'state', 'is_demo', 'version', 'account_id', 'answered_by']) {
      expect(schema.safeParse({ key: key(), ...fields, [field]: 'steward' }).success).toBe(false);
    }
  });

  test('F09 the same form sent five times at once changes once', async () => {
    const mara = await aPerson(MARA);
    const { ctx } = await aVisit(mara);
    const input = { key: key(), name: 'Mara of the Kiln' };
    const ends = await Promise.all(Array.from({ length: 5 }, () => renameAccount(ctx, input)));
    expect(ends.every((end) => end.ok)).toBe(true);
    expect((await findAccount(db, mara.id))?.version).toBe(mara.version + 1);
    expect(await renameAccount(ctx, { ...input, name: 'Another' })).toMatchObject({ ok: false, error: { kind: 'key-reused' } });
  });
});

test('ACT-20 S31 whoever runs the machine makes a steward, of an account or of none yet, and it is in the day book', async () => {
  const ctx = { db, now: NOW, site: SITE };
  const mara = await aPerson(MARA);
  const visit = await aVisit(mara);
  expect(await makeSteward(ctx, { email: address(MARA) })).toEqual({ ok: true, value: { what: 'made' } });
  expect(await visit.isLive()).toBe(false);
  expect(await makeSteward(ctx, { email: address(MARA) })).toEqual({ ok: true, value: { what: 'was-one' } });
  expect(await makeSteward(ctx, { email: address('first@example.test') })).toEqual({ ok: true, value: { what: 'begun' } });
  expect(await mailsOf('reset-password')).toHaveLength(1);
  const subjects: unknown = await db('day_book').where({ did: 'role.grant' }).pluck('subject_id');
  expect(subjects).toContain(mara.id);
  expect(JSON.stringify(await db('day_book').select('*'))).not.toMatch(/example\.test|Mara/);
});

test('ACT-21 demo accounts are put back as they were, and take over nobody’s address', async () => {
  const real = await aPerson('owen.tallis@example.test', { name: 'The real one' });
  await putDemoPeople({ db, now: NOW });
  await db('accounts').where({ email: 'mette.holmgaard@example.test' }).update({ role: 'editor', password_hash: 'x' });
  await putDemoPeople({ db, now: NOW });
  expect((await findAccountByEmail(db, 'mette.holmgaard@example.test'))?.role).toBe('maker');
  expect((await findAccount(db, real.id))?.name).toBe('The real one');
  expect(await listDemoPeople({ db, now: NOW })).toEqual([]); // the setting is off here
});
