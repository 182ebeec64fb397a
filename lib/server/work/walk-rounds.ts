import 'server-only';
import type { Knex } from 'knex';
import { claimRound } from '@/db/rounds';
import { log } from '../log';
import type { Round } from './job-handler';

/** Walks the rounds that are due. One that fails is logged and does not keep the others from being walked. */
export async function walkDueRounds(db: Knex, rounds: readonly Round[], signal: AbortSignal): Promise<void> {
  for (const { name, everyMs, walk } of rounds) {
    if (signal.aborted) return;
    try {
      if (!(await claimRound(db, name, everyMs))) continue;
      const rows = await walk({ db, now: new Date() });
      if (rows > 0) log.info({ doing: 'round', name, rows });
    } catch (error) {
      log.error({ doing: 'round', name, error });
    }
  }
}
