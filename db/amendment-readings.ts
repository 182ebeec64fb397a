import type { Knex } from 'knex';
import { z } from 'zod';
import type { AccountId } from '@/lib/access/domain/actor';
import type { Trx } from './transaction';

/** Who has read which claim of which version. */
export type Reading = { readonly amendment: string; readonly version: number; readonly reader: AccountId };

const rowOf = ({ amendment, version, reader }: Reading) => ({ amendment_id: amendment, version, reader_id: reader });
const claims = z.array(z.string());

/** Keys of the claims that this reader has ticked on this version. */
export async function listReadings(db: Knex, reading: Reading): Promise<ReadonlySet<string>> {
  const rows: unknown = await db('amendment_readings').where(rowOf(reading)).limit(10_000).pluck('claim');
  return new Set(claims.parse(rows));
}

/** Ticks a claim; the same tick twice is one. */
export async function putReading(trx: Trx, reading: Reading, claim: string, at: Date): Promise<void> {
  await trx('amendment_readings')
    .insert({ ...rowOf(reading), claim, read_at: at })
    .onConflict()
    .ignore();
}

export async function deleteReading(trx: Trx, reading: Reading, claim: string): Promise<void> {
  await trx('amendment_readings')
    .where({ ...rowOf(reading), claim })
    .del();
}

/** A decision counts the version on and changes no word: what was read of it stays read, by everybody. */
export async function carryReadings(trx: Trx, { amendment, version }: Omit<Reading, 'reader'>, to: number): Promise<void> {
  await trx('amendment_readings').where({ amendment_id: amendment, version }).update({ version: to });
}
