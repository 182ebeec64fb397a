import type { Knex } from 'knex';
import type { AccountId } from '@/lib/access/domain/actor';
import type { Trx } from './transaction';

/** Ten new codes in the place of all earlier ones. */
export async function replaceRecoveryCodes(trx: Trx, accountId: AccountId, hashes: readonly Buffer[]): Promise<void> {
  await deleteRecoveryCodes(trx, accountId);
  await trx('recovery_codes').insert(hashes.map((hash) => ({ account_id: accountId, hash, used_at: null })));
}

/** Uses a code up. False when there is no such code, or it was used. */
export async function spendRecoveryCode(trx: Trx, accountId: AccountId, hash: Buffer, at: Date): Promise<boolean> {
  return (await trx('recovery_codes').where({ account_id: accountId, hash, used_at: null }).update({ used_at: at })) === 1;
}

/** How many codes can still be used. */
export async function countRecoveryCodes(db: Knex, accountId: AccountId): Promise<number> {
  const rows: unknown[] = await db('recovery_codes').where({ account_id: accountId, used_at: null }).select('account_id');
  return rows.length;
}

export async function deleteRecoveryCodes(trx: Trx, accountId: AccountId): Promise<void> {
  await trx('recovery_codes').where({ account_id: accountId }).del();
}
