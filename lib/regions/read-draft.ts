import 'server-only';
import { listEntries } from '@/db/amendment-entries';
import { findAmendment } from '@/db/amendments';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import type { OwnAmendment } from './domain/amendment-view';
import { changedItems } from './domain/changed-items';
import { readAlsoOpen, readBase, readStale, readTalk } from './read-around';

/** All that its author sees of an amendment. It is not there for anybody else (S28). */
export async function readDraft(
  ctx: ActorCtx,
  { id }: { readonly id: string },
): Promise<Result<OwnAmendment, AccessRefusal | { readonly kind: 'not-found' }>> {
  const own = askSignedIn(ctx, 'amendment.write');
  if (!own.ok) return own;
  const stored = await findAmendment(ctx.db, id);
  if (stored === null || stored.amendment.authorId !== own.value.id) return err({ kind: 'not-found' });
  const { amendment, document } = stored;
  const base = await readBase(ctx, amendment);
  const { remarks, decisions } = await readTalk(ctx, amendment, own.value.id, []);
  return ok({
    amendment,
    name: document.name,
    document,
    base,
    changed: changedItems(base, document),
    entries: await listEntries(ctx.db, amendment.id),
    remarks,
    decisions,
    stale: await readStale(ctx, stored),
    alsoOpen: await readAlsoOpen(ctx, stored),
  });
}
