import type { Knex } from 'knex';
import { dayBookCheckRow, type DayBookCheck } from './rows/day-book-check-row';

/** Notes what the last reading of the whole day book found. */
export async function putDayBookCheck(db: Knex, { checkedAt, number, hash, break: found }: DayBookCheck): Promise<void> {
  const row = { checked_at: checkedAt, number, hash, break_number: found?.number ?? null, break_why: found?.why ?? null };
  await db('day_book_checks')
    .insert({ id: 1, ...row })
    .onConflict('id')
    .merge(row);
}

/** Null until a worker has read the book for the first time. */
export async function findDayBookCheck(db: Knex): Promise<DayBookCheck | null> {
  const row: unknown = await db('day_book_checks')
    .where({ id: 1 })
    .select('checked_at', 'number', 'hash', 'break_number', 'break_why')
    .first();
  return row === undefined ? null : dayBookCheckRow.parse(row);
}
