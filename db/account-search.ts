import type { Knex } from 'knex';
import { z } from 'zod';
import type { AccountId, AccountRole, Role } from '@/lib/access/domain/actor';
import type { Account } from '@/lib/accounts/domain/account';
import { accountRow } from './rows/account-row';
import { namedRow, type NamedAccount } from './rows/account-search-row';

const COLUMNS = ['id', 'email', 'name', 'role', 'state', 'version', 'made_at', 'confirmed_at', 'leaving_at'];
const SETTINGS = ['second_factor_on_at', 'region', 'currency', 'units', 'is_demo'];

export type AccountFilter = {
  /** A part of the name or of the address. */
  readonly words?: string | undefined;
  readonly role?: AccountRole | undefined;
  /** For the next page: the id of the last account of this one. */
  readonly after?: AccountId | undefined;
  readonly limit: number;
};

/** Accounts that meet all of the filter, the newest first. Those of people who left are not among them. */
export async function searchAccounts(db: Knex, { words, role, after, limit }: AccountFilter): Promise<readonly Account[]> {
  const query = db('accounts').whereNot({ state: 'gone' }).orderBy('id', 'desc').limit(limit).select(COLUMNS).select(SETTINGS);
  if (role !== undefined) void query.where({ role });
  if (after !== undefined) void query.where('id', '<', after);
  if (words !== undefined && words !== '') {
    const part = `%${words.replace(/[\\%_]/g, '\\$&')}%`;
    void query.where((either) => {
      void either.where('name', 'like', part).orWhere('email', 'like', part.toLowerCase());
    });
  }
  const rows: unknown = await query;
  return z.array(accountRow).parse(rows);
}

/** Name, role and state of these accounts; those that are not there are left out. */
export async function listNamed(db: Knex, ids: readonly string[]): Promise<readonly NamedAccount[]> {
  if (ids.length === 0) return [];
  const rows: unknown = await db('accounts')
    .whereIn('id', [...ids])
    .select('id', 'name', 'role', 'state');
  return z.array(namedRow).parse(rows);
}

/** Ids of those with one of these roles who can sign in. */
export async function listJudges(db: Knex, roles: readonly Role[]): Promise<readonly AccountId[]> {
  const rows: unknown = await db('accounts')
    .whereIn('role', [...roles])
    .where({ state: 'open' })
    .limit(10_000)
    .select('id', 'name', 'role', 'state');
  return z
    .array(namedRow)
    .parse(rows)
    .map(({ id }) => id);
}
