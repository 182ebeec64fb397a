import 'server-only';
import { findRemark, insertRemark } from '@/db/amendment-remarks';
import { lockAmendment } from '@/db/amendments';
import { mayNow, type AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { newId } from '@/lib/server/new-id';
import type { RemarkAnswerInput } from './amendment-schema';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { mayModeratorsRead } from './domain/amendment';

export type AnswerRemarkRefusal = AccessRefusal | ChangeRefusal | { readonly kind: 'not-found' };

/** Answers a remark: its author whose amendment it is, and any moderator who may read it. */
export async function answerRemark(
  ctx: ActorCtx,
  { key, id, remark, words }: RemarkAnswerInput,
): Promise<Result<{ readonly id: string }, AnswerRemarkRefusal>> {
  const own = askSignedIn(ctx, 'amendment.write');
  if (!own.ok) return own;
  const who = own.value.id;
  const asked = { key, who, act: 'regions.answer-remark', input: { id, remark, words } };
  return change(ctx, asked, async (trx): Promise<Result<{ readonly id: string }, AnswerRemarkRefusal>> => {
    const stored = await lockAmendment(trx, id);
    if (stored === null) return err({ kind: 'not-found' });
    const { amendment } = stored;
    const mayJudge = mayNow(ctx.actor, 'amendment.judge', ctx.now);
    const mayRead = amendment.authorId === who || (mayJudge.ok && mayModeratorsRead(amendment));
    if (!mayRead || (await findRemark(trx, id, remark)) === null) return err({ kind: 'not-found' });
    const answer = { id: newId(ctx.now), answerTo: remark, line: '', words, authorId: who, at: ctx.now };
    await insertRemark(trx, id, answer);
    return ok({ id: answer.id });
  });
}
