import { z } from 'zod';
import { calendarDate, slug, words } from '@/lib/kernel/shapes';
import type { HeardClaim } from './domain/heard-claim';

/** The claims of content/heard/claims.json, in the order they are shown. */
export const heardClaims = z.array(
  z.strictObject({
    id: slug,
    heard: words,
    says: words,
    doNow: words,
    rules: z.array(slug).min(1, 'A claim rests on one rule at least'),
    lookedIn: z.array(z.strictObject({ title: words, on: calendarDate })),
  }),
) satisfies z.ZodType<readonly HeardClaim[]>;
