import { beforeAll, beforeEach, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { findEdition, findNumberInUse } from '@/db/editions';
import { listMemberships, listRegions } from '@/db/regions';
import { forgetPerson } from '@/db/forgotten-accounts';
import { inTransaction } from '@/db/transaction';
import { collectOwn } from '@/lib/accounts/collect-own';
import { ok } from '@/lib/kernel/result';
import { newPlaceInput } from '@/lib/regions/amendment-schema';
import { beginPlace } from '@/lib/regions/begin-place';
import { carryOver } from '@/lib/regions/carry-over';
import { checkDraft } from '@/lib/regions/check-draft';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { keepEntry } from '@/lib/regions/keep-entry';
import { holdAmendment } from '@/lib/regions/hold-amendment';
import { listEditions } from '@/lib/regions/list-editions';
import { listOwnAmendments } from '@/lib/regions/list-own-amendments';
import { listWaiting } from '@/lib/regions/list-waiting';
import { openForReview } from '@/lib/regions/open-for-review';
import { readDraft } from '@/lib/regions/read-draft';
import { readEdition } from '@/lib/regions/read-edition';
import { releaseAmendment } from '@/lib/regions/release-amendment';
import { reopenAmendment } from '@/lib/regions/reopen-amendment';
import { sendAmendment } from '@/lib/regions/send-amendment';
import { sendBackAmendment } from '@/lib/regions/send-back-amendment';
import { takeBackAmendment } from '@/lib/regions/take-back-amendment';
import { withdrawAmendment } from '@/lib/regions/withdraw-amendment';
import { withdrawEdition } from '@/lib/regions/withdraw-edition';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { aDate } from '../builders/seed-sheets';
import { aLimit, aRule, aSheet, putWorld } from '../builders/small-world';
import { key, mailsOf, NOW } from './account-people';
import { aDraft, approve, idOf, readAll, send, someone, SUMMARY, value } from './amendment-people';

let author: ActorCtx;
let mo: ActorCtx;
let ada: ActorCtx;
let region: string;
let count = 0;
const LETTERS = 'abcdefghijklmnopqrstuvwxyz';
const PLACES = Array.from(LETTERS, (letter) => `x${letter}`);

beforeAll(async () => {
  await putWorld(PLACES.map((code) => aSheet(code)));
  [author, mo, ada] = [await someone('editor', 'Ida'), await someone('moderator', 'Mo'), await someone('moderator', 'Ada')];
});
beforeEach(() => {
  region = PLACES[count] ?? '';
  count += 1;
});

const withText =
  (text: string) =>
  (sheet: Sheet): Sheet => ({ ...sheet, text });
const withRule =
  (id: string, rest = {}) =>
  (sheet: Sheet): Sheet => ({
    ...sheet,
    rules: [...sheet.rules, aRule(id, { region: sheet.code, order: 30, ...rest })],
  });
const act = (id: string) => ({ key: key(), id }) as Parameters<typeof takeBackAmendment>[1];
const refusal = (kind: string, more = {}) => ({ ok: false, error: { kind, ...more } });
const REASON = 'The passage says something else.';
const sending = (id: Awaited<ReturnType<typeof aDraft>>, version: number) => ({ key: key(), id, version, summary: SUMMARY, intended: {} });

/** Sent, read and approved by one moderator. */
async function putInUse(mend: (sheet: Sheet) => Sheet): Promise<number> {
  const id = await aDraft(author, region, mend);
  const version = await send(author, id);
  await readAll(mo, id);
  const approved = value(await approve(mo, id, version));
  if (approved.outcome !== 'in-use') throw new Error(approved.outcome);
  return approved.edition;
}

test('REG-54 what is not ready stays with its author, each time with what is to be mended', async () => {
  const same = await aDraft(author, region, (sheet) => sheet);
  expect(await sendAmendment(author, sending(same, 1))).toEqual(refusal('nothing-changed'));
  expect(await sendAmendment(author, sending(same, 7))).toEqual(refusal('superseded', { version: 1 }));
  const unquoted = await aDraft(author, region, (sheet) => ({
    ...sheet,
    rules: sheet.rules.map((rule) => ({
      ...rule,
      says: 'Something else.',
      sources: rule.sources.map(({ passage: _, passageLang: __, ...cited }) => cited),
    })),
  }));
  expect(await sendAmendment(author, sending(unquoted, 1))).toEqual(refusal('no-passage', { claims: [`rules/${region}-name#0`] }));
  const faulty = await aDraft(author, region, withRule(`${region}-faulty`, { when: { term: 'nowhere' } }));
  const refused = await sendAmendment(author, sending(faulty, 1));
  const kinds = !refused.ok && refused.error.kind === 'findings' ? refused.error.errors.map(({ kind }) => kind) : [];
  expect(kinds).toContain('unknown-term');
  expect(value(await checkDraft(author, { id: faulty })).findings.map(({ kind }) => kind)).toEqual(expect.arrayContaining(kinds));
});

test('REG-54 a trial piece that comes out otherwise wants a word why', async () => {
  const trial = {
    id: 'mug',
    title: 'A mug',
    on: aDate('2026-12-01'),
    answers: { use: 'food' },
    declined: [],
    expected: { [`${region}-name`]: 'applies' as const },
  };
  await putInUse((sheet) => ({ ...sheet, trials: [trial] }));
  const when = { question: 'use', is: 'decorative' } as const;
  const id = await aDraft(author, region, (sheet) => ({
    ...sheet,
    rules: sheet.rules.map((rule) => ({ ...rule, when })),
    trials: [{ ...trial, expected: { [`${region}-name`]: 'does-not-apply' as const } }],
  }));
  expect(await sendAmendment(author, sending(id, 1))).toEqual(refusal('intended-missing', { trials: ['mug'] }));
  const intended = { mug: ' It never was for food. ', other: 'not a trial' };
  expect(value(await sendAmendment(author, { ...sending(id, 1), intended })).version).toBe(2);
  expect(value(await readDraft(author, { id })).amendment.intended).toEqual({ mug: 'It never was for food.' });
});

test('REG-51 REG-52 a limit takes two moderators, neither of them its author, each having read all of it', async () => {
  const moderator = await someone('moderator', 'Own');
  const id = await aDraft(moderator, region, (sheet) => ({ ...sheet, rules: [...sheet.rules, { ...aLimit(`${region}-pb`, 2), region }] }));
  const version = await send(moderator, id);
  expect(await approve(moderator, id, version)).toEqual(refusal('own-amendment'));
  expect(value(await openForReview(moderator, { id }))).toMatchObject({ isOwn: true, needed: 2, given: 0 });
  await readAll(ada, id);
  await readAll(mo, id);
  expect(value(await openForReview(mo, { id })).openElsewhere).toBeNull();
  expect(value(await approve(mo, id, version))).toEqual({ outcome: 'once-approved' });
  // What Ada read stays read: no word has changed. The version did, so her page has to be looked at again.
  expect(await approve(ada, id, version)).toEqual(refusal('already-decided', { state: 'once-approved', by: 'Mo' }));
  expect(await approve(mo, id, version + 1)).toEqual(refusal('same-moderator'));
  const review = value(await openForReview(ada, { id }));
  expect(review).toMatchObject({ given: 1, gaveIt: false, needed: 2, claims: [{ isRead: true }], openElsewhere: { by: 'Mo' } });
  expect(value(await approve(ada, id, version + 1))).toEqual({ outcome: 'in-use', region, edition: 2 });
  expect(value(await readDraft(moderator, { id })).decisions).toMatchObject([
    { kind: 'approve-once', by: 'Mo' },
    { kind: 'approve', by: 'Ada' },
  ]);
});

test('REG-52 a first approval counts no more once the amendment was taken back, held or changed', async () => {
  const id = await aDraft(author, region, (sheet) => ({ ...sheet, rules: [...sheet.rules, { ...aLimit(`${region}-pb`, 2), region }] }));
  let version = await send(author, id);
  await readAll(mo, id);
  value(await approve(mo, id, version));
  value(await takeBackAmendment(author, act(id)));
  version = await send(author, id, version + 2);
  await readAll(ada, id);
  expect(value(await approve(ada, id, version))).toEqual({ outcome: 'once-approved' });
  value(await holdAmendment(mo, { key: key(), id, version: version + 1, reason: REASON }));
  expect(await approve(mo, id, version + 2)).toEqual(refusal('already-decided', { state: 'held', by: 'Mo' }));
  value(await releaseAmendment(mo, { key: key(), id, version: version + 2 }));
  expect(value(await openForReview(ada, { id }))).toMatchObject({ given: 0, amendment: { state: 'sent' } });
  expect(value(await approve(ada, id, version + 3))).toEqual({ outcome: 'once-approved' });
});

test('REG-51 the whole way back: held, sent back, mended, withdrawn, taken up again', async () => {
  const id = await aDraft(author, region, withText('Better words.'));
  const version = await send(author, id);
  value(await holdAmendment(mo, { key: key(), id, version, reason: REASON }));
  expect(await sendBackAmendment(ada, { key: key(), id, version, reason: REASON })).toEqual(
    refusal('already-decided', { state: 'held', by: 'Mo' }),
  );
  value(await sendBackAmendment(ada, { key: key(), id, version: version + 1, reason: REASON }));
  expect((await mailsOf('amendment-decided')).map(({ body_text }) => body_text.includes(REASON))).toContain(true);
  value(await withdrawAmendment(author, act(id)));
  expect(await openForReview(mo, { id })).toEqual(refusal('not-found'));
  value(await reopenAmendment(author, act(id)));
  expect(await takeBackAmendment(author, act(id))).toEqual(refusal('already-decided', { state: 'draft', by: null }));
  expect(value(await readDraft(author, { id })).decisions).toMatchObject([
    { kind: 'hold', reason: REASON },
    { kind: 'send-back', reason: REASON, by: 'Ada' },
  ]);
});

test('REG-53 REG-55 what came into use since is never buried: the amendment goes back, is carried over and sent again', async () => {
  const mine = await aDraft(author, region, (sheet) => ({ ...withText('My words.')(sheet), gaps: ['Fees.'] }));
  const version = await send(author, mine);
  await putInUse((sheet) => ({ ...withText('Their words.')(sheet), languages: ['en', 'fr'] }));
  expect(value(await listWaiting(mo, { region }))).toMatchObject([{ id: mine, isStale: true }]);
  expect(value(await openForReview(mo, { id: mine })).stale).toMatchObject({ from: 1, to: 2 });
  expect(value(await approve(mo, mine, version))).toEqual({ outcome: 'refused-stale', to: 2 });
  expect(await findNumberInUse(db, region)).toBe(2);
  const draft = value(await readDraft(author, { id: mine }));
  expect(draft.amendment.state).toBe('refused-stale');
  expect(draft.stale?.rows.find(({ collides }) => collides)).toMatchObject({
    key: 'text text',
    was: 'An invented place.',
    now: 'Their words.',
    mine: 'My words.',
  });
  expect(await carryOver(author, { key: key(), id: mine, choices: {} })).toMatchObject(
    refusal('collisions', { collisions: [{ key: 'text text', item: 'text', field: 'text' }] }),
  );
  expect(value(await carryOver(author, { key: key(), id: mine, choices: { 'text text': 'mine' } }))).toEqual({ base: 2 });
  const carried = value(await readDraft(author, { id: mine }));
  expect(carried).toMatchObject({ amendment: { state: 'draft', baseNumber: 2 }, stale: null });
  expect(carried.document).toMatchObject({ text: 'My words.', languages: ['en', 'fr'], gaps: ['Fees.'] });
  expect(await carryOver(author, { key: key(), id: mine, choices: {} })).toEqual(refusal('not-stale'));
  const again = await send(author, mine, carried.amendment.version);
  expect(value(await approve(ada, mine, again))).toEqual({ outcome: 'in-use', region, edition: 3 });
});

test('REG-58 withdrawing brings back the last edition that was not withdrawn, with its layers and its name', async () => {
  const withdraw = (number: number) => withdrawEdition(mo, { key: key(), region, number, reason: 'It rests on a draft of the order.' });
  expect(await withdraw(1)).toEqual(refusal('nothing-before'));
  await putInUse(withText('Second.'));
  const id = await aDraft(author, region, (sheet) => ({
    ...sheet,
    name: 'Renamed',
    memberships: [{ parent: 'xa', from: null, to: null, except: [] }],
  }));
  const version = await send(author, id);
  value(await approve(mo, id, version));
  value(await approve(ada, id, version + 1));
  expect((await listMemberships(db)).get(region)).toHaveLength(1);
  expect(await withdraw(2)).toEqual(refusal('not-in-use', { inUse: 3 }));
  const once = key();
  const asked = { key: once, region, number: 3, reason: 'It rests on a draft of the order.' };
  expect(value(await withdrawEdition(mo, asked))).toEqual({ edition: 4 });
  expect(value(await withdrawEdition(mo, asked))).toEqual({ edition: 4 });
  expect(await findEdition(db, region, 4)).toMatchObject({ origin: 'withdrawal', sheet: { text: 'Second.', name: `Land of ${region}` } });
  expect((await listMemberships(db)).get(region)).toBeUndefined();
  expect((await listRegions(db)).find(({ code }) => code === region)?.name).toBe(`Land of ${region}`);
  const listed = value(await listEditions(mo, region)).map(({ number, withdrawn }) => [number, withdrawn]);
  const withdrawn = { reason: 'It rests on a draft of the order.', broughtBackAs: 4 };
  expect(listed).toEqual([
    [1, null],
    [2, null],
    [3, withdrawn],
    [4, null],
  ]);
  expect(value(await readEdition(mo, { code: region, number: 3 })).withdrawn).toEqual(withdrawn);
  expect(await withdraw(4)).toEqual(refusal('nothing-before'));
  expect(
    await db('day_book')
      .where({ subject_id: `${region}/3` })
      .pluck('did'),
  ).toEqual(['edition.withdraw']);
});

test('REG-51 S28 a draft is there for nobody but its author', async () => {
  const id = await aDraft(author, region, withText('CANARY'));
  const others = [await someone('editor'), mo, await someone('steward')];
  for (const other of others) {
    expect(await readDraft(other, { id })).toEqual(refusal('not-found'));
    expect(await checkDraft(other, { id })).toEqual(refusal('not-found'));
    expect(await keepEntry(other, { id, item: 'text', version: 0, values: { text: 'x' } })).toEqual(refusal('not-found'));
    expect(await withdrawAmendment(other, act(id))).toEqual(refusal('not-found'));
    expect(JSON.stringify(await listOwnAmendments(other))).not.toContain('CANARY');
  }
  for (const moderator of others.slice(1)) {
    expect(await openForReview(moderator, { id })).toEqual(refusal('not-found'));
    expect(await approve(moderator, id, 1)).toEqual(refusal('not-found'));
    expect(await holdAmendment(moderator, { key: key(), id, version: 1, reason: REASON })).toEqual(refusal('not-found'));
    expect(JSON.stringify(await listWaiting(moderator, { state: 'draft' }))).not.toContain('CANARY');
  }
  const second = await someone('editor');
  const own = await aDraft(second, region, withText('Other.'));
  const also = value(await readDraft(second, { id: own })).alsoOpen;
  expect(also).toMatchObject([{ region, state: 'draft', items: ['text'] }]);
  expect(JSON.stringify(also)).not.toContain('CANARY');
});

test('REG-59 the first sheet of a place is approved by two and stands among the places', async () => {
  const input = newPlaceInput.parse({
    key: key(),
    region: 'zz',
    name: 'Zed',
    kind: 'country',
    languages: 'en',
    parent: 'xa',
    text: 'New.',
  });
  const { id } = value(await beginPlace(author, input));
  expect(value(await beginPlace(author, input))).toEqual({ id });
  expect(value(await readDraft(author, { id }))).toMatchObject({ base: null, name: 'Zed', amendment: { baseNumber: null } });
  const version = await send(author, id);
  value(await approve(mo, id, version));
  expect(value(await approve(ada, id, version + 1))).toEqual({ outcome: 'in-use', region: 'zz', edition: 1 });
  expect((await listRegions(db)).find(({ code }) => code === 'zz')).toEqual({ code: 'zz', name: 'Zed', kind: 'country', edition: 1 });
  expect((await listMemberships(db)).get('zz')).toMatchObject([{ parent: 'xa' }]);
  expect(await beginPlace(author, { ...input, key: key() })).toEqual(refusal('has-sheet'));
});

test('REG-60 whoever leaves takes their drafts along; what they sent stays', async () => {
  const leaver = await someone('editor', 'Leaver');
  const draft = await aDraft(leaver, region, withText('Only mine.'));
  const sent = await aDraft(leaver, region, withText('For all.'));
  value(await keepEntry(leaver, { id: draft, item: 'text', version: 0, values: { text: 'half a sent' } }));
  await send(leaver, sent);
  const archive = await collectOwn({ db, now: NOW }, idOf(leaver), () => Promise.resolve());
  expect(archive['amendments']).toMatchObject([{ document: {} }, { document: {} }]);
  expect(JSON.stringify(archive['amendments'])).toContain('half a sent');
  await inTransaction(db, async (trx) => {
    await forgetPerson(trx, idOf(leaver));
    return ok(null);
  });
  expect(
    await db('amendments')
      .where({ author_id: idOf(leaver) })
      .pluck('id'),
  ).toEqual([sent]);
  expect(await db('amendment_entries').where({ amendment_id: draft }).pluck('item')).toEqual([]);
  expect(value(await openForReview(mo, { id: sent })).author).toBe('a former editor');
  value(await approve(mo, sent, 2));
});
