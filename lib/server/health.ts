import 'server-only';
import type { Knex } from 'knex';
import { findAnySheet } from '@/db/editions';
import { isAnyMailLate, isAnyMailParked } from '@/db/outbox';
import { isAnyWorkerSeen } from '@/db/workers';
import { isStoreWell } from './file-store/own-store';
import { log } from './log';

export type Health = {
  readonly database: 'ok' | 'unavailable';
  /** Whether a worker was seen within half a minute. */
  readonly worker: 'ok' | 'away';
  /** `parked`: a mail waits for a steward. `late`: one has been due for ten minutes. */
  readonly mail: 'ok' | 'late' | 'parked' | 'unknown';
  /** Whether uploads can be kept and read. */
  readonly store: 'ok' | 'down';
};

const SEEN_MS = 30_000;
const LATE_MS = 600_000;

/** How the parts are. The database is asked for a row of a real table: a node that answers `SELECT 1` may still refuse every query. */
export async function readHealth(db: Knex): Promise<Health> {
  const store = (await isStoreWell()) ? 'ok' : 'down';
  try {
    await findAnySheet(db);
    const worker = (await isAnyWorkerSeen(db, SEEN_MS)) ? 'ok' : 'away';
    return { database: 'ok', worker, mail: await mailHealth(db), store };
  } catch (error) {
    log.error({ error, doing: 'health' });
    return { database: 'unavailable', worker: 'away', mail: 'unknown', store };
  }
}

async function mailHealth(db: Knex): Promise<Health['mail']> {
  if (await isAnyMailParked(db)) return 'parked';
  return (await isAnyMailLate(db, LATE_MS)) ? 'late' : 'ok';
}
