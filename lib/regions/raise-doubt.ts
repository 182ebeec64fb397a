import 'server-only';
import { hasDoubtTrace, insertDoubt } from '@/db/doubts';
import { mayNow, type AccessRefusal } from '@/lib/access/domain/policy';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { stampAge } from '@/lib/server/form-stamp';
import { giveBack, take, type TooMany } from '@/lib/server/limits';
import { newId } from '@/lib/server/new-id';
import { keyedHash } from '@/lib/server/seal';
import { stampFault, type StampFault } from './domain/doubt';
import type { DoubtInput } from './doubt-schema';
import { readRule } from './read-rule';

export type DoubtRefusal = AccessRefusal | TooMany | { readonly kind: 'not-found' } | { readonly kind: StampFault };

/**
 * Puts down that a reader holds a rule to be wrong. The same words from the same address on the same day are one doubt, however
 * often they come. Nothing is kept of who wrote it: the trace that tells this is a keyed hash, which the worker drops after a day.
 */
export async function raiseDoubt(ctx: ActorCtx, input: DoubtInput): Promise<Result<null, DoubtRefusal>> {
  const may = mayNow(ctx.actor, 'doubt.raise', ctx.now);
  if (!may.ok) return may;
  const { rule, words, elsewhere, link, stamp } = input;
  const found = await readRule(ctx, rule);
  if (!found.ok || found.value.withdrawn) return err({ kind: 'not-found' });
  const fault = stampFault(stampAge(rule, stamp, ctx.now));
  if (fault !== null) return err({ kind: fault });
  const trace = keyedHash('doubt', JSON.stringify([calendarDateOf(ctx.now), ctx.from, rule, words.toLowerCase(), elsewhere, link]));
  if (await hasDoubtTrace(ctx.db, trace)) return ok(null);
  const taken = await takeOne(ctx);
  if (!taken.ok) return taken;
  const region = found.value.sheet.code;
  await insertDoubt(ctx.db, { id: newId(ctx.now), region, rule, words, elsewhere, link, trace, at: ctx.now });
  return ok(null);
}

/** Counts one for the hour and one for the day, or none. */
async function takeOne(ctx: ActorCtx): Promise<Result<null, TooMany>> {
  const hour = await take('doubt-hour', ctx.from, ctx);
  if (!hour.ok) return hour;
  const day = await take('doubt-day', ctx.from, ctx);
  if (!day.ok) await giveBack('doubt-hour', ctx.from, ctx);
  return day;
}
