import 'server-only';
import type { Edition } from '@/db/rows/edition-row';
import { calendarDateOf, type CalendarDate } from '@/lib/kernel/calendar-date';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { readEdition } from '@/lib/server/sheets';
import { compareSheets, type Version } from './compare-sheets';
import type { ComparedEditions } from './domain/compared-editions';

export type EditionChoice = {
  readonly code: string;
  readonly from: number;
  readonly to: number;
  /** The day for which meanings are compared; today when none is given. */
  readonly on?: CalendarDate | undefined;
};

/**
 * Compares two editions of a sheet. Meanings are those on one day, with the other layers in the edition in use at its end and
 * with the memberships that each edition itself gives the place. Refuses an edition that does not exist, or the same twice.
 */
export async function compareEditions(
  ctx: Ctx,
  { code, from, to, on = calendarDateOf(ctx.now) }: EditionChoice,
): Promise<Result<ComparedEditions, { kind: 'not-found' } | { kind: 'same-edition' }>> {
  const [before, after] = [await readEdition(ctx.db, code, from), await readEdition(ctx.db, code, to)];
  if (before === null || after === null) return err({ kind: 'not-found' });
  if (from === to) return err({ kind: 'same-edition' });
  return ok(await compareSheets(ctx, { before: versionOf(before), after: versionOf(after), on }));
}

const versionOf = ({ number, summary, inUseFrom, sheet, hash }: Edition): Version => ({
  head: { number, summary, inUseFrom },
  sheet,
  hash,
});
