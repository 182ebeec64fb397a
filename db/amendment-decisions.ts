import type { Knex } from 'knex';
import type { Decision } from '@/lib/regions/domain/approval';
import { newId } from './new-id';
import { decisionRow } from './rows/amendment-part-rows';
import type { Trx } from './transaction';
import { wellFormed } from './well-formed';

/** Writes a decision down. Nobody can change or remove it. */
export async function insertDecision(trx: Trx, amendment: string, { kind, version, by, reason, at }: Decision): Promise<void> {
  await trx('amendment_decisions').insert({
    id: newId(at),
    amendment_id: amendment,
    version,
    kind,
    decided_by: by,
    reason: reason === null ? null : wellFormed(reason),
    decided_at: at,
  });
}

/** Every decision on an amendment, the first one first. Versions ascend with time, so they decide where clocks say the same. */
export async function listDecisions(db: Knex, amendment: string): Promise<readonly Decision[]> {
  const rows: unknown[] = await db('amendment_decisions')
    .where({ amendment_id: amendment })
    .orderBy(['version', 'decided_at', 'id'])
    .limit(1000)
    .select('kind', 'version', 'decided_by', 'reason', 'decided_at');
  return rows.map((row) => decisionRow.parse(row));
}
