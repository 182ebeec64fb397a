import { setTimeout as wait } from 'node:timers/promises';
import knex, { type Knex } from 'knex';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { insertAccount } from '@/db/accounts';
import { connectionTo, knexSettings } from '@/db/knex-settings';
import { migrate } from '@/db/migrator';
import { inTransaction } from '@/db/transaction';
import type { AccountRole } from '@/lib/access/domain/actor';
import { accountId } from '@/lib/accounts/schema';
import { verifyDayBook } from '@/lib/day-book/verify-day-book';
import { ok, type Result } from '@/lib/kernel/result';
import { approveAmendment } from '@/lib/regions/approve-amendment';
import { beginAmendment } from '@/lib/regions/begin-amendment';
import { saveItem } from '@/lib/regions/save-item';
import { sendAmendment } from '@/lib/regions/send-amendment';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { fateOf } from '@/lib/server/database-errors';
import { newId } from '@/lib/server/new-id';
import { openOwnDatabase, type OwnDatabase } from '../builders/own-database';
import { aSheet, putWorld } from '../builders/small-world';
import { key, later, SITE } from './account-people';

/** Milliseconds between kills. Drawn once; the moment of a kill within a transaction is chance enough. */
const LIVES_MS = [1500, 900, 2100, 1300, 1100];
const REGIONS = ['xa', 'xb', 'xc', 'xd', 'xe', 'xf', 'xg', 'xh'];

let server: OwnDatabase;
let pool: Knex;
beforeAll(async () => {
  server = await openOwnDatabase();
  const owner = knex({ ...knexSettings({ most: 2 }), connection: connectionTo(server.ownerUrl) });
  await migrate(owner);
  await putWorld(
    REGIONS.map((code) => aSheet(code)),
    owner,
  );
  await owner.destroy();
  pool = knex({ ...knexSettings({ statementSeconds: 5 }), connection: connectionTo(server.ownerUrl) });
}, 60_000);
afterAll(async () => {
  await pool.destroy();
  await server.end();
});

async function someone(role: AccountRole): Promise<ActorCtx> {
  const now = new Date();
  const id = accountId.parse(newId(now));
  const account = { id, email: `${id}@example.test`, name: role, passwordHash: null, role, state: 'open', at: now } as const;
  await inTransaction(pool, async (trx) => {
    await insertAccount(trx, account);
    return ok(null);
  });
  const actor = { kind: 'account', id, role, name: role, confirmed: true, secondFactor: 'given', freshUntil: later(600_000) } as const;
  return { db: pool, now, actor, from: '192.0.2.1', site: SITE };
}

/** Does one act, and the same one again for as long as it hears "come back", as a person would. */
async function untilHeard<T, E>(act: (once: string) => Promise<Result<T, E>>): Promise<T> {
  const once = key();
  for (;;) {
    try {
      const answer = await act(once);
      if (answer.ok) return answer.value;
      if (JSON.stringify(answer.error) !== '{"kind":"busy"}') throw new Error(JSON.stringify(answer.error));
    } catch (error) {
      const isAway = fateOf(error) !== 'broken' || (error instanceof Error && error.name === 'Unavailable');
      if (!isAway) throw error;
    }
  }
}

/** One region's amendments, one after the other; answers with the texts that were said to be in use. */
async function workOn(
  region: string,
  people: readonly [author: ActorCtx, moderator: ActorCtx],
  isOn: () => boolean,
): Promise<readonly string[]> {
  const [author, moderator] = people;
  const said: string[] = [];
  for (let round = 0; isOn(); round += 1) {
    const text = `${region} ${String(round)}`;
    const { id } = await untilHeard((once) => beginAmendment(author, { key: once, region }));
    await untilHeard((once) => saveItem(author, { key: once, id, item: 'text', version: 0, values: { text } }));
    const sending = { id, version: 2, summary: 'Other words for it.', intended: {} };
    const { version } = await untilHeard((once) => sendAmendment(author, { key: once, ...sending }));
    const approved = await untilHeard((once) => approveAmendment(moderator, { key: once, id, version }));
    expect(approved).toEqual({ outcome: 'in-use', region, edition: said.length + 2 });
    said.push(text);
  }
  return said;
}

const textsOf = async (region: string): Promise<readonly unknown[]> => {
  const documents: unknown[] = await pool('editions').where({ region }).orderBy('number').pluck('document');
  return documents.map((document) => (JSON.parse(String(document)) as { readonly text: string }).text);
};

test('REG-56 F01 the database is killed five times under saving and approving: what was said is there, once, and nothing is torn', async () => {
  const people = [await someone('editor'), await someone('moderator')] as const;
  let isOn = true;
  const clients = REGIONS.map((region) => workOn(region, people, () => isOn));
  const kill = async (): Promise<void> => {
    for (const lifeMs of LIVES_MS) {
      await wait(lifeMs);
      await server.kill();
      await server.start();
    }
    await wait(1000);
    isOn = false;
  };
  const [, ...said] = await Promise.all([kill(), ...clients]);
  let editions = 0;
  for (const [place, region] of REGIONS.entries()) {
    const texts = said[place] ?? [];
    editions += texts.length;
    expect(await textsOf(region), region).toEqual(['An invented place.', ...texts]);
  }
  const rows = async (table: string, where = {}): Promise<number> => (await pool(table).where(where).select(pool.raw('1'))).length;
  expect(await rows('amendment_decisions')).toBe(editions);
  expect(await rows('outbox')).toBe(editions);
  expect(await rows('day_book', { did: 'amendment.approve' })).toBe(editions);
  expect(await rows('amendment_entries')).toBe(0);
  expect(await verifyDayBook({ db: pool, now: new Date() })).toEqual(ok({ lines: 2 * editions }));
  console.log(`F01: ${String(LIVES_MS.length)} kills, ${String(editions)} editions`);
  expect(editions).toBeGreaterThan(5);
}, 120_000);
