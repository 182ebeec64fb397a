import { randomUUID } from 'node:crypto';
import { beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { listDayBook } from '@/db/day-book';
import { READER } from '@/lib/access/domain/actor';
import { answerDoubt } from '@/lib/regions/answer-doubt';
import { doubtInput } from '@/lib/regions/doubt-schema';
import { listDoubts, readDoubt, readRuleDoubts } from '@/lib/regions/list-doubts';
import { raiseDoubt } from '@/lib/regions/raise-doubt';
import { setAsideDoubt } from '@/lib/regions/set-aside-doubt';
import { takeDoubtUp } from '@/lib/regions/take-doubt-up';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { makeStamp } from '@/lib/server/form-stamp';
import { forgetCount } from '@/lib/server/limits';
import { ROUNDS } from '@/lib/server/work/rounds';
import { aDoubt, aDoubtedPlace } from '../builders/doubts';
import { ctxOf, NOW, someone } from '../builders/people';

const RULE = 'xd-name';
const DAY_MS = 24 * 60 * 60_000;
const SAID = 'The order was replaced last spring.';

const at = (from: string, now = NOW): ActorCtx => ({ ...ctxOf(READER), from, now });
const later = (ms: number): Date => new Date(NOW.getTime() + ms);

/** Sends the form as somebody would who took a minute over it, unless told otherwise. */
function raise(ctx: ActorCtx, over: { words?: string; rule?: string; drawnMsAgo?: number; stamp?: string } = {}) {
  const { words = SAID, rule = RULE, drawnMsAgo = 60_000 } = over;
  const stamp = over.stamp ?? makeStamp(rule, new Date(ctx.now.getTime() - drawnMsAgo));
  return raiseDoubt(ctx, doubtInput.parse({ key: randomUUID(), rule, words, elsewhere: '', link: '', homepage: '', stamp }));
}

const kept = (): Promise<readonly { words: string; trace: Buffer | null }[]> => db('doubts').select('words', 'trace');

beforeAll(aDoubtedPlace);
beforeEach(async () => {
  await db('doubts').del();
  await db('limits').del();
});

describe('raising a doubt', () => {
  test('REG-80 needs no account, and is about a rule in use', async () => {
    expect(await raise(at('192.0.2.1'))).toEqual({ ok: true, value: null });
    expect(await raise(at('192.0.2.1'), { rule: 'no-such-rule' })).toEqual({ ok: false, error: { kind: 'not-found' } });
    expect(await kept()).toHaveLength(1);
  });

  test.each([
    [0, 'too-quick'],
    [2999, 'too-quick'],
    [3000, null],
    [DAY_MS, null],
    [DAY_MS + 1, 'too-old'],
    [-1, 'too-old'],
  ])('REG-81 a form drawn %i ms ago: %s', async (drawnMsAgo, kind) => {
    const end = await raise(at('192.0.2.1'), { drawnMsAgo });
    expect(end.ok ? null : end.error.kind).toBe(kind);
    expect(await kept()).toHaveLength(kind === null ? 1 : 0);
  });

  test('REG-81 a stamp of another rule, a changed one, and none at all count as too old', async () => {
    const stamp = makeStamp(RULE, later(-60_000));
    for (const bad of ['', 'x', makeStamp('another-rule', later(-60_000)), `A${stamp.slice(1)}`, `${stamp.slice(0, -4)}AAAA`]) {
      expect(await raise(at('192.0.2.1'), { stamp: bad })).toEqual({ ok: false, error: { kind: 'too-old' } });
    }
  });

  test('REG-82 the same words from one address on one day are one doubt, also sent four times at once', async () => {
    await Promise.all(Array.from({ length: 4 }, () => raise(at('192.0.2.1'))));
    for (const ctx of [at('192.0.2.1'), at('192.0.2.1', later(13 * 60 * 60_000))]) expect((await raise(ctx)).ok).toBe(true);
    expect(await kept()).toHaveLength(1);
    await raise(at('192.0.2.2'));
    await raise(at('192.0.2.1', later(DAY_MS)));
    expect(await kept()).toHaveLength(3);
  });

  test('REG-83 one address raises five in an hour and twenty in a day; others are not held up', async () => {
    const ends: boolean[] = [];
    for (let number = 1; number <= 6; number += 1)
      ends.push((await raise(at('192.0.2.1'), { words: `Doubt of number ${String(number)}` })).ok);
    expect(ends).toEqual([true, true, true, true, true, false]);
    expect((await raise(at('192.0.2.2'))).ok).toBe(true);
    for (let number = 7; number <= 21; number += 1) {
      await forgetCount('doubt-hour', '192.0.2.1', at('192.0.2.1'));
      expect((await raise(at('192.0.2.1'), { words: `Doubt of number ${String(number)}` })).ok).toBe(true);
    }
    await forgetCount('doubt-hour', '192.0.2.1', at('192.0.2.1'));
    const end = await raise(at('192.0.2.1'), { words: 'One too many of them' });
    expect(end.ok ? null : end.error.kind).toBe('too-many');
  });

  test('REG-84 nothing is kept of the address, and after a day nothing that tells two doubts of one person together', async () => {
    await raise(at('192.0.2.1'));
    await raise(at('192.0.2.1'), { words: 'Another doubt of the same person' });
    const traces = (await kept()).map(({ trace }) => trace);
    expect(new Set(traces.map((trace) => trace?.toString('hex'))).size).toBe(2);
    expect(JSON.stringify(await db('doubts').select('*'))).not.toContain('192.0.2');
    await raise(at('192.0.2.9', later(DAY_MS + 1)), { words: 'A doubt of the next day' });
    const round = ROUNDS.find(({ name }) => name === 'doubt-traces');
    expect(await round?.walk({ db, now: later(DAY_MS + 1) })).toBe(2);
    expect((await kept()).filter(({ trace }) => trace !== null).map(({ words }) => words)).toEqual(['A doubt of the next day']);
  });

  test('REG-85 odd characters come back as they were typed, without those that nobody sees', async () => {
    await raise(at('192.0.2.1'), { words: "<b>'; drop table doubts; -- \u202e\u200b {{7*7}}\r\nü 漢 🏺 \ud800" });
    expect((await kept()).map(({ words }) => words)).toEqual(["<b>'; drop table doubts; --  {{7*7}}\nü 漢 🏺"]);
  });
});

describe('answering', () => {
  test('REG-86 S28 a doubt that waits or was put aside is told as a number at most, an answered one with who answered', async () => {
    const { ctx } = await someone('editor');
    const secret = 'kestrelglaze is not what this says';
    const [first, second] = [await aDoubt(secret), await aDoubt(`${secret} either`)];
    expect(await readRuleDoubts(ctx, RULE)).toEqual({ waiting: 2, answered: [] });
    await setAsideDoubt(ctx, { key: randomUUID(), id: second, reason: 'Advertising' });
    expect(await readRuleDoubts(ctx, RULE)).toEqual({ waiting: 1, answered: [] });
    await answerDoubt(ctx, { key: randomUUID(), id: first, answer: 'It does; see section 2.' });
    const told = await readRuleDoubts(ctx, RULE);
    expect(told).toMatchObject({ waiting: 0, answered: [{ words: secret, answer: 'It does; see section 2.', by: { kind: 'named' } }] });
  });

  test('REG-86 who is no editor any more is not named, a steward by the role', async () => {
    const [editor, steward] = [await someone('editor'), await someone('steward')];
    await answerDoubt(editor.ctx, { key: randomUUID(), id: await aDoubt(), answer: 'It still stands.' });
    await answerDoubt(steward.ctx, { key: randomUUID(), id: await aDoubt(), answer: 'It still stands.' });
    await db('accounts').where({ id: editor.id }).update({ role: 'maker' });
    const { answered } = await readRuleDoubts(editor.ctx, RULE);
    expect(answered.map(({ by }) => by.kind).toSorted()).toEqual(['former-editor', 'steward']);
  });

  test('REG-87 S31 twenty editors at once give one answer and one line of the day book, which has none of the words', async () => {
    const id = await aDoubt('kestrelglaze words of a reader');
    const editors = await Promise.all(Array.from({ length: 20 }, () => someone('editor')));
    const ends = await Promise.all(
      editors.map(({ ctx }, number) => answerDoubt(ctx, { key: randomUUID(), id, answer: `kestrelglaze answer ${String(number)}` })),
    );
    expect(ends.filter(({ ok }) => ok)).toHaveLength(1);
    expect(new Set(ends.flatMap((end) => (end.ok ? [] : [end.error.kind])))).toEqual(new Set(['doubt-moved-on']));
    const lines = await listDayBook(db, { subject: { kind: 'doubt', id }, limit: 10 });
    expect(lines).toHaveLength(1);
    expect(JSON.stringify(lines)).not.toContain('kestrelglaze');
    expect(lines[0]).toMatchObject({ did: 'doubt.answer', reason: null, details: { region: 'xd', rule: RULE } });
  });

  test('REG-87 F09 one form sent fifty times at once answers once, and each time says so', async () => {
    const { ctx } = await someone('editor');
    const input = { key: randomUUID(), id: await aDoubt(), answer: 'It still stands.' };
    const ends = await Promise.all(Array.from({ length: 50 }, () => answerDoubt(ctx, input)));
    expect(ends.filter((end) => !end.ok && end.error.kind !== 'busy')).toEqual([]);
    expect(ends.some(({ ok }) => ok)).toBe(true);
    expect(await listDayBook(db, { subject: { kind: 'doubt', id: input.id }, limit: 10 })).toHaveLength(1);
  });

  test('REG-88 what was put aside can be taken up and answered; what was answered can be neither', async () => {
    const { ctx } = await someone('editor');
    const id = await aDoubt();
    const press = { aside: () => setAsideDoubt(ctx, { key: randomUUID(), id, reason: 'Advertising' }) };
    const up = () => takeDoubtUp(ctx, { key: randomUUID(), id });
    expect((await up()).ok).toBe(false);
    expect((await press.aside()).ok).toBe(true);
    expect(await readDoubt(ctx, id)).toMatchObject({ value: { state: 'set-aside', asideWhy: 'Advertising', by: { kind: 'named' } } });
    expect((await up()).ok).toBe(true);
    expect(await readDoubt(ctx, id)).toMatchObject({ value: { state: 'waiting', asideWhy: null, by: null } });
    expect((await answerDoubt(ctx, { key: randomUUID(), id, answer: 'It still stands.' })).ok).toBe(true);
    expect([(await press.aside()).ok, (await up()).ok]).toEqual([false, false]);
  });

  test('REG-89 the desk lists those that wait, the oldest first, fifty at a time, and for editors alone', async () => {
    const { ctx } = await someone('editor');
    for (let number = 0; number < 51; number += 1) await aDoubt(`Doubt of number ${String(number)}`, later(number));
    const found = await listDoubts(ctx, {});
    if (!found.ok) throw new Error('refused');
    expect(found.value.doubts[0]?.words).toBe('Doubt of number 0');
    expect([found.value.doubts.length, found.value.counts.get('waiting')]).toEqual([50, 51]);
    const rest = await listDoubts(ctx, { after: found.value.next ?? undefined });
    expect(rest.ok ? rest.value.doubts.map(({ words }) => words) : null).toEqual(['Doubt of number 50']);
    const elsewhere = await listDoubts(ctx, { region: 'dk' });
    expect(elsewhere.ok ? elsewhere.value.doubts : null).toEqual([]);
    expect((await listDoubts((await someone('maker')).ctx, {})).ok).toBe(false);
    expect((await readDoubt(ctxOf(READER), found.value.doubts[0]?.id ?? '')).ok).toBe(false);
  });
});
