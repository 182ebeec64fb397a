import { z } from 'zod';
import type { AccountId } from '@/lib/access/domain/actor';
import type { Decision } from '@/lib/regions/domain/approval';
import type { DraftEntry } from '@/lib/regions/domain/amendment-view';
import type { ItemKey } from '@/lib/regions/domain/sheet-items';

/** A remark as it is kept; `answerTo` names the one it answers. */
export type StoredRemark = {
  readonly id: string;
  readonly answerTo: string | null;
  readonly line: string;
  readonly words: string;
  readonly authorId: AccountId;
  readonly at: Date;
  readonly answeredAt: Date | null;
};

/** An edition that was taken out of use, and the number under which the one before it came back. */
export type EditionWithdrawal = {
  readonly region: string;
  readonly number: number;
  readonly broughtBackAs: number;
  readonly reason: string;
  readonly by: AccountId;
  readonly at: Date;
};

const account = z.string().transform((id) => id as AccountId);
const values = z
  .union([z.string(), z.looseObject({})])
  .transform((value): unknown => (typeof value === 'string' ? JSON.parse(value) : value))
  .pipe(z.record(z.string(), z.union([z.string(), z.array(z.string())])));

export const entryRow = z
  .object({ item: z.string().transform((key) => key as ItemKey), version: z.number(), entered: values, saved_at: z.date() })
  .transform(({ item, version, entered, saved_at }): DraftEntry => ({ item, version, values: entered, savedAt: saved_at }));

export const decisionRow = z
  .object({
    kind: z.enum(['hold', 'release', 'send-back', 'approve-once', 'approve', 'refuse-stale']),
    version: z.number(),
    decided_by: account,
    reason: z.string().nullable(),
    decided_at: z.date(),
  })
  .transform(({ decided_by, decided_at, ...row }): Decision => ({ ...row, by: decided_by, at: decided_at }));

export const remarkRow = z
  .object({
    id: z.string(),
    answer_to: z.string().nullable(),
    line: z.string(),
    words: z.string(),
    author_id: account,
    made_at: z.date(),
    answered_at: z.date().nullable(),
  })
  .transform((row): StoredRemark => ({
    id: row.id,
    answerTo: row.answer_to,
    line: row.line,
    words: row.words,
    authorId: row.author_id,
    at: row.made_at,
    answeredAt: row.answered_at,
  }));

export const withdrawalRow = z
  .object({
    region: z.string(),
    number: z.number(),
    brought_back_as: z.number(),
    reason: z.string(),
    withdrawn_by: account,
    withdrawn_at: z.date(),
  })
  .transform((row): EditionWithdrawal => ({
    region: row.region,
    number: row.number,
    broughtBackAs: row.brought_back_as,
    reason: row.reason,
    by: row.withdrawn_by,
    at: row.withdrawn_at,
  }));
