/** What became of a transaction whose statement failed with this error. */
export type Fate =
  /** Certainly rolled back: it may be tried again. */
  | 'rolled-back'
  /** The connection died, or there was none: it may have been committed. */
  | 'unknown'
  /** The statement took too long and was ended; trying again would take as long. */
  | 'too-slow'
  /** A fault that trying again does not mend. */
  | 'broken';

/** Deadlock, lost race for a snapshot, lock wait, node not ready, server going down, connection or query killed, read-only server. */
const ROLLED_BACK = new Set([1213, 1020, 1205, 1047, 1053, 1317, 1927, 1290]);
const TOO_MANY_CONNECTIONS = new Set([1040, 1203]);
const TOO_SLOW = 1969;
const LOST =
  /PROTOCOL_CONNECTION_LOST|PROTOCOL_SEQUENCE_TIMEOUT|ECONNRESET|ECONNREFUSED|EPIPE|ETIMEDOUT|ENOTFOUND|EAI_AGAIN|ER_ERROR_DURING_COMMIT|KnexTimeoutError|closed state|Acquire connection|ended by the other|Connection lost/;

const textOf = (value: unknown): string => (typeof value === 'string' ? value : '');

/** The number that MariaDB gives an error; null for one that is not from the server. */
export function errnoOf(error: unknown): number | null {
  return error instanceof Error && 'errno' in error && typeof error.errno === 'number' ? error.errno : null;
}

/** Sorts what the driver and Knex throw. */
export function fateOf(error: unknown): Fate {
  if (!(error instanceof Error)) return 'broken';
  const errno = errnoOf(error) ?? 0;
  if (ROLLED_BACK.has(errno)) return 'rolled-back';
  if (errno === TOO_SLOW) return 'too-slow';
  if (TOO_MANY_CONNECTIONS.has(errno)) return 'unknown';
  const code = 'code' in error ? textOf(error.code) : '';
  return LOST.test(`${code} ${error.name} ${error.message}`) ? 'unknown' : 'broken';
}
