import { z } from 'zod';
import { words } from '@/lib/kernel/words';

const key = z.uuid({ error: () => words('accounts.fault.form') });

export const retryInput = z.strictObject({ key, what: z.enum(['mail', 'job']), id: z.uuid() });

/** What the outbox page can be asked for. */
export const OUTBOX_PARTS = ['waiting', 'parked', 'bounced'] as const;
export type OutboxPart = (typeof OUTBOX_PARTS)[number];

const text = z.union([z.string(), z.array(z.string()).transform((all) => all[0] ?? '')]);

/** Of the page's address: whatever cannot be read asks for the first page of what waits. */
export const outboxQuery = z.object({
  part: text.pipe(z.enum(OUTBOX_PARTS)).optional().catch(undefined),
  before: text.pipe(z.uuid()).optional().catch(undefined),
});

export type RetryInput = z.output<typeof retryInput>;
export type OutboxQuery = z.output<typeof outboxQuery>;
