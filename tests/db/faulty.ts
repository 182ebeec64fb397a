import knex, { type Knex } from 'knex';
import { z } from 'zod';
import { connectionTo, knexSettings } from '@/db/knex-settings';

/** What befalls a statement: it is refused as after a deadlock, its connection dies before it arrives, or after it was carried out. */
export type Fault = 'rolled-back' | 'lost-before' | 'lost-after';
export const FAULTS: readonly Fault[] = ['rolled-back', 'lost-before', 'lost-after'];

type Done = (error: Error | null, ...rest: unknown[]) => void;
/** Knex gives values between the statement and the callback, others may leave them out. */
type Query = (options: unknown, ...rest: unknown[]) => unknown;
type Connection = { query: Query; destroy: () => void };
type AfterCreate = (connection: Connection, done: (error: Error | null, connection: Connection) => void) => void;

export type FaultyPool = {
  readonly db: Knex;
  /** Statements since `plan` was called, COMMIT and ROLLBACK among them. */
  readonly seen: () => number;
  /** From now on, `fault` befalls the statements for which `when` holds, counted from 1. */
  readonly plan: (fault: Fault, when: (statement: number) => boolean) => void;
};

const deadlock = (): Error => Object.assign(new Error('Deadlock found when trying to get lock'), { errno: 1213, code: 'ER_LOCK_DEADLOCK' });
const lost = (): Error => Object.assign(new Error('Connection lost'), { code: 'PROTOCOL_CONNECTION_LOST', fatal: true });

/** The application's pool, whose statements fail as planned, at the place where the driver hands them to the server. */
export function openFaultyPool(): FaultyPool {
  let count = 0;
  let fault: Fault = 'rolled-back';
  let when = (_: number): boolean => false;
  const settings = knexSettings({ statementSeconds: 5, most: 4 });
  const prepare = settings.pool?.afterCreate as AfterCreate;

  const spoil = (connection: Connection): void => {
    const query = connection.query.bind(connection);
    connection.query = (options, ...rest) => {
      count += 1;
      if (!when(count)) return query(options, ...rest);
      const done = rest.at(-1) as Done;
      if (fault === 'rolled-back') {
        // The server has rolled the whole transaction back by the time it says so.
        return query('ROLLBACK', [], () => {
          done(deadlock());
        });
      }
      const die: Done = () => {
        connection.destroy();
        done(lost());
      };
      if (fault === 'lost-after') return query(options, ...rest.slice(0, -1), die);
      die(null);
      return undefined;
    };
  };

  const afterCreate: AfterCreate = (connection, done) => {
    prepare(connection, (error, ready) => {
      spoil(ready);
      done(error, ready);
    });
  };
  const db = knex({
    ...settings,
    pool: { ...settings.pool, afterCreate },
    connection: connectionTo(z.string().parse(process.env['DATABASE_URL'])),
  });
  return {
    db,
    seen: () => count,
    plan(next, on) {
      count = 0;
      fault = next;
      when = on;
    },
  };
}
