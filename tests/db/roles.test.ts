import { randomUUID } from 'node:crypto';
import { beforeEach, describe, expect, test } from 'vitest';
import { z } from 'zod';
import { findAccount } from '@/db/accounts';
import { db } from '@/db/connection';
import { listDayBook } from '@/db/day-book';
import { listMails } from '@/db/outbox';
import { findSession } from '@/db/sessions';
import type { AccountId, AccountRole } from '@/lib/access/domain/actor';
import { answerRequest } from '@/lib/accounts/answer-request';
import { askForRole } from '@/lib/accounts/ask-for-role';
import { changeRole } from '@/lib/accounts/change-role';
import { closeAccount } from '@/lib/accounts/close-account';
import { leaveAccount } from '@/lib/accounts/leave-account';
import { listRequests, readRequest } from '@/lib/accounts/list-requests';
import { readAccount } from '@/lib/accounts/read-account';
import { reopenAccount } from '@/lib/accounts/reopen-account';
import { withdrawRoleRequest } from '@/lib/accounts/withdraw-role-request';
import { err, ok } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { actorOf, anAccount, aSession, ctxOf, NOW, someone } from '../builders/people';

const WEEK_AGO = new Date(NOW.getTime() - 7 * 86_400_000);
const REASON = 'Has sent three amendments that hold.';

let steward: { readonly id: AccountId; readonly ctx: ActorCtx };
let linesBefore = 0;

/** Lines that this test wrote, the oldest first. */
const lines = async () => (await listDayBook(db, { limit: 200 })).filter(({ number }) => number > linesBefore).toReversed();
const mails = () => listMails(db, ['waiting'], { limit: 200 });
const roleOf = async (id: AccountId) => (await findAccount(db, id))?.role;
const stateOf = async (id: AccountId) => (await findAccount(db, id))?.state;
const stewardsLeft = async () => (await db('accounts').where({ role: 'steward', state: 'open' }).pluck('id')).length;
const isSignedIn = async (session: Buffer) => (await findSession(db, session, NOW, WEEK_AGO)) !== null;

const move = (ctx: ActorCtx, id: AccountId, from: AccountRole, role: AccountRole, over: { key?: string; reason?: string } = {}) =>
  changeRole(ctx, { key: randomUUID(), id, from, role, reason: REASON, ...over });

beforeEach(async () => {
  for (const table of ['role_requests', 'sessions', 'outbox', 'request_keys', 'account_tokens', 'accounts']) await db(table).del();
  linesBefore = (await listDayBook(db, { limit: 1 }))[0]?.number ?? 0;
  steward = await someone('steward');
});

test('ROL-4 ROL-5 S17 a role granted and one taken: the sessions end, one mail goes out and one line stands in the day book', async () => {
  const id = await anAccount();
  const before = await aSession(id);
  expect(await move(steward.ctx, id, 'maker', 'moderator')).toEqual(ok({ id, change: 'grant' }));
  expect([await roleOf(id), await isSignedIn(before)]).toEqual(['moderator', false]);
  const later = await aSession(id);
  expect(await move(steward.ctx, id, 'moderator', 'maker', { reason: 'Asked for it.' })).toEqual(ok({ id, change: 'take' }));
  expect([await roleOf(id), await isSignedIn(later)]).toEqual(['maker', false]);
  expect((await mails()).map(({ kind, accountId }) => [kind, accountId])).toEqual([
    ['role-changed', id],
    ['role-changed', id],
  ]);
  const line = { actorId: steward.id, subject: { kind: 'account', id } };
  expect(await lines()).toMatchObject([
    { ...line, did: 'role.grant', reason: REASON, details: { from: 'maker', to: 'moderator' } },
    { ...line, did: 'role.take', reason: 'Asked for it.', details: { from: 'moderator', to: 'maker' } },
  ]);
});

test('ROL-4 S31 the same form sent twice is one act, one mail and one line', async () => {
  const id = await anAccount();
  const key = randomUUID();
  const both = await Promise.all([1, 2].map(() => move(steward.ctx, id, 'maker', 'editor', { key })));
  expect(both).toEqual([ok({ id, change: 'grant' }), ok({ id, change: 'grant' })]);
  expect([(await mails()).length, (await lines()).length]).toEqual([1, 1]);
});

describe('ROL-2 S30 roles are given downward only', () => {
  test('the only role that may give any is the steward', async () => {
    const id = await anAccount();
    for (const role of ['maker', 'editor', 'moderator'] as const) {
      expect(await move((await someone(role)).ctx, id, 'maker', 'editor')).toEqual(err({ kind: 'not-allowed' }));
    }
    expect(await move(ctxOf(), id, 'maker', 'editor')).toEqual(err({ kind: 'sign-in' }));
    expect([await roleOf(id), await lines()]).toEqual(['maker', []]);
  });

  test('an account that cannot sign in gets no higher role', async () => {
    for (const state of ['unconfirmed', 'closed', 'leaving'] as const) {
      const id = await anAccount({ state });
      expect(await move(steward.ctx, id, 'maker', 'editor')).toEqual(err({ kind: 'not-open' }));
    }
    expect(await lines()).toEqual([]);
  });

  test('a role that somebody else has changed meanwhile is not changed by an old form', async () => {
    const id = await anAccount({ role: 'editor' });
    expect(await move(steward.ctx, id, 'maker', 'moderator')).toEqual(err({ kind: 'changed-meanwhile' }));
    expect(await move(steward.ctx, id, 'editor', 'editor')).toEqual(err({ kind: 'same-role' }));
  });
});

test('ROL-10 S18 without the second step or a fresh password nothing is changed', async () => {
  const id = await anAccount();
  const late = ctxOf(actorOf(steward.id, 'steward', { freshUntil: NOW }));
  const bare = ctxOf(actorOf(steward.id, 'steward', { secondFactor: 'off' }));
  const waiting = ctxOf(actorOf(steward.id, 'steward', { secondFactor: 'waiting' }));
  expect(await move(late, id, 'maker', 'editor')).toEqual(err({ kind: 'sign-in-again' }));
  expect(await closeAccount(late, { key: randomUUID(), id, reason: REASON })).toEqual(err({ kind: 'sign-in-again' }));
  for (const ctx of [bare, waiting]) expect(await move(ctx, id, 'maker', 'editor')).toEqual(err({ kind: 'second-factor-needed' }));
  expect([await roleOf(id), await stateOf(id), await lines()]).toEqual(['maker', 'open', []]);
});

test('ROL-3 S30 the last steward can neither be demoted nor leave; with a second one both can', async () => {
  expect(await move(steward.ctx, steward.id, 'steward', 'maker')).toEqual(err({ kind: 'last-steward' }));
  expect(await leaveAccount(steward.ctx, { key: randomUUID() })).toEqual(err({ kind: 'last-steward' }));
  await anAccount({ role: 'steward', state: 'closed' });
  expect(await move(steward.ctx, steward.id, 'steward', 'maker')).toEqual(err({ kind: 'last-steward' }));
  await anAccount({ role: 'steward' });
  expect(await move(steward.ctx, steward.id, 'steward', 'maker')).toEqual(ok({ id: steward.id, change: 'take' }));
  expect(await stewardsLeft()).toBe(1);
});

test('ROL-3 ROL-6 S30 fifty stewards who demote each other at once leave at least one, and each line tells of one that was', async () => {
  const all = [steward, ...(await Promise.all(Array.from({ length: 49 }, () => someone('steward'))))];
  const ends = await Promise.allSettled(
    all.map(({ ctx }, at) => move(ctx, (all[(at + 1) % all.length] ?? steward).id, 'steward', 'maker')),
  );
  const done = ends.filter((end) => end.status === 'fulfilled' && end.value.ok).length;
  const left = await stewardsLeft();
  expect(left).toBeGreaterThanOrEqual(1);
  expect(done).toBeGreaterThan(0);
  expect([50 - left, (await lines()).length]).toEqual([done, done]);
}, 60_000);

test('ROL-3 S30 two stewards, one demoting the other while that one leaves or closes them: one stays', async () => {
  for (let round = 0; round < 10; round += 1) {
    await db('accounts').where({ role: 'steward' }).update({ role: 'maker' });
    const [one, two] = [await someone('steward'), await someone('steward')];
    const other =
      round % 2 === 0
        ? leaveAccount(two.ctx, { key: randomUUID() })
        : closeAccount(two.ctx, { key: randomUUID(), id: one.id, reason: REASON });
    const ends = await Promise.all([move(one.ctx, two.id, 'steward', 'maker'), other]);
    expect(ends.filter((end) => end.ok).length).toBeLessThanOrEqual(round % 2 === 0 ? 2 : 1);
    expect(await stewardsLeft()).toBeGreaterThanOrEqual(1);
  }
}, 60_000);

test('ROL-6 a request of a steward that was on its way when the role was taken does nothing', async () => {
  const second = await someone('steward');
  const id = await anAccount();
  await move(steward.ctx, second.id, 'steward', 'maker');
  expect(await move(second.ctx, id, 'maker', 'editor')).toEqual(err({ kind: 'not-allowed' }));
  expect(await closeAccount(second.ctx, { key: randomUUID(), id, reason: REASON })).toEqual(err({ kind: 'not-allowed' }));
  expect([await roleOf(id), await stateOf(id), (await lines()).length]).toEqual(['maker', 'open', 1]);
});

test('ROL-4 ROL-5 S17 a closed account is out at once, in one line and one mail, and comes back when it is opened again', async () => {
  const id = await anAccount({ role: 'editor' });
  const session = await aSession(id);
  expect(await closeAccount(steward.ctx, { key: randomUUID(), id, reason: 'Sent advertising.' })).toEqual(ok(null));
  expect([await stateOf(id), await isSignedIn(session)]).toEqual(['closed', false]);
  expect(await closeAccount(steward.ctx, { key: randomUUID(), id, reason: 'Again.' })).toEqual(err({ kind: 'closed-already' }));
  expect(await reopenAccount(steward.ctx, { key: randomUUID(), id, reason: 'It was a mistake.' })).toEqual(ok(null));
  expect([await stateOf(id), await roleOf(id)]).toEqual(['open', 'editor']);
  expect((await lines()).map(({ did }) => did)).toEqual(['account.close', 'account.reopen']);
  expect((await mails()).map(({ kind }) => kind).toSorted()).toEqual(['account-closed', 'account-reopened']);
});

test('ROL-3 one closes neither oneself nor an account that is leaving or gone', async () => {
  const close = (id: AccountId) => closeAccount(steward.ctx, { key: randomUUID(), id, reason: REASON });
  expect(await close(steward.id)).toEqual(err({ kind: 'own-account' }));
  expect(await close(await anAccount({ state: 'leaving' }))).toEqual(err({ kind: 'leaving' }));
  const gone = await anAccount();
  await db('accounts').where({ id: gone }).update({ email: null, name: '', state: 'gone' });
  expect(await close(gone)).toEqual(err({ kind: 'not-found' }));
  expect(await readAccount(steward.ctx, gone)).toEqual(err({ kind: 'not-found' }));
});

test('ROL-7 a reason that names the person, or any address, is refused and nothing happens', async () => {
  const id = await anAccount({ name: 'Mira Veld' });
  for (const reason of ['MIRA  VELD asked for it', 'Write to her at mira@example.test', 'Mira veld.']) {
    expect(await move(steward.ctx, id, 'maker', 'editor', { reason })).toEqual(err({ kind: 'names-person' }));
  }
  expect([await roleOf(id), await lines(), await mails()]).toEqual(['maker', [], []]);
});

describe('ROL-8 a request to become an editor', () => {
  const ask = async () => {
    const maker = await someone('maker');
    const asked = await askForRole(maker.ctx, { key: randomUUID(), why: 'I know the Danish rules.', regions: [] });
    return { maker, id: z.object({ ok: z.literal(true), value: z.object({ id: z.string() }) }).parse(asked).value.id };
  };

  test('granted: the maker is an editor, gets the words, and the day book holds none of them', async () => {
    const { maker, id } = await ask();
    expect((await listRequests(steward.ctx)).ok && (await readRequest(steward.ctx, id)).ok).toBe(true);
    const said = 'Welcome. Begin with the Danish sheet.';
    expect(await answerRequest(steward.ctx, { key: randomUUID(), id, answer: 'granted', said })).toEqual(ok(null));
    expect(await roleOf(maker.id)).toBe('editor');
    expect(await readRequest(steward.ctx, id)).toMatchObject({ value: { state: 'granted', answer: said, answeredBy: steward.id } });
    expect(await lines()).toMatchObject([{ did: 'role.grant', reason: null, details: { from: 'maker', to: 'editor' } }]);
    expect((await mails()).map(({ kind, accountId }) => [kind, accountId])).toEqual([['role-answer', maker.id]]);
  });

  test('refused: the role stays and the line names nobody', async () => {
    const { maker, id } = await ask();
    expect(await answerRequest(steward.ctx, { key: randomUUID(), id, answer: 'refused', said: 'Not yet.' })).toEqual(ok(null));
    expect(await roleOf(maker.id)).toBe('maker');
    expect(await lines()).toMatchObject([{ did: 'role.refuse', subject: { kind: 'role-request', id }, reason: null }]);
  });

  test('two stewards and the maker who takes it back: one end, at most one line and one mail', async () => {
    const second = await someone('steward');
    const { maker, id } = await ask();
    const answers = [steward, second].map(({ ctx }) => answerRequest(ctx, { key: randomUUID(), id, answer: 'granted', said: 'Yes.' }));
    const ends = await Promise.all([...answers, withdrawRoleRequest(maker.ctx, { key: randomUUID(), id })]);
    expect(ends.filter((end) => end.ok).length).toBe(1);
    const isGranted = (await roleOf(maker.id)) === 'editor';
    expect([(await lines()).length, (await mails()).length]).toEqual(isGranted ? [1, 1] : [0, 0]);
  });

  test('one that was taken back, or whose maker is shut out meanwhile, makes nobody an editor', async () => {
    const { maker, id } = await ask();
    await closeAccount(steward.ctx, { key: randomUUID(), id: maker.id, reason: REASON });
    const late = await answerRequest(steward.ctx, { key: randomUUID(), id, answer: 'granted', said: 'Yes.' });
    expect([late, await roleOf(maker.id)]).toEqual([err({ kind: 'answered' }), 'maker']);
  });
});
