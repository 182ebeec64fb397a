import 'server-only';
import type { Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import type { DecisionInput } from './amendment-schema';
import { decideAmendment, type DecideRefusal } from './decide-amendment';

/** A moderator holds an amendment with a reason: it stays in the queue, and nobody approves it meanwhile. */
export async function holdAmendment(ctx: ActorCtx, { reason, ...input }: DecisionInput): Promise<Result<null, DecideRefusal>> {
  return decideAmendment(ctx, input, { act: 'hold', did: 'amendment.hold', tell: 'held', reason });
}
