import { afterAll, beforeAll, expect, test } from 'vitest';
import { z } from 'zod';
import { db } from '@/db/connection';
import type { Result } from '@/lib/kernel/result';
import { approveAmendment } from '@/lib/regions/approve-amendment';
import type { AmendmentId } from '@/lib/regions/domain/amendment';
import { keepEntry } from '@/lib/regions/keep-entry';
import { saveItem } from '@/lib/regions/save-item';
import { sendAmendment } from '@/lib/regions/send-amendment';
import { sendBackAmendment } from '@/lib/regions/send-back-amendment';
import { withdrawEdition } from '@/lib/regions/withdraw-edition';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { aSheet, putWorld } from '../builders/small-world';
import { key } from './account-people';
import { aDraft, approve, send, someone, SUMMARY, through, value } from './amendment-people';
import { FAULTS, openFaultyPool, type FaultyPool } from './faulty';

let author: ActorCtx;
let mo: ActorCtx;
let pool: FaultyPool;
beforeAll(async () => {
  await putWorld([aSheet('xa')]);
  [author, mo] = [await someone('editor', 'Ida'), await someone('moderator', 'Mo')];
  pool = openFaultyPool();
});
afterAll(() => pool.db.destroy());

type Subject = { readonly id: AmendmentId; readonly version: number };
type Act = (db: ActorCtx['db'], subject: Subject, key: string) => Promise<Result<unknown, unknown>>;

let drafts = 0;
async function drafted(): Promise<Subject> {
  drafts += 1;
  const text = `Draft ${String(drafts)}.`;
  return { id: await aDraft(author, 'xa', (sheet) => ({ ...sheet, text })), version: 1 };
}
async function sent(): Promise<Subject> {
  const { id } = await drafted();
  return { id, version: await send(author, id) };
}
/** In use, to be taken out of use again. */
async function used(): Promise<Subject> {
  const { id, version } = await sent();
  const approved = value(await approve(mo, id, version));
  return { id, version: approved.outcome === 'in-use' ? approved.edition : 0 };
}

const countedRow = z.object({ rows: z.coerce.number() });

/** What all of an act has to be true together: its rows, counted. */
async function stateOf({ id }: Subject): Promise<readonly number[]> {
  const count = async (table: string, where: object = {}): Promise<number> => {
    const counted: unknown = await db(table).where(where).count({ rows: '*' }).first();
    return countedRow.parse(counted).rows;
  };
  const version: unknown = await db('amendments').where({ id }).pluck('version');
  const tables = ['editions', 'sheets', 'request_keys', 'outbox', 'day_book', 'edition_withdrawals', 'amendment_entries'];
  const own = await count('amendment_decisions', { amendment_id: id });
  const counted = await Promise.all(tables.map((table) => count(table)));
  const inUse: unknown = await db('sheets').where({ region: 'xa' }).pluck('edition_number');
  return [Number(String(version)), Number(String(inUse)), own, ...counted];
}

const REASON = 'One word is missing.';
const acts: readonly (readonly [name: string, before: () => Promise<Subject>, act: Act])[] = [
  [
    'keeping what was typed',
    drafted,
    (faulty, { id }) => keepEntry(through(author, faulty), { id, item: 'text', version: 0, values: { text: `Typed, ${id}` } }),
  ],
  [
    'saving an item',
    drafted,
    (faulty, { id }, once) =>
      saveItem(through(author, faulty), { key: once, id, item: 'text', version: 0, values: { text: `Saved, ${id}` } }),
  ],
  [
    'sending',
    drafted,
    (faulty, { id, version }, once) => sendAmendment(through(author, faulty), { key: once, id, version, summary: SUMMARY, intended: {} }),
  ],
  [
    'sending back',
    sent,
    (faulty, { id, version }, once) => sendBackAmendment(through(mo, faulty), { key: once, id, version, reason: REASON }),
  ],
  ['approving', sent, (faulty, { id, version }, once) => approveAmendment(through(mo, faulty), { key: once, id, version })],
  [
    'withdrawing an edition',
    used,
    (faulty, { version }, once) => withdrawEdition(through(mo, faulty), { key: once, region: 'xa', number: version, reason: REASON }),
  ],
];

/** How many statements the act takes, and what it changes. */
async function measure(
  before: () => Promise<Subject>,
  act: Act,
): Promise<{ readonly statements: number; readonly change: readonly number[] }> {
  const subject = await before();
  const was = await stateOf(subject);
  pool.plan('rolled-back', () => false);
  value(await act(pool.db, subject, key()));
  const statements = pool.seen();
  return { statements, change: (await stateOf(subject)).map((number, place) => number - (was[place] ?? 0)) };
}

test.each(acts.flatMap(([name, before, act]) => FAULTS.map((fault) => [name, fault, before, act] as const)))(
  'REG-56 F03 %s: whichever statement is %s, it is done wholly or not at all, no yes is untrue, and the key brings it to its end',
  async (_, fault, before, act) => {
    const { statements, change } = await measure(before, act);
    expect(statements).toBeGreaterThanOrEqual(5);
    for (let failing = 1; failing <= statements; failing += 1) {
      const said = `statement ${String(failing)} of ${String(statements)}`;
      const subject = await before();
      const was = await stateOf(subject);
      const after = was.map((number, place) => number + (change[place] ?? 0));
      const once = key();
      pool.plan(fault, (statement) => statement === failing);
      // What is read before the transaction is not tried again: the page says "come back", and nothing has happened.
      const first = await act(pool.db, subject, once).catch((error: unknown) => error);
      const isYes = typeof first === 'object' && first !== null && 'ok' in first && first.ok === true;
      expect([was, after], said).toContainEqual(await stateOf(subject));
      if (isYes) expect(await stateOf(subject), said).toEqual(after);
      pool.plan(fault, () => false);
      const again = await act(pool.db, subject, once);
      expect(again.ok, `${said} ${JSON.stringify(again)}`).toBe(true);
      if (isYes) expect(again, said).toEqual(first);
      expect(await stateOf(subject), said).toEqual(after);
    }
  },
  120_000,
);
