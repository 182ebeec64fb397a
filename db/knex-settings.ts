import type { Knex } from 'knex';

const SQL_MODE = 'STRICT_ALL_TABLES,ERROR_FOR_DIVISION_BY_ZERO,NO_ENGINE_SUBSTITUTION,ONLY_FULL_GROUP_BY';

/** What every session relies on is set by the session itself, so that a server with other settings cannot change an answer. */
const SESSION = [
  'SET NAMES utf8mb4 COLLATE utf8mb4_unicode_ci',
  `SET SESSION time_zone = '+00:00', SESSION sql_mode = '${SQL_MODE}', SESSION innodb_snapshot_isolation = ON, SESSION innodb_lock_wait_timeout = 5`,
];

type Done = (error: unknown, ...rest: unknown[]) => void;
type Session = { query: (said: string | object, ...rest: unknown[]) => unknown; destroy: () => void };

const isDone = (given: unknown): given is Done => typeof given === 'function';
const isSilence = (error: unknown): boolean => error instanceof Error && 'code' in error && error.code === 'PROTOCOL_SEQUENCE_TIMEOUT';

/** What mysql2 understands though Knex's types do not know of it. An object given for a value would else become a piece of SQL. */
const BEYOND_KNEX = { dateStrings: ['DATE'], stringifyObjects: true };

/** Where a `mysql://` address leads, and how values come back: legal dates stay text, exact decimals stay text, instants are UTC. */
export function connectionTo(url: string): Knex.MySql2ConnectionConfig {
  const { hostname, port, username, password, pathname } = new URL(url);
  const settings: Knex.MySql2ConnectionConfig = {
    host: hostname,
    port: port === '' ? 3306 : Number(port),
    user: decodeURIComponent(username),
    password: decodeURIComponent(password),
    ...(pathname.length > 1 ? { database: decodeURIComponent(pathname.slice(1)) } : {}),
    charset: 'utf8mb4',
    timezone: 'Z',
    decimalNumbers: false,
    supportBigNumbers: true,
    connectTimeout: 3000,
  };
  return Object.assign(settings, BEYOND_KNEX);
}

/** A pool whose callers wait no longer than a reader would. No limit of seconds is for steps that change tables. */
export function knexSettings({
  statementSeconds = 0,
  most = 10,
}: {
  readonly statementSeconds?: number;
  readonly most?: number;
}): Knex.Config {
  const statements = [...SESSION, `SET SESSION max_statement_time = ${statementSeconds}`];
  return {
    client: 'mysql2',
    acquireConnectionTimeout: 3000,
    // An error is logged: its statement may be read there, the values in it (hashes, mails, people) may not.
    compileSqlOnError: false,
    // What fails is thrown as well, and logged once by whoever catches it.
    log: { error: () => undefined, warn: warnOfMisuse },
    pool: {
      min: 0,
      max: most,
      afterCreate(session: Session, done: (error: unknown, session: Session) => void): void {
        prepare(session, statements, (error) => {
          if (statementSeconds > 0) leaveSilence(session, statementSeconds * 1000 + 500);
          done(error, session);
        });
      },
    },
    migrations: { directory: './db/migrations', extension: 'ts', loadExtensions: ['.ts'] },
    seeds: { directory: './db/seeds', extension: 'ts', loadExtensions: ['.ts'] },
  };
}

function warnOfMisuse(message: string): void {
  if (!message.startsWith('Acquire connection error')) process.emitWarning(message);
}

function prepare(session: Session, [statement, ...rest]: readonly string[], done: (error: unknown) => void): void {
  if (statement === undefined) {
    done(null);
    return;
  }
  session.query(statement, (error: unknown) => {
    if (error === null) prepare(session, rest, done);
    else done(error);
  });
}

/**
 * A server that hangs ends no statement and closes no connection. What got no answer in time is given up, and its connection with it, so
 * that nobody waits for ever; whether the statement was carried out is not known.
 */
function leaveSilence(session: Session, timeout: number): void {
  const query = session.query.bind(session);
  session.query = (said, ...rest) => {
    const options = typeof said === 'string' ? { sql: said, timeout } : { ...said, timeout };
    const done = rest.pop();
    if (!isDone(done)) return query(options, ...rest, done);
    return query(options, ...rest, (error: unknown, ...answer: unknown[]) => {
      if (isSilence(error)) session.destroy();
      done(error, ...answer);
    });
  };
}
