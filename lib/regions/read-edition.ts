import 'server-only';
import { listWithdrawals } from '@/db/edition-withdrawals';
import { listEditions } from '@/db/editions';
import { listMemberships } from '@/db/regions';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { err, ok, type Result } from '@/lib/kernel/result';
import { cautionFor } from '@/lib/server/caution';
import type { Ctx } from '@/lib/server/ctx';
import { readEdition as findEdition } from '@/lib/server/sheets';
import { regionLine } from './domain/line';
import { tellLayer, type RegionSheet } from './domain/told-sheet';

/** One edition of a sheet by itself, without the layers above it, as of its last day in use. */
export type NumberedEdition = {
  readonly sheet: RegionSheet;
  /** Null while it is in use. */
  readonly inUseTo: Date | null;
  /** Why it was withdrawn, and as what the one before it came back; null for one that was not. */
  readonly withdrawn: { readonly reason: string; readonly broughtBackAs: number } | null;
};

/** The edition of that number, whether in use or not. */
export async function readEdition(
  ctx: Ctx,
  input: { readonly code: string; readonly number: number },
): Promise<Result<NumberedEdition, { kind: 'not-found' }>> {
  const heads = await listEditions(ctx.db, input.code);
  const edition = heads.some(({ number }) => number === input.number) ? await findEdition(ctx.db, input.code, input.number) : null;
  if (edition === null) return err({ kind: 'not-found' });
  const inUseTo = heads.find(({ number }) => number === input.number + 1)?.inUseFrom ?? null;
  const on = calendarDateOf(inUseTo ?? ctx.now);
  const line = regionLine(await listMemberships(ctx.db), input.code, on).layers;
  const layer = tellLayer(edition, on);
  const sources = layer.rules.flatMap((rule) => rule.sources);
  const caution = cautionFor({ sources, authorities: [layer.authorities], on });
  const withdrawal = (await listWithdrawals(ctx.db, input.code)).find(({ number }) => number === input.number);
  const withdrawn = withdrawal === undefined ? null : { reason: withdrawal.reason, broughtBackAs: withdrawal.broughtBackAs };
  return ok({ sheet: { ...layer, on, line, notInherited: [], above: [], caution }, inUseTo, withdrawn });
}
