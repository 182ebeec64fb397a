import 'server-only';
import { fateOf } from './database-errors';

/** The database could not carry this out in time. The doors answer 503 and say when to try again. */
export class Unavailable extends Error {
  constructor(
    readonly retryAfterS: number,
    options: ErrorOptions,
  ) {
    super('The database does not answer in time', options);
    this.name = 'Unavailable';
  }
}

const RETRY_AFTER_S = 5;

/** Seconds after which it is worth trying again; null for a fault that waiting does not mend. */
export function retryAfterOf(error: unknown): number | null {
  if (error instanceof Unavailable) return error.retryAfterS;
  return fateOf(error) === 'broken' ? null : RETRY_AFTER_S;
}
