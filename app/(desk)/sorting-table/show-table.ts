import { countWords, shownRow, type ShownTable } from '@/components/review/waiting-words';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { ok, type Result } from '@/lib/kernel/result';
import type { WaitingQuery } from '@/lib/regions/amendment-schema';
import { listWaiting } from '@/lib/regions/list-waiting';
import { waitingStamp } from '@/lib/regions/waiting-stamp';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { isNarrowed } from './table-address';

/** The sorting table in words. Its stamp is read before its rows: what comes in between is told at the next look. */
export async function showTable(ctx: ActorCtx, query: WaitingQuery): Promise<Result<ShownTable, AccessRefusal>> {
  const stamp = await waitingStamp(ctx, query);
  if (!stamp.ok) return stamp;
  const waiting = await listWaiting(ctx, query);
  if (!waiting.ok) return waiting;
  const rows = waiting.value;
  return ok({
    stamp: stamp.value,
    count: countWords(rows.length, isNarrowed(query)),
    rows: rows.map((row) => shownRow(row, ctx.now)),
  });
}
