import { z } from 'zod';
import type { SheetFields, SheetId } from '@/lib/readings/domain/sheet-id';

/** Readings as somebody typed them, at their address. */
export type ReadingSheet = { readonly id: SheetId; readonly fields: SheetFields; readonly touchedAt: Date };

const json = z
  .union([z.string(), z.looseObject({})])
  .transform((value): unknown => (typeof value === 'string' ? JSON.parse(value) : value))
  .pipe(z.record(z.string(), z.array(z.string())));

export const readingSheetRow = z
  .object({ id: z.string(), entry: json, touched_at: z.date() })
  .transform((row): ReadingSheet => ({ id: row.id as SheetId, fields: row.entry, touchedAt: row.touched_at }));
