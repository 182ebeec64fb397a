import 'server-only';
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
};

/** Every edition of a sheet, the first one first. Instants in UTC (RFC 3339). */
export async function listEditions(ctx: Ctx, code: string): Promise<Result<readonly ListedEdition[], { kind: 'not-found' }>> {
  const heads = await findEditions(ctx.db, code);
  if (heads.length === 0) return err({ kind: 'not-found' });
  return ok(
    heads.map(({ number, hash, summary, inUseFrom }, index) => ({
      number,
      inUseFrom: inUseFrom.toISOString(),
      inUseTo: heads[index + 1]?.inUseFrom.toISOString() ?? null,
      hash,
      summary,
    })),
  );
}
