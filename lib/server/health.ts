import 'server-only';
import type { Knex } from 'knex';
import { findAnySheet } from '@/db/editions';
import { log } from './log';

/** Whether the database answers a read of a real table; a node that only answers `SELECT 1` may still refuse every query. */
export async function isDatabaseAlive(db: Knex): Promise<boolean> {
  try {
    await findAnySheet(db);
    return true;
  } catch (error) {
    log.error({ error, doing: 'health' });
    return false;
  }
}
