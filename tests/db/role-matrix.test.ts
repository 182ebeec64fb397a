import { beforeAll, describe, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { READER, type AccountId, type AccountRole } from '@/lib/access/domain/actor';
import { NEEDS_CONFIRMED, POLICY, type Action } from '@/lib/access/domain/policy';
import { accountId } from '@/lib/accounts/schema';
import { newId } from '@/lib/server/new-id';
import { actorOf, sessionOf, type CurrentSession } from '@/lib/server/session';
import { DOORS, WHOSE, type Door, type Presser, type Whose } from '../builders/doors';
import { everyDoor } from '../builders/found-doors';
import { anAccount, aSession, ctxOf, NOW } from '../builders/people';

const WHO = ['anon', 'closed', 'unconfirmed', 'maker', 'editor', 'moderator', 'steward'] as const;
type Who = (typeof WHO)[number];

const ROLE: Readonly<Record<Exclude<Who, 'anon' | 'closed'>, AccountRole>> = {
  unconfirmed: 'maker',
  maker: 'maker',
  editor: 'editor',
  moderator: 'moderator',
  steward: 'steward',
};

/** Everything but counts and keys: what was tried leaves these as they were. */
const TABLES = [
  'accounts',
  'sessions',
  'account_tokens',
  'recovery_codes',
  'role_requests',
  'account_exports',
  'outbox',
  'jobs',
  'day_book',
  'doubts',
  'keepers',
];
const CHECKSUMS = 'CHECKSUM TABLE '.concat(TABLES.map(() => '??').join(', '));

const fingerprint = async (): Promise<string> => JSON.stringify((await db.raw<unknown[]>(CHECKSUMS, TABLES))[0]);

/** A session as it is of nobody: whoever has none cannot hand one over either. */
const NO_SESSION: CurrentSession = {
  id: Buffer.alloc(32),
  accountId: accountId.parse('0190a000-0000-7000-8000-000000000009'),
  name: '',
  role: 'maker',
  state: 'open',
  confirmed: true,
  secondFactorOn: false,
  secondFactorAt: null,
  freshAt: NOW,
  seenAt: NOW,
  madeAt: NOW,
  endsAt: NOW,
};

/** Signs somebody in for real: what they are is read back from the rows, as at each request. */
async function presser(who: Who): Promise<Presser> {
  if (who === 'anon') return { id: accountId.parse(newId(NOW)), hasAccount: false, ctx: ctxOf(READER), session: NO_SESSION };
  const state = who === 'closed' || who === 'unconfirmed' ? who : 'open';
  const id = await anAccount({ role: who === 'closed' ? 'steward' : ROLE[who], state });
  await db('accounts').where({ id }).update({ second_factor_on_at: NOW });
  const row = await aSession(id);
  await db('sessions').where({ id: row }).update({ second_factor_at: NOW });
  const session = await sessionOf({ db, now: NOW }, row);
  return { id, hasAccount: true, ctx: ctxOf(actorOf(session)), session: session ?? NO_SESSION };
}

/** What the policy's table says of somebody, put together here anew. Null: they may. */
function refusalFor(who: Who, asks: Action): string | null {
  if (POLICY[asks].includes('reader')) return null;
  if (who === 'anon' || who === 'closed') return 'sign-in';
  if (!POLICY[asks].includes(ROLE[who])) return 'not-allowed';
  return who === 'unconfirmed' && NEEDS_CONFIRMED.has(asks) ? 'confirm-first' : null;
}

type Asking = Exclude<Door, { readonly open: string }>;
const ASKING = Object.entries(DOORS).flatMap(([name, door]) => ('asks' in door ? [[name, door] as const] : []));

beforeAll(async () => {
  for (const table of ['role_requests', 'sessions', 'outbox', 'jobs', 'account_exports', 'account_tokens', 'recovery_codes'])
    await db(table).del();
  for (const table of ['request_keys', 'limits', 'accounts']) await db(table).del();
  await anAccount({ role: 'steward' }); // so that nobody is the last
});

async function recordOf(door: Asking, whose: Whose, own: Presser): Promise<string> {
  if (door.record === undefined || whose === 'none') return newId(NOW);
  const owner: AccountId = whose === 'own' ? own.id : await anAccount();
  return door.record(owner);
}

async function press(door: Asking, who: Who, whose: Whose): Promise<{ readonly end: string; readonly changed: boolean }> {
  const own = await presser(who);
  const record = await recordOf(door, whose === 'own' && !own.hasAccount ? 'other' : whose, own);
  const before = await fingerprint();
  const end = await door.press(own, record);
  return { end: end.ok ? 'ok' : end.error.kind, changed: (await fingerprint()) !== before };
}

test('ROL-12 S25 every server action and every handler has its row in the matrix, and no row is left over', () => {
  expect(everyDoor()).toEqual(Object.keys(DOORS).toSorted());
});

describe.each(ASKING)('ROL-1 S25 %s', (_, door) => {
  const targets = WHOSE.filter((whose) => door.ends[whose] !== undefined);

  test.each(WHO)('pressed by: %s', async (who) => {
    for (const whose of targets) {
      const refusal = refusalFor(who, door.asks);
      const expected = refusal ?? door.ends[whose] ?? '';
      const { end, changed } = await press(door, who, whose);
      expect([whose, end]).toEqual([whose, expected.replace(/, nothing$/, '')]);
      if (expected !== 'ok') expect([whose, 'unchanged', changed]).toEqual([whose, 'unchanged', false]);
    }
  });
});

test('ROL-1 S25 some door of the matrix opens to each role, and each door to somebody', () => {
  for (const [name, door] of ASKING) expect([name, WHO.some((who) => refusalFor(who, door.asks) === null)]).toEqual([name, true]);
  for (const who of ['maker', 'editor', 'moderator', 'steward'] as const) {
    expect(ASKING.some(([, door]) => refusalFor(who, door.asks) === null)).toBe(true);
  }
});
