import { z } from 'zod';
import type { Json } from '@/lib/kernel/canonical-json';
import type { BoundEntry } from '@/lib/day-book/domain/entry';

export const dayBookRow = z
  .object({
    number: z.number(),
    at: z.date(),
    actor_id: z.string().nullable(),
    did: z.string(),
    subject_kind: z.string(),
    subject_id: z.string(),
    reason: z.string().nullable(),
    details: z.string(),
    previous_hash: z.string(),
    hash: z.string(),
  })
  .transform((row): BoundEntry => ({
    number: row.number,
    at: row.at,
    actorId: row.actor_id,
    did: row.did,
    subject: { kind: row.subject_kind, id: row.subject_id },
    reason: row.reason,
    details: JSON.parse(row.details) as Json,
    previousHash: row.previous_hash,
    hash: row.hash,
  }));

/** The last line of the day book: its number and hash. */
export const dayBookEndRow = z.object({ number: z.number(), hash: z.string() });
export type DayBookEnd = Readonly<z.output<typeof dayBookEndRow>>;
