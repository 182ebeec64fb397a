import 'server-only';
import { findAmendment } from '@/db/amendments';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import type { CheckedAmendment } from './domain/amendment-view';
import { examineFully } from './examine-amendment';

/** What the checks find in one's own amendment, what it does, and which trial pieces come out otherwise. */
export async function checkDraft(
  ctx: ActorCtx,
  { id }: { readonly id: string },
): Promise<Result<CheckedAmendment, AccessRefusal | { readonly kind: 'not-found' }>> {
  const own = askSignedIn(ctx, 'amendment.write');
  if (!own.ok) return own;
  const stored = await findAmendment(ctx.db, id);
  if (stored === null || stored.amendment.authorId !== own.value.id) return err({ kind: 'not-found' });
  const { findings, comparison } = await examineFully(ctx, stored);
  return ok({ findings, comparison });
}
