import { z } from 'zod';
import { parseCalendarDate, type CalendarDate } from '@/lib/kernel/calendar-date';
import type { RegionKind } from '@/lib/regions/domain/sheet';

export type RegionHead = { readonly code: string; readonly name: string; readonly kind: RegionKind; readonly edition: number | null };

const kind = z.enum(['bloc', 'country', 'part', 'standard', 'base']);

export const regionRow = z
  .object({ code: z.string(), name: z.string(), kind, edition_number: z.number().nullable() })
  .transform(({ edition_number, ...row }): RegionHead => ({ ...row, edition: edition_number }));

const day = z
  .string()
  .nullable()
  .transform((text): CalendarDate | null => (text === null ? null : parseCalendarDate(text)));

export const membershipRow = z.object({ region: z.string(), position: z.number(), parent: z.string(), valid_from: day, valid_to: day });

export const exceptionRow = z.object({ region: z.string(), position: z.number(), rule: z.string(), why: z.string() });
