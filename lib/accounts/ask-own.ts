import 'server-only';
import type { SignedIn } from '@/lib/access/domain/actor';
import { mayNow, type AccessRefusal, type Action } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';

/** Whoever is signed in, if they may do that now: an account only ever acts on itself here. */
export function askOwn(ctx: ActorCtx, action: Action): Result<SignedIn, AccessRefusal> {
  const may = mayNow(ctx.actor, action, ctx.now);
  if (!may.ok) return may;
  return ctx.actor.kind === 'account' ? ok(ctx.actor) : err({ kind: 'sign-in' });
}
