import 'server-only';
import { createHash } from 'node:crypto';
import type { Knex } from 'knex';
import { RateLimiterMySQL, RateLimiterRes } from 'rate-limiter-flexible';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from './ctx';
import { fateOf } from './database-errors';
import { readEnv } from './env';

const MINUTE_S = 60;

/** How often something may be done within how long. What is counted is named where it is taken. */
const LIMITS = {
  /** Failures to sign in to one account from one address: the owner elsewhere is not locked out by a stranger. */
  'sign-in-account': { times: 10, withinS: 15 * MINUTE_S },
  /** Failures to sign in from one address. */
  'sign-in-address': { times: 50, withinS: 15 * MINUTE_S },
  /** Mails to set a new password, by the address they go to. */
  'reset-mail': { times: 5, withinS: 60 * MINUTE_S },
  /** Mails with a link to sign in or to confirm, by the address they go to. */
  'link-mail': { times: 5, withinS: 60 * MINUTE_S },
  /** New accounts from one address. */
  'sign-up': { times: 10, withinS: 60 * MINUTE_S },
  /** Regions asked for from one address. */
  wish: { times: 20, withinS: 60 * MINUTE_S },
  /** Doubts raised from one address, in an hour and in a day. */
  'doubt-hour': { times: 5, withinS: 60 * MINUTE_S },
  'doubt-day': { times: 20, withinS: 24 * 60 * MINUTE_S },
  /** Files one person sends, kept or refused: each costs a look at its content. */
  upload: { times: 120, withinS: 60 * MINUTE_S },
} as const;

export type LimitName = keyof typeof LIMITS | 'api';
export type TooMany = { readonly kind: 'too-many'; readonly retryAfterS: number };

/**
 * Counts one more of `name` for `subject`, and refuses when that is more than the limit. Counted in the database before the act, so
 * that a burst at many processes passes no more than the limit; `giveBack` returns what turned out not to count.
 * Subjects are kept hashed: the table names nobody.
 */
export async function take(name: LimitName, subject: string, ctx: Ctx): Promise<Result<null, TooMany>> {
  const taken = await takeMany(name, subject, ctx, 1);
  return taken.ok ? ok(null) : taken;
}

export type Taken = { readonly msBeforeNext: number; readonly remaining: number };

/** Takes several at once, all or none. Answers with what is left, and the milliseconds until counting begins anew. */
export async function takeMany(name: LimitName, subject: string, ctx: Ctx, points: number): Promise<Result<Taken, TooMany>> {
  for (let tries = 0; ; tries += 1) {
    try {
      const { msBeforeNext, remainingPoints } = await limiterOf(ctx.db, name).consume(keyOf(subject), points);
      return ok({ msBeforeNext, remaining: remainingPoints });
    } catch (error) {
      if (error instanceof RateLimiterRes) return err({ kind: 'too-many', retryAfterS: Math.max(1, Math.ceil(error.msBeforeNext / 1000)) });
      if (fateOf(error) !== 'rolled-back' || tries >= 5) throw error;
    }
  }
}

/** Returns one: the password was right after all, or no mail had to be sent. */
export async function giveBack(name: LimitName, subject: string, ctx: Ctx): Promise<void> {
  await limiterOf(ctx.db, name).reward(keyOf(subject), 1);
}

/** Forgets all that was counted for a subject. */
export async function forgetCount(name: LimitName, subject: string, ctx: Ctx): Promise<void> {
  await limiterOf(ctx.db, name).delete(keyOf(subject));
}

const keyOf = (subject: string): string => createHash('sha256').update(subject).digest('base64url');

const limiters = new WeakMap<Knex, Map<LimitName, RateLimiterMySQL>>();

function limiterOf(db: Knex, name: LimitName): RateLimiterMySQL {
  const ofPool = limiters.get(db) ?? new Map<LimitName, RateLimiterMySQL>();
  limiters.set(db, ofPool);
  const found = ofPool.get(name) ?? makeLimiter(db, name);
  ofPool.set(name, found);
  return found;
}

function makeLimiter(db: Knex, name: LimitName): RateLimiterMySQL {
  const { times, withinS } = name === 'api' ? { times: readEnv().apiPerMinute, withinS: MINUTE_S } : LIMITS[name];
  return new RateLimiterMySQL({
    storeClient: db,
    storeType: 'knex',
    dbName: decodeURIComponent(new URL(readEnv().databaseUrl).pathname.slice(1)),
    tableName: 'limits',
    tableCreated: true, // by a migration: the application may make none
    clearExpiredByTimeout: false, // the worker does that
    keyPrefix: name,
    points: times,
    duration: withinS,
  });
}
