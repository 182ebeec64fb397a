import { z } from 'zod';
import { calendarDate, regionCode } from '@/lib/kernel/shapes';
import { ACT_KINDS } from './domain/kinds';

const text = z.union([z.string(), z.array(z.string()).transform((all) => all[0] ?? '')]);

/** Of the page's address: whatever cannot be read asks for nothing. */
export const dayBookQuery = z.object({
  kind: text.pipe(z.enum(ACT_KINDS)).optional().catch(undefined),
  region: text.pipe(regionCode).optional().catch(undefined),
  from: text.pipe(calendarDate).optional().catch(undefined),
  until: text.pipe(calendarDate).optional().catch(undefined),
  before: text
    .pipe(z.string().regex(/^[1-9]\d{0,14}$/))
    .transform(Number)
    .optional()
    .catch(undefined),
});

export type DayBookQuery = z.output<typeof dayBookQuery>;
