import 'server-only';
import type { SignedIn } from '@/lib/access/domain/actor';
import { mayNow, type AccessRefusal, type Action } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';

/** Whoever is signed in, if their role lets them do that now. The tie to the record is judged after it. */
export function askSignedIn(ctx: ActorCtx, action: Action): Result<SignedIn, AccessRefusal> {
  const may = mayNow(ctx.actor, action, ctx.now);
  if (!may.ok) return may;
  return ctx.actor.kind === 'account' ? ok(ctx.actor) : err({ kind: 'sign-in' });
}
