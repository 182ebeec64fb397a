import type { Knex } from 'knex';
import { withdrawalRow, type EditionWithdrawal } from './rows/amendment-part-rows';
import type { Trx } from './transaction';
import { wellFormed } from './well-formed';

export type { EditionWithdrawal } from './rows/amendment-part-rows';

/** Writes down that an edition was taken out of use. Nobody can change or remove it. */
export async function insertWithdrawal(trx: Trx, { region, number, broughtBackAs, reason, by, at }: EditionWithdrawal): Promise<void> {
  await trx('edition_withdrawals').insert({
    region,
    number,
    brought_back_as: broughtBackAs,
    reason: wellFormed(reason),
    withdrawn_by: by,
    withdrawn_at: at,
  });
}

/** Editions of a sheet that were withdrawn, by number. */
export async function listWithdrawals(db: Knex, region: string): Promise<readonly EditionWithdrawal[]> {
  const rows: unknown[] = await db('edition_withdrawals')
    .where({ region })
    .orderBy('number')
    .limit(10_000)
    .select('region', 'number', 'brought_back_as', 'reason', 'withdrawn_by', 'withdrawn_at');
  return rows.map((row) => withdrawalRow.parse(row));
}
