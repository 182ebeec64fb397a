import 'server-only';
import { writeDayBook } from '@/db/day-book';
import { lockDoubt, moveDoubt } from '@/db/doubts';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { change, type ChangeRefusal } from '@/lib/server/change';
import type { AnswerDoubtInput } from './doubt-schema';

export type AnswerDoubtRefusal = AccessRefusal | ChangeRefusal | { readonly kind: 'not-found' | 'doubt-moved-on' };

/** Answers a doubt that waits: from then on it stands on its rule, with the answer. The day book tells that, and none of the words. */
export async function answerDoubt(ctx: ActorCtx, { key, id, answer }: AnswerDoubtInput): Promise<Result<null, AnswerDoubtRefusal>> {
  const own = askSignedIn(ctx, 'doubt.answer');
  if (!own.ok) return own;
  const by = own.value.id;
  return change(
    ctx,
    { key, who: by, act: 'regions.answer-doubt', input: { id, answer } },
    async (trx): Promise<Result<null, AnswerDoubtRefusal>> => {
      const doubt = await lockDoubt(trx, id);
      if (doubt === null) return err({ kind: 'not-found' });
      const end = { state: 'answered', answer, by, at: ctx.now } as const;
      if (!(await moveDoubt(trx, id, 'waiting', end))) return err({ kind: 'doubt-moved-on' });
      const details = { region: doubt.region, rule: doubt.rule };
      await writeDayBook(trx, { did: 'doubt.answer', subject: { kind: 'doubt', id }, actorId: by, reason: null, details, at: ctx.now });
      return ok(null);
    },
  );
}
