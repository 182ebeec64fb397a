import { z } from 'zod';
import type { Break } from '@/lib/day-book/domain/entry';

/** What was found when the whole day book was read last: up to which line it held, and the first break, if any. */
export type DayBookCheck = {
  readonly checkedAt: Date;
  readonly number: number;
  readonly hash: string;
  readonly break: Break | null;
};

export const dayBookCheckRow = z
  .object({
    checked_at: z.date(),
    number: z.number(),
    hash: z.string(),
    break_number: z.number().nullable(),
    break_why: z.enum(['missing', 'not-bound', 'changed', 'cut-off']).nullable(),
  })
  .transform((row): DayBookCheck => {
    const { break_number: number, break_why: why } = row;
    const found = number === null || why === null ? null : { number, why };
    return { checkedAt: row.checked_at, number: row.number, hash: row.hash, break: found };
  });
