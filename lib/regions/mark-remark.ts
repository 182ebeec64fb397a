import 'server-only';
import { findRemark, markRemark as putMark } from '@/db/amendment-remarks';
import { lockAmendment } from '@/db/amendments';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import type { RemarkDoneInput } from './amendment-schema';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { mayModeratorsRead } from './domain/amendment';

export type MarkRemarkRefusal = AccessRefusal | ChangeRefusal | { readonly kind: 'not-found' | 'own-amendment' };

/** A moderator marks a remark as answered, or as open again. */
export async function markRemark(ctx: ActorCtx, { key, id, remark, answered }: RemarkDoneInput): Promise<Result<null, MarkRemarkRefusal>> {
  const own = askSignedIn(ctx, 'amendment.judge');
  if (!own.ok) return own;
  const asked = { key, who: own.value.id, act: 'regions.mark-remark', input: { id, remark, answered } };
  return change(ctx, asked, async (trx): Promise<Result<null, MarkRemarkRefusal>> => {
    const stored = await lockAmendment(trx, id);
    if (stored === null || !mayModeratorsRead(stored.amendment)) return err({ kind: 'not-found' });
    if (stored.amendment.authorId === own.value.id) return err({ kind: 'own-amendment' });
    if ((await findRemark(trx, id, remark)) === null) return err({ kind: 'not-found' });
    await putMark(trx, remark, answered ? { by: own.value.id, at: ctx.now } : null);
    return ok(null);
  });
}
