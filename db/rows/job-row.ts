import { z } from 'zod';
import type { Json } from '@/lib/kernel/canonical-json';

export const JOB_STATES = ['waiting', 'running', 'done', 'parked'] as const;
export type JobState = (typeof JOB_STATES)[number];

/** A piece of work that the worker does after the answer to its cause. */
export type Job = {
  readonly id: string;
  readonly kind: string;
  readonly input: Json;
  readonly accountId: string | null;
  readonly state: JobState;
  readonly tries: number;
  /** How much of it is done, of how much; 0 of 0 until it says. */
  readonly done: number;
  readonly total: number;
  readonly result: Json;
  readonly failure: string | null;
  readonly madeAt: Date;
  readonly endedAt: Date | null;
};

export const jobRow = z
  .object({
    id: z.string(),
    kind: z.string(),
    input: z.string(),
    account_id: z.string().nullable(),
    state: z.enum(JOB_STATES),
    tries: z.number(),
    done_count: z.number(),
    total_count: z.number(),
    result: z.string().nullable(),
    failure: z.string().nullable(),
    made_at: z.date(),
    ended_at: z.date().nullable(),
  })
  .transform((row): Job => ({
    id: row.id,
    kind: row.kind,
    input: JSON.parse(row.input) as Json,
    accountId: row.account_id,
    state: row.state,
    tries: row.tries,
    done: row.done_count,
    total: row.total_count,
    result: row.result === null ? null : (JSON.parse(row.result) as Json),
    failure: row.failure,
    madeAt: row.made_at,
    endedAt: row.ended_at,
  }));
