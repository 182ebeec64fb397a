import type { Knex } from 'knex';
import type { AccountId } from '@/lib/access/domain/actor';
import { remarkRow, type StoredRemark } from './rows/amendment-part-rows';
import type { Trx } from './transaction';
import { wellFormed } from './well-formed';

export type { StoredRemark } from './rows/amendment-part-rows';

export type NewRemark = Omit<StoredRemark, 'answeredAt'>;

const COLUMNS = ['id', 'answer_to', 'line', 'words', 'author_id', 'made_at', 'answered_at'] as const;

export async function insertRemark(trx: Trx, amendment: string, { id, answerTo, line, words, authorId, at }: NewRemark): Promise<void> {
  await trx('amendment_remarks').insert({
    id,
    amendment_id: amendment,
    answer_to: answerTo,
    line: wellFormed(line),
    words: wellFormed(words),
    author_id: authorId,
    made_at: at,
  });
}

/** Remarks and answers to them, the first one first. */
export async function listRemarks(db: Knex, amendment: string): Promise<readonly StoredRemark[]> {
  const rows: unknown[] = await db('amendment_remarks')
    .where({ amendment_id: amendment })
    .orderBy(['made_at', 'id'])
    .limit(2000)
    .select(...COLUMNS);
  return rows.map((row) => remarkRow.parse(row));
}

/** A remark of that amendment that is no answer; null when there is none. */
export async function findRemark(db: Knex, amendment: string, id: string): Promise<StoredRemark | null> {
  const row: unknown = await db('amendment_remarks')
    .where({ amendment_id: amendment, id })
    .whereNull('answer_to')
    .select(...COLUMNS)
    .first();
  return row === undefined ? null : remarkRow.parse(row);
}

/** Marks a remark as answered, or as open again. */
export async function markRemark(trx: Trx, id: string, answered: { readonly by: AccountId; readonly at: Date } | null): Promise<void> {
  await trx('amendment_remarks')
    .where({ id })
    .update({ answered_by: answered?.by ?? null, answered_at: answered?.at ?? null });
}
