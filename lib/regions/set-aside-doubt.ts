import 'server-only';
import { lockDoubt, moveDoubt } from '@/db/doubts';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { change } from '@/lib/server/change';
import type { AnswerDoubtRefusal } from './answer-doubt';
import type { SetAsideInput } from './doubt-schema';

/** Puts a doubt that waits aside, as advertising or as no doubt at all. It can be taken up again. */
export async function setAsideDoubt(ctx: ActorCtx, { key, id, reason }: SetAsideInput): Promise<Result<null, AnswerDoubtRefusal>> {
  const own = askSignedIn(ctx, 'doubt.answer');
  if (!own.ok) return own;
  const by = own.value.id;
  return change(
    ctx,
    { key, who: by, act: 'regions.set-aside-doubt', input: { id, reason } },
    async (trx): Promise<Result<null, AnswerDoubtRefusal>> => {
      if ((await lockDoubt(trx, id)) === null) return err({ kind: 'not-found' });
      const isMoved = await moveDoubt(trx, id, 'waiting', { state: 'set-aside', why: reason, by, at: ctx.now });
      return isMoved ? ok(null) : err({ kind: 'doubt-moved-on' });
    },
  );
}
