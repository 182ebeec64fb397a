import 'server-only';
import { listSentHeads } from '@/db/amendments';
import { listNumbersInUse } from '@/db/editions';
import { fingerprint } from '@/db/fingerprint';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import type { WaitingQuery } from './amendment-schema';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { sentFilter } from './domain/sent-filter';

/** A few characters that are others as soon as the sorting table would show something else. */
export async function waitingStamp(ctx: ActorCtx, query: WaitingQuery): Promise<Result<string, AccessRefusal>> {
  const own = askSignedIn(ctx, 'amendment.judge');
  if (!own.ok) return own;
  const [heads, inUse] = await Promise.all([listSentHeads(ctx.db, sentFilter(query, ctx.now)), listNumbersInUse(ctx.db)]);
  const seen = heads.map(({ id, version, openedBy, region }) => [id, version, openedBy, inUse.get(region) ?? null]);
  return ok(fingerprint(JSON.stringify(seen)).slice(0, 16));
}
