import 'server-only';
import { lockDoubt, moveDoubt } from '@/db/doubts';
import { mayNow } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change } from '@/lib/server/change';
import type { AnswerDoubtRefusal } from './answer-doubt';
import type { TakeUpInput } from './doubt-schema';

/** Takes a doubt up again that was put aside: it waits as before. */
export async function takeDoubtUp(ctx: ActorCtx, { key, id }: TakeUpInput): Promise<Result<null, AnswerDoubtRefusal>> {
  const may = mayNow(ctx.actor, 'doubt.answer', ctx.now);
  if (!may.ok) return may;
  if (ctx.actor.kind !== 'account') return err({ kind: 'sign-in' });
  const asked = { key, who: ctx.actor.id, act: 'regions.take-doubt-up', input: { id } };
  return change(ctx, asked, async (trx): Promise<Result<null, AnswerDoubtRefusal>> => {
    if ((await lockDoubt(trx, id)) === null) return err({ kind: 'not-found' });
    return (await moveDoubt(trx, id, 'set-aside', { state: 'waiting' })) ? ok(null) : err({ kind: 'doubt-moved-on' });
  });
}
