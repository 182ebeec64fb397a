import { z } from 'zod';
import { JOB_STATES } from './job-row';

/** A worker that was seen at work. */
export type SeenWorker = { readonly id: string; readonly beganAt: Date; readonly seenAt: Date };

export const workerRow = z
  .object({ id: z.string(), began_at: z.date(), seen_at: z.date() })
  .transform((row): SeenWorker => ({ id: row.id, beganAt: row.began_at, seenAt: row.seen_at }));

export const jobCounts = z.array(z.object({ state: z.enum(JOB_STATES), jobs: z.coerce.number() }));
