import { randomUUID } from 'node:crypto';
import { beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { listDayBook } from '@/db/day-book';
import { forgetPerson } from '@/db/forgotten-accounts';
import { inTransaction } from '@/db/transaction';
import { READER, type AccountId } from '@/lib/access/domain/actor';
import { collectOwn } from '@/lib/accounts/collect-own';
import { readDayBook } from '@/lib/day-book/read-day-book';
import { ok } from '@/lib/kernel/result';
import { becomeKeeper } from '@/lib/regions/become-keeper';
import { listKeepers } from '@/lib/regions/list-keepers';
import { listLookAgain } from '@/lib/regions/list-look-again';
import { stopKeeping } from '@/lib/regions/stop-keeping';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { putSheet } from '../builders/doubts';
import { ctxOf, someone } from '../builders/people';
import { aDate } from '../builders/seed-sheets';
import { aRule, aSheet } from '../builders/small-world';

const become = (ctx: ActorCtx, region = 'xk') => becomeKeeper(ctx, { key: randomUUID(), region });
const stop = (ctx: ActorCtx, region = 'xk') => stopKeeping(ctx, { key: randomUUID(), region });
const linesOf = async (id: AccountId): Promise<readonly string[]> =>
  (await listDayBook(db, { actorId: id, limit: 100 })).map(
    ({ did, subject, details }) => `${did} ${subject.id} ${JSON.stringify(details)}`,
  );

/** Today is 1 December 2026. */
const DUE = [
  ['xk-over', '2026-11-30'],
  ['xk-today', '2026-12-01'],
  ['xk-edge', '2027-01-30'],
  ['xk-far', '2027-01-31'],
] as const;

beforeAll(async () => {
  const due = DUE.map(([id, day]) => aRule(id, { region: 'xk', lookAgainBy: aDate(day) }));
  const ended = aRule('xk-ended', { region: 'xk', lookAgainBy: aDate('2026-01-01'), to: aDate('2026-12-01') });
  await putSheet(aSheet('xk', { rules: [...due.toReversed(), ended] }));
  const many = Array.from({ length: 150 }, (_, number) =>
    aRule(`xm-${String(number)}`, { region: 'xm', lookAgainBy: aDate('2026-06-01') }),
  );
  await putSheet(aSheet('xm', { rules: many }));
});
beforeEach(async () => {
  await db('keepers').del();
});

describe('keepers', () => {
  test('REG-90 S31 pressed eight times at once one is a keeper once, with one line of the day book, and so for stopping', async () => {
    const { id, ctx } = await someone('editor');
    const took = await Promise.all(Array.from({ length: 8 }, () => become(ctx)));
    expect(took.every((end) => end.ok)).toBe(true);
    expect((await listKeepers(ctx)).map(({ region }) => region)).toEqual(['xk']);
    expect(await linesOf(id)).toEqual(['keeper.take-on xk {"region":"xk"}']);
    const gave = await Promise.all(Array.from({ length: 8 }, () => stop(ctx)));
    expect(gave.every((end) => end.ok)).toBe(true);
    expect(await listKeepers(ctx)).toEqual([]);
    expect(await linesOf(id)).toHaveLength(2);
  });

  test('REG-90 of a place without a sheet there is no keeper', async () => {
    const { ctx } = await someone('editor');
    expect(await become(ctx, 'zz')).toEqual({ ok: false, error: { kind: 'not-found' } });
  });

  test('REG-90 who was made a maker meanwhile does not become a keeper', async () => {
    const { id, ctx } = await someone('editor');
    await db('accounts').where({ id }).update({ role: 'maker' });
    expect(await become(ctx)).toEqual({ ok: false, error: { kind: 'not-allowed' } });
    expect(await listKeepers(ctx)).toEqual([]);
  });

  test('REG-91 editors and moderators are named, stewards by their role, and who is no editor any more not at all', async () => {
    const people = [await someone('editor'), await someone('moderator'), await someone('steward'), await someone('editor')];
    for (const { ctx } of people) expect((await become(ctx)).ok).toBe(true);
    await db('accounts')
      .where({ id: people[3]?.id ?? '' })
      .update({ role: 'maker' });
    const kinds = (await listKeepers(ctxOf(READER), 'xk')).map(({ said }) => said.kind);
    expect(kinds.toSorted()).toEqual(['named', 'named', 'steward']);
  });

  test('REG-91 S57 the archive lists the sheets one keeps, and forgetting somebody takes them off', async () => {
    const { id, ctx } = await someone('editor');
    await become(ctx);
    expect((await collectOwn(ctx, id, () => Promise.resolve()))['sheets-you-keep']).toMatchObject([{ region: 'xk' }]);
    await inTransaction(db, async (trx) => {
      await forgetPerson(trx, id);
      return ok(null);
    });
    expect(await db('keepers').select('*')).toEqual([]);
  });
});

describe('the look-again list', () => {
  const idsOf = async (ctx: ActorCtx, query: Parameters<typeof listLookAgain>[1]): Promise<readonly string[]> => {
    const found = await listLookAgain(ctx, query);
    return found.ok ? found.value.rules.map(({ id }) => id) : [found.error.kind];
  };

  test('REG-92 holds every rule that is past its day or comes to it within sixty days, the longest overdue first, none that ended', async () => {
    const { ctx } = await someone('editor');
    expect(await idsOf(ctx, { region: 'xk' })).toEqual(['xk-over', 'xk-today', 'xk-edge']);
    expect(await idsOf(ctx, { region: 'xk', days: 0 })).toEqual(['xk-over', 'xk-today']);
    expect(await idsOf(ctx, { region: 'xk', days: 61 })).toEqual(DUE.map(([id]) => id));
    const found = await listLookAgain(ctx, { region: 'xk' });
    expect(found).toMatchObject({ ok: true, value: { count: 3, overdue: 1, days: 60 } });
    expect(await idsOf((await someone('maker')).ctx, {})).toEqual(['not-allowed']);
  });

  test('REG-92 is narrowed to what one keeps oneself, what somebody keeps, and what nobody does', async () => {
    const [one, other] = [await someone('editor'), await someone('editor')];
    await become(one.ctx);
    expect(await idsOf(one.ctx, { keeper: 'me' })).toEqual(['xk-over', 'xk-today', 'xk-edge']);
    expect(await idsOf(other.ctx, { keeper: one.id, days: 0 })).toEqual(['xk-over', 'xk-today']);
    expect(await idsOf(other.ctx, { keeper: 'me' })).toEqual([]);
    expect((await idsOf(other.ctx, { keeper: 'nobody' })).every((id) => id.startsWith('xm-'))).toBe(true);
  });

  test('REG-92 shows a hundred at a time, each rule once over all pages; a page too far is the last one', async () => {
    const { ctx } = await someone('editor');
    const [first, second] = [await idsOf(ctx, {}), await idsOf(ctx, { page: 2 })];
    expect([first.length, second.length]).toEqual([100, 53]);
    expect(new Set([...first, ...second]).size).toBe(153);
    expect(await idsOf(ctx, { page: 9999 })).toEqual(second);
  });
});

test('DAY-6 lines are found by the place they are about, with the sheets they lead to', async () => {
  const { ctx } = await someone('editor');
  await become(ctx, 'xk');
  await become(ctx, 'xm');
  const page = await readDayBook(ctx, { region: 'xm' });
  expect(new Set(page.lines.map(({ region }) => region))).toEqual(new Set(['xm']));
  expect(page.places.map(({ code }) => code)).toEqual(['xk', 'xm']);
  expect((await readDayBook(ctx, { region: 'zz' })).lines).toEqual([]);
});
