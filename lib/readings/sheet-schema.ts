import { z } from 'zod';
import type { SheetId } from './domain/sheet-id';

export const sheetId = z
  .string()
  .regex(/^[A-Za-z0-9_-]{22}$/)
  .transform((id) => id as SheetId);

/** Bounded: our own form sends a few hundred short fields and two longer ones for what is pasted. */
const MOST_FIELDS = 2000;
const LONGEST = 20_000;

/** The form of readings as it was sent. What it says is read later, so that nothing typed is lost on the way. */
export const sheetInput = z.object({
  id: sheetId,
  fields: z
    .record(z.string().max(60), z.array(z.string().max(LONGEST)).max(40))
    .refine((all) => Object.keys(all).length <= MOST_FIELDS, { error: 'That is more than our page sends' })
    .refine((all) => Object.values(all).flat().join('').length <= 4 * LONGEST, { error: 'That is more than our page sends' }),
});
export type SheetInput = z.output<typeof sheetInput>;
