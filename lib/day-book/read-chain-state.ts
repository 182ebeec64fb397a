import 'server-only';
import { findDayBookEnd, listDayBookAfter } from '@/db/day-book';
import { findDayBookCheck } from '@/db/day-book-checks';
import { fingerprint } from '@/db/fingerprint';
import type { Ctx } from '@/lib/server/ctx';
import { BEGINNING, firstBreak, type Break } from './domain/entry';

/** `lines`: up to which line the chain was seen to hold. `checkedAt`: when a worker last read it all. */
export type ChainState = {
  readonly lines: number;
  /** How many there are; more than `lines` when so many came since the last reading that a page does not catch up. */
  readonly written: number;
  readonly checkedAt: Date | null;
  readonly break: Break | null;
};

/** A page reads at most that many lines beyond those a worker has read. */
const CATCH_UP = 1000;

const NOTHING = { number: 0, hash: BEGINNING };

/** Whether the day book holds: what the worker found when it last read it all, and the lines since then read now. */
export async function readChainState(ctx: Ctx): Promise<ChainState> {
  const check = await findDayBookCheck(ctx.db);
  // The end first: a line that is written in between is then read, and not missed.
  const end = ((await findDayBookEnd(ctx.db)) ?? NOTHING).number;
  const now =
    check === null || check.break === null ? await catchUp(ctx, check ?? NOTHING, end) : { lines: check.number, break: check.break };
  return { ...now, written: Math.max(now.lines, end), checkedAt: check?.checkedAt ?? null };
}

type Known = { readonly number: number; readonly hash: string };

async function catchUp(ctx: Ctx, known: Known, end: number): Promise<Pick<ChainState, 'lines' | 'break'>> {
  const fresh = await listDayBookAfter(ctx.db, known.number, CATCH_UP);
  const found = firstBreak(fresh, known, fingerprint);
  if (found !== null) return { lines: found.number - 1, break: found };
  const lines = fresh.at(-1)?.number ?? known.number;
  const isCutOff = end < known.number || (fresh.length < CATCH_UP && lines < end);
  return { lines, break: isCutOff ? { number: Math.min(lines, end) + 1, why: 'cut-off' } : null };
}
