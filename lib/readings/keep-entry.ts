import 'server-only';
import { deleteOldReadingSheets, putReadingSheet } from '@/db/reading-sheets';
import { inTransaction } from '@/db/transaction';
import { ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import type { SheetId } from './domain/sheet-id';
import { sheetsSince } from './sheet-age';
import type { SheetInput } from './sheet-schema';

/** Old sheets that go each time one is kept, so that the table never holds more than a month's and no one waits long. */
const SWEEP = 200;

/** Keeps the form of readings as it was typed, under the address in it. The same form sent twice is one sheet. */
export async function keepEntry(ctx: Ctx, { id, fields }: SheetInput): Promise<Result<{ readonly id: SheetId }, never>> {
  await deleteOldReadingSheets(ctx.db, sheetsSince(ctx.now), SWEEP);
  return inTransaction(ctx.db, async (trx): Promise<Result<{ readonly id: SheetId }, never>> => {
    await putReadingSheet(trx, { id, fields, at: ctx.now });
    return ok({ id });
  });
}
