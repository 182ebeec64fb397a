import type { Knex } from 'knex';
import { z } from 'zod';
import type { AccountId } from '@/lib/access/domain/actor';
import { keeperRow, type KeeperRow } from './rows/keeper-row';
import type { Trx } from './transaction';

/** Makes an account a keeper of a sheet. False when it was one already. */
export async function insertKeeper(
  trx: Trx,
  { region, accountId, at }: { region: string; accountId: AccountId; at: Date },
): Promise<boolean> {
  const found: unknown = await trx('keepers').where({ region, account_id: accountId }).select('region').forUpdate().first();
  if (found !== undefined) return false;
  await trx('keepers').insert({ region, account_id: accountId, since: at });
  return true;
}

/** False when the account was no keeper of that sheet. */
export async function deleteKeeper(trx: Trx, region: string, accountId: AccountId): Promise<boolean> {
  return (await trx('keepers').where({ region, account_id: accountId }).del()) === 1;
}

export async function deleteKeepingsOf(trx: Trx, accountId: AccountId): Promise<void> {
  await trx('keepers').where({ account_id: accountId }).del();
}

/** Keepers of one sheet, or of all, whoever took it on first standing first. */
export async function listKeepers(db: Knex, region?: string): Promise<readonly KeeperRow[]> {
  const query = db('keepers').orderBy(['region', 'since', 'account_id']).limit(20_000).select('region', 'account_id', 'since');
  if (region !== undefined) void query.where({ region });
  const rows: unknown = await query;
  return z.array(keeperRow).parse(rows);
}

/** Sheets one account keeps, by code. */
export async function listKeepingsOf(db: Knex, accountId: AccountId): Promise<readonly KeeperRow[]> {
  const rows: unknown = await db('keepers').where({ account_id: accountId }).orderBy('region').select('region', 'account_id', 'since');
  return z.array(keeperRow).parse(rows);
}
