import 'server-only';
import { listWithdrawals } from '@/db/edition-withdrawals';
import { listEditions as findEditions } from '@/db/editions';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';

export type ListedEdition = {
  readonly number: number;
  readonly inUseFrom: string;
  /** Null while it is in use. */
  readonly inUseTo: string | null;
  readonly hash: string;
  readonly summary: string;
  /** Of an edition that was withdrawn: why, and the number under which the one before it came back. */
  readonly withdrawn: { readonly reason: string; readonly broughtBackAs: number } | null;
};

/** Every edition of a sheet, the first one first. Instants in UTC (RFC 3339). */
export async function listEditions(ctx: Ctx, code: string): Promise<Result<readonly ListedEdition[], { kind: 'not-found' }>> {
  const [heads, withdrawals] = await Promise.all([findEditions(ctx.db, code), listWithdrawals(ctx.db, code)]);
  if (heads.length === 0) return err({ kind: 'not-found' });
  const withdrawn = new Map(withdrawals.map(({ number, reason, broughtBackAs }) => [number, { reason, broughtBackAs }]));
  return ok(
    heads.map(({ number, hash, summary, inUseFrom }, index) => ({
      number,
      inUseFrom: inUseFrom.toISOString(),
      inUseTo: heads[index + 1]?.inUseFrom.toISOString() ?? null,
      hash,
      summary,
      withdrawn: withdrawn.get(number) ?? null,
    })),
  );
}
