import 'server-only';
import { z } from 'zod';
import { findReadingSheet } from '@/db/reading-sheets';
import type { Answers } from '@/lib/checks/domain/knowledge';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { areaField, readSheetEntry, volumeField, type ExtractPart, type SheetEntry } from './domain/sheet-entry';
import type { SheetFault } from './domain/sheet-faults';
import type { SheetFields, SheetId } from './domain/sheet-id';
import { cellField } from './domain/typed-rows';
import type { ReadingsInput } from './judge-readings';
import { verdictInput } from './schema';
import { sheetsSince, sheetUntil } from './sheet-age';

/** A sheet of readings as it was typed and as it was understood. */
export type ReadSheet = {
  readonly id: SheetId;
  readonly fields: SheetFields;
  readonly entry: SheetEntry;
  readonly faults: readonly SheetFault[];
  /** What can be held against limits; null while anything is to be mended. */
  readonly input: ReadingsInput | null;
  readonly keptUntil: Date;
};

// The answers were read by the rules of their own questions already.
const door = verdictInput(z.custom<Answers>());

/** The sheet at that address. Not found when there is none, or when it was sent more than 30 days ago. */
export async function readEntry(ctx: Ctx, id: SheetId): Promise<Result<ReadSheet, { kind: 'not-found' }>> {
  const sheet = await findReadingSheet(ctx.db, id, sheetsSince(ctx.now));
  if (sheet === null) return err({ kind: 'not-found' });
  const entry = readSheetEntry(sheet.fields);
  const read = entry.faults.length === 0 ? throughTheDoor(entry) : { input: null, faults: entry.faults };
  return ok({ id, fields: sheet.fields, entry, ...read, keptUntil: sheetUntil(sheet.touchedAt) });
}

/** The page goes in by the same door as the API, so that both refuse the same. */
function throughTheDoor(entry: SheetEntry): Pick<ReadSheet, 'input' | 'faults'> {
  const { regions, on, rows, extracts, conditions, answers } = entry;
  const parsed = door.safeParse({
    regions,
    ...(on === null ? {} : { on }),
    answers,
    readings: rows.readings,
    furtherPieces: rows.further,
    extracts,
    conditions,
  });
  if (parsed.success) return { input: parsed.data, faults: [] };
  return { input: null, faults: parsed.error.issues.map(({ path, message }) => faultAt(path, message, entry)) };
}

function faultAt([list, at, member]: readonly PropertyKey[], said: string, { extracts }: SheetEntry): SheetFault {
  const refused = { why: 'refused', said } as const;
  switch (String(list)) {
    case 'regions':
      return { field: 'region', place: 'places', ...refused };
    case 'conditions':
      return named(at === 'hours' ? 'hours' : 'temperature', 'condition', said);
    case 'extracts':
      return named(extractField(extracts[Number(at)]?.part ?? 'vessel', member), 'extract', said);
    case 'furtherPieces':
      return { field: cellField('further', 'value', 1), place: 'further', row: Number(at) + 1, ...refused };
    default:
      return { field: cellField('readings', 'value', 1), place: 'readings', row: Number(at) + 1, ...refused };
  }
}

const extractField = (part: ExtractPart, member: PropertyKey | undefined): string =>
  member === 'areaCm2' ? areaField(part) : volumeField(part);

const named = (name: string, place: 'condition' | 'extract', said: string): SheetFault => ({
  field: name,
  place,
  why: 'refused',
  said,
  name,
});
