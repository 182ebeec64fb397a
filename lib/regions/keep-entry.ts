import 'server-only';
import { lockEntry, putEntry } from '@/db/amendment-entries';
import { inTransaction } from '@/db/transaction';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import type { KeepEntryInput } from './amendment-schema';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { followedBy, isAlike, nextVersion, type EntryMovedOn } from './domain/entry-versions';
import { lockFor, type ActRefusal } from './lock-for';

/**
 * Keeps what was typed into an item's form. It counts on the version it was typed over: where another tab kept something else
 * meanwhile, nothing is overwritten. The same values again are kept already, so a lost answer is simply sent again.
 */
export async function keepEntry(
  ctx: ActorCtx,
  { id, item, version, values }: KeepEntryInput,
): Promise<Result<{ readonly version: number }, AccessRefusal | ActRefusal | EntryMovedOn>> {
  const own = askSignedIn(ctx, 'amendment.write');
  if (!own.ok) return own;
  return inTransaction(ctx.db, async (trx): Promise<Result<{ readonly version: number }, ActRefusal | EntryMovedOn>> => {
    const locked = await lockFor(trx, { id, who: own.value.id, act: 'save' });
    if (!locked.ok) return locked;
    const entry = await lockEntry(trx, { amendment: id, item });
    if (entry !== null && isAlike(entry.values, values)) return ok({ version: entry.version });
    const follows = followedBy(entry, version);
    if (!follows.ok) return follows;
    const next = nextVersion(entry, locked.value.amendment.version);
    await putEntry(trx, id, { item, version: next, values, savedAt: ctx.now });
    return ok({ version: next });
  });
}
