import { beforeAll, beforeEach, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { listWishes } from '@/lib/regions/list-wishes';
import { wishForRegion, type WishCtx } from '@/lib/regions/wish-for-region';
import { foundSheets } from './founding';

const at = (from: string, now = '2026-12-01T10:00:00Z'): WishCtx => ({ db, now: new Date(now), from });
const ask = (region: string, ctx: WishCtx) => wishForRegion(ctx, { region });
const counted = async (): Promise<readonly string[]> =>
  (await listWishes(at(''))).filter(({ count }) => count > 0).map(({ code, count }) => `${code} ${String(count)}`);

beforeAll(foundSheets);
beforeEach(async () => {
  await db('region_wishes').del();
  await db('limits').del();
});

test('REG-47 one address counts once a day for each country, another address and another day again', async () => {
  for (const ctx of [at('192.0.2.1'), at('192.0.2.1'), at('192.0.2.1', '2026-12-01T23:59:59Z')])
    expect((await ask('eg', ctx)).ok).toBe(true);
  expect(await counted()).toEqual(['eg 1']);
  await ask('eg', at('192.0.2.2'));
  await ask('eg', at('192.0.2.1', '2026-12-02T00:00:00Z'));
  await ask('ke', at('192.0.2.1'));
  expect(await counted()).toEqual(['eg 3', 'ke 1']);
});

test('REG-47 wishes sent at once by one address are one', async () => {
  await Promise.all(Array.from({ length: 8 }, () => ask('eg', at('192.0.2.1'))));
  expect(await counted()).toEqual(['eg 1']);
});

test('REG-47 what is kept names nobody, and differs by country and by day', async () => {
  await ask('eg', at('192.0.2.1'));
  await ask('ke', at('192.0.2.1'));
  await ask('eg', at('192.0.2.1', '2026-12-02T10:00:00Z'));
  const rows: readonly { asker: Buffer }[] = await db('region_wishes').select('asker');
  expect(new Set(rows.map(({ asker }) => asker.toString('hex'))).size).toBe(3);
  expect(rows.filter(({ asker }) => asker.toString('latin1').includes('192.0.2.1') || asker.length !== 32)).toEqual([]);
});

test('REG-43 only a country without a sheet can be asked for', async () => {
  expect(await ask('dk', at('192.0.2.1'))).toEqual({ ok: false, error: { kind: 'has-sheet' } });
  expect(await ask('zz', at('192.0.2.1'))).toEqual({ ok: false, error: { kind: 'no-such-country' } });
  expect(await ask('us-ca', at('192.0.2.1'))).toEqual({ ok: false, error: { kind: 'no-such-country' } });
  expect(await counted()).toEqual([]);
});

test('REG-47 an address that asks for everything is stopped for an hour, others are not', async () => {
  const without = (await listWishes(at(''))).slice(0, 21).map(({ code }) => code);
  const answers = [];
  for (const code of without) answers.push((await ask(code, at('192.0.2.1'))).ok);
  expect(answers.filter(Boolean)).toHaveLength(20);
  expect(answers.at(-1)).toBe(false);
  expect((await ask('eg', at('192.0.2.2'))).ok).toBe(true);
});
