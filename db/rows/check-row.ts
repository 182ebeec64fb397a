import { z } from 'zod';
import { parseCalendarDate, type CalendarDate } from '@/lib/kernel/calendar-date';
import type { Answers } from '@/lib/checks/domain/knowledge';
import type { CheckId } from '@/lib/checks/domain/ids';

/** What was said of a piece at one time. */
export type Said = { readonly answers: Answers; readonly declined: readonly string[] };

/** An entry that was not understood, kept so that nothing typed is lost: the page it belongs to and its fields as sent. */
export type KeptEntry = { readonly question: string; readonly fields: Readonly<Record<string, readonly string[]>> };

/** A visitor's check of one piece. */
export type Check = Said & {
  readonly id: CheckId;
  readonly regions: readonly string[];
  readonly saleOn: CalendarDate | null;
  readonly entry: KeptEntry | null;
  /** Answers of the note it was begun from: filled in where they are asked for, and nothing more. */
  readonly fromNote: Answers;
  /** What the checklist last shown rested on, and the one before it. */
  readonly shown: { readonly now: Said; readonly before: Said | null } | null;
  readonly kept: boolean;
  readonly touchedAt: Date;
};

const json = z
  .union([z.string(), z.looseObject({}), z.array(z.unknown())])
  .transform((value): unknown => (typeof value === 'string' ? JSON.parse(value) : value));

export const checkRow = z
  .object({
    id: z.string(),
    regions: json,
    sale_on: z.string().nullable(),
    answers: json,
    declined: json,
    entry: json.nullable(),
    from_note: json.nullable(),
    shown: json.nullable(),
    kept: z.number(),
    touched_at: z.date(),
  })
  .transform((row): Check => ({
    id: row.id as CheckId,
    regions: row.regions as readonly string[],
    saleOn: row.sale_on === null ? null : parseCalendarDate(row.sale_on),
    answers: row.answers as Answers,
    declined: row.declined as readonly string[],
    entry: row.entry as KeptEntry | null,
    fromNote: (row.from_note ?? {}) as Answers,
    shown: row.shown as Check['shown'],
    kept: row.kept !== 0,
    touchedAt: row.touched_at,
  }));
