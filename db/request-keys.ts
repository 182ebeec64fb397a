import type { Knex } from 'knex';
import { requestKeyRow, type KeptRequest } from './rows/request-key-row';
import type { Trx } from './transaction';

export type NewRequest = {
  readonly key: string;
  readonly who: string;
  readonly act: string;
  readonly inputHash: string;
  readonly at: Date;
};

/**
 * Puts down the key of a request. It waits for another transaction that holds the same key, and throws error 1062 when that one
 * was carried out.
 */
export async function insertRequestKey(trx: Trx, { key, who, act, inputHash, at }: NewRequest): Promise<void> {
  await trx('request_keys').insert({ id: key, who, act, input_hash: inputHash, made_at: at });
}

/** Keeps what the request is answered, in the transaction that carries it out. */
export async function keepAnswer(trx: Trx, key: string, answer: string): Promise<void> {
  await trx('request_keys').where({ id: key }).update({ answer });
}

/** The request that was carried out under this key, or null. */
export async function findKeptRequest(db: Knex, key: string): Promise<KeptRequest | null> {
  const row: unknown = await db('request_keys').where({ id: key }).select('who', 'act', 'input_hash', 'answer').first();
  return row === undefined ? null : requestKeyRow.parse(row);
}

/** Deletes up to `most` keys made before `since`. Answers with how many went. */
export async function deleteOldRequestKeys(db: Knex, since: Date, most: number): Promise<number> {
  return db('request_keys').where('made_at', '<', since).limit(most).del();
}
