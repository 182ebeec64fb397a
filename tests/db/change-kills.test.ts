import { setTimeout as wait } from 'node:timers/promises';
import knex, { type Knex } from 'knex';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { connectionTo, knexSettings } from '@/db/knex-settings';
import { migrate } from '@/db/migrator';
import type { Trx } from '@/db/transaction';
import { ok, type Result } from '@/lib/kernel/result';
import { change } from '@/lib/server/change';
import { openOwnDatabase, type OwnDatabase } from '../builders/own-database';

/** Milliseconds between kills. Drawn once; the moment of a kill within a transaction is chance enough. */
const LIVES_MS = [1700, 900, 2300, 1300];
const CLIENTS = 8;

let server: OwnDatabase;
let pool: Knex;
beforeAll(async () => {
  server = await openOwnDatabase();
  const owner = knex({ ...knexSettings({ most: 2 }), connection: connectionTo(server.ownerUrl) });
  await migrate(owner);
  await owner('limits').insert({ key: 'tests', points: 0 });
  await owner.destroy();
  pool = knex({ ...knexSettings({ statementSeconds: 5 }), connection: connectionTo(server.ownerUrl) });
}, 60_000);
afterAll(async () => {
  await pool.destroy();
  await server.end();
});

async function count(trx: Trx): Promise<Result<null, never>> {
  await trx('limits').where({ key: 'tests' }).increment('points', 1);
  return ok(null);
}

type Heard = { yes: number; comeBack: number; other: unknown[] };

/** Sends a form, and the same one again for as long as it hears "come back", as a person would. */
async function sendUntilHeard(key: string, heard: Heard): Promise<void> {
  for (;;) {
    try {
      const answer = await change({ db: pool, now: new Date() }, { key, who: 'guest', act: 'tests.count', input: key }, count);
      if (answer.ok) heard.yes += 1;
      else heard.other.push(answer.error);
      return;
    } catch (error) {
      if (!(error instanceof Error) || error.name !== 'Unavailable') {
        heard.other.push(error);
        return;
      }
      heard.comeBack += 1;
    }
  }
}

test('SRV-1 F02 the database is killed four times under load: what was answered yes is there, once, and nothing else', async () => {
  const heard: Heard = { yes: 0, comeBack: 0, other: [] };
  let isOn = true;
  const client = async (name: number): Promise<void> => {
    for (let form = 0; isOn; form += 1) await sendUntilHeard(`${String(name)}-${String(form)}`, heard);
  };
  const clients = Array.from({ length: CLIENTS }, (_, name) => client(name));
  for (const lifeMs of LIVES_MS) {
    await wait(lifeMs);
    await server.kill();
    await server.start();
  }
  isOn = false;
  await Promise.all(clients);
  const points: unknown = await pool('limits').where({ key: 'tests' }).pluck('points');
  const keys = (await pool('request_keys').pluck('id')).length;
  console.log(`${String(LIVES_MS.length)} kills, ${String(heard.yes)} changes, ${String(heard.comeBack)} times "come back"`);
  expect(heard.other).toEqual([]);
  expect(heard.yes).toBeGreaterThan(50);
  expect({ points: Number(String(points)), keys }).toEqual({ points: heard.yes, keys: heard.yes });
}, 90_000);
