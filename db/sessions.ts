import type { Knex } from 'knex';
import type { AccountId } from '@/lib/access/domain/actor';
import type { FoundSession } from '@/lib/accounts/domain/session';
import { sessionLineRow, sessionRow, type SessionLine } from './rows/account-row';
import type { Trx } from './transaction';

export type NewSession = {
  /** SHA-256 of the id in the cookie. */
  readonly id: Buffer;
  readonly accountId: AccountId;
  readonly at: Date;
  readonly endsAt: Date;
  readonly freshAt: Date;
  readonly secondFactorAt: Date | null;
  readonly agent: string;
};

export async function insertSession(trx: Trx, session: NewSession): Promise<void> {
  await trx('sessions').insert({
    id: session.id,
    account_id: session.accountId,
    made_at: session.at,
    seen_at: session.at,
    ends_at: session.endsAt,
    fresh_at: session.freshAt,
    second_factor_at: session.secondFactorAt,
    agent: session.agent,
  });
}

/** The session if it is live at `now`, was seen after `idleSince`, and its account may still enter. */
export async function findSession(db: Knex, id: Buffer, now: Date, idleSince: Date): Promise<FoundSession | null> {
  const row: unknown = await db('sessions as s')
    .join('accounts as a', 'a.id', 's.account_id')
    .where('s.id', id)
    .where('s.ends_at', '>', now)
    .where('s.seen_at', '>', idleSince)
    .whereIn('a.state', ['unconfirmed', 'open', 'leaving'])
    .select('s.account_id', 'a.name', 'a.role', 'a.state', 'a.confirmed_at', 'a.second_factor_on_at')
    .select('s.second_factor_at', 's.fresh_at', 's.seen_at', 's.made_at', 's.ends_at')
    .first();
  return row === undefined ? null : sessionRow.parse(row);
}

/** Notes a visit, unless another request noted one meanwhile. */
export async function touchSession(db: Knex, id: Buffer, seenBefore: Date, now: Date): Promise<void> {
  await db('sessions').where({ id, seen_at: seenBefore }).update({ seen_at: now });
}

/** The password was typed again in this session. False when the session is over. */
export async function freshenSession(trx: Trx, id: Buffer, at: Date): Promise<boolean> {
  return (await trx('sessions').where({ id }).update({ fresh_at: at })) === 1;
}

type Live = { readonly accountId: AccountId; readonly now: Date; readonly idleSince: Date };

/** The live sessions of an account, the latest seen first. */
export async function listSessions(db: Knex, { accountId, now, idleSince }: Live, most: number): Promise<readonly SessionLine[]> {
  const rows: unknown[] = await db('sessions')
    .where({ account_id: accountId })
    .where('ends_at', '>', now)
    .where('seen_at', '>', idleSince)
    .orderBy('seen_at', 'desc')
    .limit(most)
    .select('id', 'agent', 'made_at', 'seen_at', 'ends_at');
  return rows.map((row) => sessionLineRow.parse(row));
}

export async function deleteSession(db: Knex, id: Buffer): Promise<number> {
  return db('sessions').where({ id }).del();
}

/** Ends one of an account's sessions; nobody else's. */
export async function deleteOwnSession(trx: Trx, accountId: AccountId, id: Buffer): Promise<number> {
  return trx('sessions').where({ id, account_id: accountId }).del();
}

/** Ends all sessions of an account, but for one that may stay. They are gone for the next request of each. */
export async function deleteSessionsOf(trx: Trx, accountId: AccountId, stays: Buffer | null = null): Promise<number> {
  const all = trx('sessions').where({ account_id: accountId });
  return stays === null ? all.del() : all.whereNot({ id: stays }).del();
}

/** Deletes up to `most` sessions that were over at `now` or idle since before `idleSince`. */
export async function deleteEndedSessions(db: Knex, now: Date, idleSince: Date, most: number): Promise<number> {
  const over = await db('sessions').where('ends_at', '<=', now).limit(most).del();
  return over + (await db('sessions').where('seen_at', '<=', idleSince).limit(most).del());
}
