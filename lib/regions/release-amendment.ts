import 'server-only';
import type { Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import type { VersionedInput } from './amendment-schema';
import { decideAmendment, type DecideRefusal } from './decide-amendment';

/** A moderator lets a held amendment go on: it waits as if it had just been sent, and approvals it had before count no more. */
export async function releaseAmendment(ctx: ActorCtx, input: VersionedInput): Promise<Result<null, DecideRefusal>> {
  return decideAmendment(ctx, input, { act: 'release', did: null, tell: null, reason: null });
}
