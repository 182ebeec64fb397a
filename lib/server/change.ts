import 'server-only';
import { setTimeout as wait } from 'node:timers/promises';
import { fingerprint } from '@/db/fingerprint';
import { findKeptRequest, insertRequestKey, keepAnswer, type NewRequest } from '@/db/request-keys';
import { answerLike } from '@/db/rows/request-key-row';
import { inTransaction, type Trx } from '@/db/transaction';
import { storedJson } from '@/db/well-formed';
import { canonicalJson, type Json } from '@/lib/kernel/canonical-json';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from './ctx';
import { errnoOf, fateOf } from './database-errors';
import { Unavailable } from './unavailable';

/** What a person asked for, as far as it decides whether two requests are one. */
export type ChangeRequest = {
  /** Of the form: one a submission. */
  readonly key: string;
  /** The account, or a guest's token. */
  readonly who: string;
  /** `accounts.sign-up`. */
  readonly act: string;
  /** What was asked, without secrets. */
  readonly input: Json;
};

/** `key-reused`: the key was spent on another request. `busy`: the same request is still at work, and its end was not to be seen. */
export type ChangeRefusal = { readonly kind: 'key-reused' } | { readonly kind: 'busy' };

type Work<V extends Json, E> = (trx: Trx) => Promise<Result<V, E>>;
type Outcome<V extends Json, E> = Result<V, E | ChangeRefusal>;

/** How long a person waits before they are told to try again. */
const PATIENCE_MS = 6000;
const DUPLICATE = 1062;
const LOCK_WAIT = 1205;

/**
 * Carries out a change that a person sent, exactly once: the key's row goes in first, so that its lock lines up double clicks;
 * then `work` runs, and what it answers is kept beside the key. A refusal rolls all of it back, the key too. What was certainly
 * rolled back is tried again; where a commit's end was not seen, the key tells whether it happened.
 * Throws `Unavailable` when the database gives no end within six seconds.
 */
export async function change<V extends Json, E>(ctx: Ctx, request: ChangeRequest, work: Work<V, E>): Promise<Outcome<V, E>> {
  const until = Date.now() + PATIENCE_MS;
  const kept = { ...request, inputHash: fingerprint(canonicalJson(request.input)), at: ctx.now };
  for (let tries = 0; ; tries += 1) {
    try {
      return await within(until, carryOut(ctx, kept, work));
    } catch (error) {
      const fate = fateOf(error);
      if (fate === 'broken' || error instanceof Unavailable) throw error;
      const pauseMs = Math.random() * Math.min(1000, 20 * 2 ** tries);
      if (fate === 'too-slow' || Date.now() + pauseMs >= until) throw new Unavailable(5, { cause: error });
      await wait(pauseMs);
    }
  }
}

/** Thrown at the key alone, so that a duplicate or a lock of the work's own is not taken for one of the key. */
class KeyFault extends Error {}

async function carryOut<V extends Json, E>(ctx: Ctx, kept: NewRequest, work: Work<V, E>): Promise<Outcome<V, E>> {
  try {
    return await attempt(ctx, kept, work);
  } catch (error) {
    if (!(error instanceof KeyFault)) throw error;
    return errnoOf(error.cause) === DUPLICATE ? replay(ctx, kept, work) : err({ kind: 'busy' });
  }
}

async function attempt<V extends Json, E>(ctx: Ctx, kept: NewRequest, work: Work<V, E>): Promise<Result<V, E>> {
  return inTransaction(ctx.db, async (trx) => {
    try {
      await insertRequestKey(trx, kept);
    } catch (error) {
      if ([DUPLICATE, LOCK_WAIT].includes(errnoOf(error) ?? 0)) throw new KeyFault('The key is taken', { cause: error });
      throw error;
    }
    const result = await work(trx);
    if (result.ok) await keepAnswer(trx, kept.key, storedJson(result.value));
    return result;
  });
}

/** What the first of these requests was answered; a refusal when it was another one. */
async function replay<V extends Json, E>(ctx: Ctx, kept: NewRequest, work: Work<V, E>): Promise<Outcome<V, E>> {
  const first = await findKeptRequest(ctx.db, kept.key);
  if (first === null) return err({ kind: 'busy' });
  const isSame = first.who === kept.who && first.act === kept.act && first.inputHash === kept.inputHash;
  return isSame ? ok(answerLike(first.answer, work)) : err({ kind: 'key-reused' });
}

/** A server that hangs sends no error: then the caller is told to come back, and the key tells them how it ended. */
async function within<T>(until: number, work: Promise<T>): Promise<T> {
  const over = new AbortController();
  const late = async (): Promise<never> => {
    await wait(Math.max(0, until - Date.now()), undefined, { signal: over.signal });
    throw new Unavailable(5, {});
  };
  work.catch(() => undefined); // when it fails after we have stopped listening
  try {
    return await Promise.race([work, late()]);
  } finally {
    over.abort();
  }
}
