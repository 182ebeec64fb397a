import { z } from 'zod';
import type { AccountId } from '@/lib/access/domain/actor';
import { DOUBT_STATES, type Doubt } from '@/lib/regions/domain/doubt';

const accountId = z.string().transform((id) => id as AccountId);

export const doubtRow = z
  .object({
    id: z.string(),
    region: z.string(),
    rule_id: z.string().nullable(),
    words: z.string(),
    elsewhere: z.string().nullable(),
    link: z.string().nullable(),
    state: z.enum(DOUBT_STATES),
    answer: z.string().nullable(),
    aside_why: z.string().nullable(),
    answered_by: accountId.nullable(),
    made_at: z.date(),
    answered_at: z.date().nullable(),
  })
  .transform((row): Doubt => ({
    id: row.id,
    region: row.region,
    rule: row.rule_id,
    words: row.words,
    elsewhere: row.elsewhere,
    link: row.link,
    state: row.state,
    answer: row.answer,
    asideWhy: row.aside_why,
    answeredBy: row.answered_by,
    madeAt: row.made_at,
    answeredAt: row.answered_at,
  }));

export const doubtCountRow = z.object({ state: z.enum(DOUBT_STATES), times: z.coerce.number() });
