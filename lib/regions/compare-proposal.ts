import 'server-only';
import { fingerprint } from '@/db/fingerprint';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { canonicalJson } from '@/lib/kernel/canonical-json';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { readEdition } from '@/lib/server/sheets';
import { compareSheets } from './compare-sheets';
import type { ComparedEditions } from './domain/compared-editions';
import type { Sheet } from './domain/sheet';

export type ProposalToCompare = {
  readonly region: string;
  /** Number of the edition it is based on; null for a place without a sheet. */
  readonly base: number | null;
  readonly document: Sheet;
  readonly summary: string;
};

/** What a proposed sheet does, held against the edition it is based on; its number is the one it would come into use as. */
export async function compareProposal(
  ctx: Ctx,
  { region, base, document, summary }: ProposalToCompare,
): Promise<Result<ComparedEditions, { kind: 'no-such-edition' }>> {
  const before = base === null ? null : await readEdition(ctx.db, region, base);
  if (base !== null && before === null) return err({ kind: 'no-such-edition' });
  const after = {
    head: { number: (base ?? 0) + 1, summary, inUseFrom: ctx.now },
    sheet: document,
    hash: fingerprint(canonicalJson(document)),
  };
  if (before === null) return ok(await compareSheets(ctx, { before, after, on: calendarDateOf(ctx.now) }));
  const { number, inUseFrom, sheet, hash } = before;
  const head = { number, summary: before.summary, inUseFrom };
  return ok(await compareSheets(ctx, { before: { head, sheet, hash }, after, on: calendarDateOf(ctx.now) }));
}
