import { db } from '@/db/connection';
import { insertAccount, closeAccount, startLeaving } from '@/db/accounts';
import { insertSession } from '@/db/sessions';
import { inTransaction } from '@/db/transaction';
import { READER, type AccountId, type AccountRole, type Actor, type SignedIn } from '@/lib/access/domain/actor';
import type { AccountState } from '@/lib/accounts/domain/account';
import { accountId } from '@/lib/accounts/schema';
import { ok } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { newId } from '@/lib/server/new-id';
import { newSession } from '@/lib/server/session';

/** The instant of these tests. */
export const NOW = new Date('2026-12-01T10:00:00Z');
const DAY_MS = 86_400_000;

let count = 0;

export type Told = {
  readonly role?: AccountRole;
  readonly state?: Exclude<AccountState, 'gone'>;
  readonly name?: string;
  readonly email?: string;
};

/** Puts an account in; an open maker with a name of their own unless told otherwise. */
export async function anAccount(told: Told = {}): Promise<AccountId> {
  count += 1;
  const {
    role = 'maker',
    state = 'open',
    name = `Potter ${String(count)}`,
    email = `potter${String(count)}-${newId(NOW)}@example.test`,
  } = told;
  const id = accountId.parse(newId(NOW));
  await inTransaction(db, async (trx) => {
    await insertAccount(trx, { id, email, name, passwordHash: null, role, state: state === 'unconfirmed' ? state : 'open', at: NOW });
    if (state === 'closed') await closeAccount(trx, id);
    if (state === 'leaving') await startLeaving(trx, id, new Date(NOW.getTime() + DAY_MS));
    return ok(null);
  });
  return id;
}

/** Signs an account in; answers with the id of the session's row. */
export async function aSession(of: AccountId): Promise<Buffer> {
  const { row } = newSession({ accountId: of, now: NOW, agent: 'tests', freshAt: NOW });
  await inTransaction(db, async (trx) => {
    await insertSession(trx, row);
    return ok(null);
  });
  return row.id;
}

/** Somebody signed in who has given everything that can be asked: confirmed, second step, password just typed. */
export const actorOf = (id: AccountId, role: AccountRole, over: Partial<SignedIn> = {}): SignedIn => ({
  kind: 'account',
  id,
  role,
  name: 'Potter',
  confirmed: true,
  secondFactor: 'given',
  freshUntil: new Date(NOW.getTime() + 60_000),
  ...over,
});

export const ctxOf = (actor: Actor = READER): ActorCtx => ({
  db,
  now: NOW,
  actor,
  from: '192.0.2.1',
  site: 'http://footring.example.test',
});

/** An account of that role, and what its use cases get. */
export async function someone(
  role: AccountRole,
  over: Partial<SignedIn> = {},
): Promise<{ readonly id: AccountId; readonly ctx: ActorCtx }> {
  const id = await anAccount({ role });
  return { id, ctx: ctxOf(actorOf(id, role, over)) };
}
