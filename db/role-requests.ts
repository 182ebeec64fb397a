import type { Knex } from 'knex';
import type { AccountId } from '@/lib/access/domain/actor';
import type { RoleRequest } from '@/lib/accounts/domain/role-request';
import { canonicalJson } from '@/lib/kernel/canonical-json';
import { roleRequestRow } from './rows/account-row';
import type { Trx } from './transaction';

export type NewRoleRequest = Pick<RoleRequest, 'id' | 'accountId' | 'why' | 'regions'> & { readonly at: Date };

export async function insertRoleRequest(trx: Trx, { id, accountId, why, regions, at }: NewRoleRequest): Promise<void> {
  await trx('role_requests').insert({ id, account_id: accountId, why, regions: canonicalJson(regions), state: 'waiting', made_at: at });
}

/** Requests of one account, the newest first. */
export async function listOwnRoleRequests(db: Knex, accountId: AccountId, most: number): Promise<readonly RoleRequest[]> {
  const rows: unknown[] = await db('role_requests').where({ account_id: accountId }).orderBy('made_at', 'desc').limit(most).select('*');
  return rows.map((row) => roleRequestRow.parse(row));
}

/** Requests nobody has answered, the oldest first. */
export async function listWaitingRoleRequests(db: Knex, most: number): Promise<readonly RoleRequest[]> {
  const rows: unknown[] = await db('role_requests').where({ state: 'waiting' }).orderBy('made_at').limit(most).select('*');
  return rows.map((row) => roleRequestRow.parse(row));
}

export async function findRoleRequest(db: Knex, id: string): Promise<RoleRequest | null> {
  const row: unknown = await db('role_requests').where({ id }).first();
  return row === undefined ? null : roleRequestRow.parse(row);
}

export async function lockRoleRequest(trx: Trx, id: string): Promise<RoleRequest | null> {
  const row: unknown = await trx('role_requests').where({ id }).forUpdate().first();
  return row === undefined ? null : roleRequestRow.parse(row);
}

export type RoleAnswer = Pick<RoleRequest, 'answer' | 'answeredBy'> & {
  readonly state: Exclude<RoleRequest['state'], 'waiting'>;
  readonly at: Date;
};

/** Ends a request that still waits. False when it was ended meanwhile. */
export async function endRoleRequest(trx: Trx, id: string, { state, answer, answeredBy, at }: RoleAnswer): Promise<boolean> {
  const changed = await trx('role_requests')
    .where({ id, state: 'waiting' })
    .update({ state, answer, answered_by: answeredBy, answered_at: at });
  return changed === 1;
}

/** Ends what an account still waits for, if anything. */
export async function withdrawRoleRequestsOf(trx: Trx, accountId: AccountId, at: Date): Promise<void> {
  await trx('role_requests').where({ account_id: accountId, state: 'waiting' }).update({ state: 'withdrawn', answered_at: at });
}

export async function deleteRoleRequestsOf(trx: Trx, accountId: AccountId): Promise<void> {
  await trx('role_requests').where({ account_id: accountId }).del();
}
