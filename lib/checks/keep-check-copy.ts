import 'server-only';
import { findCheck } from '@/db/checks';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { buildChecklist } from './build-checklist';
import { keptSince } from './check-age';
import type { CheckId } from './domain/ids';

/** Keeps the dated copy of a check as it stands, and answers with its address. */
export async function keepCheckCopy(
  ctx: Ctx,
  input: { readonly id: CheckId },
): Promise<Result<{ readonly hash: string }, { kind: 'not-found' }>> {
  const check = await findCheck(ctx.db, input.id, keptSince(ctx.now));
  if (check === null) return err({ kind: 'not-found' });
  const { regions, answers, declined, saleOn } = check;
  const kept = await buildChecklist(ctx, { regions, answers, declined, on: saleOn ?? undefined, keep: true });
  if (!kept.ok) throw new Error(`The sheet of "${kept.error.code}" is gone, and check ${input.id} is read from it`);
  return ok({ hash: kept.value.copy });
}
