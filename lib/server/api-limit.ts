import 'server-only';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from './ctx';
import { readEnv } from './env';
import { takeMany, type TooMany } from './limits';

/**
 * Requests paid for in advance, by address. The database holds the true count for all processes; asked once for many requests, it
 * costs each of them little. What a process has taken and not used is lost at the end of the minute, to the caller's disadvantage.
 */
type Advance = { left: number; readonly untilMs: number; readonly next: number };
type Refusal = { readonly untilMs: number };

/** How many the first question of a minute is for; each further one is for twice as many, up to the most. */
const FIRST = 20;
const MOST = 160;
const MOST_ADDRESSES = 10_000;

const advances = new Map<string, Advance>();
const refused = new Map<string, Refusal>();
const asking = new Map<string, Promise<Result<null, TooMany>>>();

/** Counts one request of the public API from an address. */
export async function takeApiCall(from: string, ctx: Ctx): Promise<Result<null, TooMany>> {
  for (;;) {
    if (isPaid(from)) return ok(null);
    const refusal = refused.get(from);
    if (refusal !== undefined && refusal.untilMs > Date.now()) return tooMany(refusal.untilMs);
    const asked = await (asking.get(from) ?? askOnce(from, ctx));
    if (!asked.ok) return asked;
  }
}

function isPaid(from: string): boolean {
  const advance = advances.get(from);
  if (advance === undefined || advance.left === 0 || advance.untilMs <= Date.now()) return false;
  advance.left -= 1;
  return true;
}

const tooMany = (untilMs: number): Result<never, TooMany> =>
  err({ kind: 'too-many', retryAfterS: Math.max(1, Math.ceil((untilMs - Date.now()) / 1000)) });

/** Requests that come at once share one question. */
function askOnce(from: string, ctx: Ctx): Promise<Result<null, TooMany>> {
  const asked = askDatabase(from, ctx).finally(() => asking.delete(from));
  asking.set(from, asked);
  return asked;
}

async function askDatabase(from: string, ctx: Ctx): Promise<Result<null, TooMany>> {
  const last = advances.get(from);
  const points = last !== undefined && last.untilMs > Date.now() ? last.next : Math.min(FIRST, readEnv().apiPerMinute);
  const taken = await takeMany('api', from, ctx, points);
  if (!taken.ok) {
    remember(refused, from, { untilMs: Date.now() + taken.error.retryAfterS * 1000 });
    return taken;
  }
  // Never more than is left, so that the last of a minute are not refused with those that are too many.
  const next = Math.max(1, Math.min(points * 2, MOST, taken.value.remaining));
  remember(advances, from, { left: points, untilMs: Date.now() + taken.value.msBeforeNext, next });
  return ok(null);
}

function remember<T>(all: Map<string, T>, from: string, value: T): void {
  all.delete(from);
  all.set(from, value);
  const [oldest] = all.keys();
  if (all.size > MOST_ADDRESSES && oldest !== undefined) all.delete(oldest);
}
