import type { Knex } from 'knex';

/** A connection inside a transaction. A function that asks for one must run in one. */
export type Trx = Knex.Transaction;

/** Thrown to make Knex roll back after a refusal; never leaves this file. */
class RolledBack extends Error {}

/**
 * Runs `work` in one transaction: commits when it answers `ok`, rolls back when it refuses or throws.
 * Always the callback form: a hand-called commit resolves even when COMMIT failed, and the change is silently lost.
 */
export async function inTransaction<R extends { readonly ok: boolean }>(db: Knex, work: (trx: Trx) => Promise<R>): Promise<R> {
  const refused: { result?: R } = {};
  try {
    return await db.transaction(async (trx) => {
      const result = await work(trx);
      if (result.ok) return result;
      refused.result = result;
      throw new RolledBack();
    });
  } catch (error) {
    if (error instanceof RolledBack && refused.result !== undefined) return refused.result;
    throw error;
  }
}
