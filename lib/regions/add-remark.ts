import 'server-only';
import { insertRemark } from '@/db/amendment-remarks';
import { lockAmendment } from '@/db/amendments';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { newId } from '@/lib/server/new-id';
import type { RemarkInput } from './amendment-schema';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { mayModeratorsRead } from './domain/amendment';

export type AddRemarkRefusal = AccessRefusal | ChangeRefusal | { readonly kind: 'not-found' | 'own-amendment' };

/** A moderator's remark on one line of an amendment. Only its author and moderators read it. */
export async function addRemark(
  ctx: ActorCtx,
  { key, id, line, words }: RemarkInput,
): Promise<Result<{ readonly id: string }, AddRemarkRefusal>> {
  const own = askSignedIn(ctx, 'amendment.judge');
  if (!own.ok) return own;
  const asked = { key, who: own.value.id, act: 'regions.add-remark', input: { id, line, words } };
  return change(ctx, asked, async (trx): Promise<Result<{ readonly id: string }, AddRemarkRefusal>> => {
    const stored = await lockAmendment(trx, id);
    if (stored === null || !mayModeratorsRead(stored.amendment)) return err({ kind: 'not-found' });
    if (stored.amendment.authorId === own.value.id) return err({ kind: 'own-amendment' });
    const remark = { id: newId(ctx.now), answerTo: null, line, words, authorId: own.value.id, at: ctx.now };
    await insertRemark(trx, id, remark);
    return ok({ id: remark.id });
  });
}
