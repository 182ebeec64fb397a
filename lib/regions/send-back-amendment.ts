import 'server-only';
import type { Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import type { DecisionInput } from './amendment-schema';
import { decideAmendment, type DecideRefusal } from './decide-amendment';

/** A moderator gives an amendment back to its author with what is to be mended. */
export async function sendBackAmendment(ctx: ActorCtx, { reason, ...input }: DecisionInput): Promise<Result<null, DecideRefusal>> {
  return decideAmendment(ctx, input, { act: 'send-back', did: 'amendment.send-back', tell: 'returned', reason });
}
