import knex from 'knex';
import { expect, test } from 'vitest';
import { z } from 'zod';
import { db } from '@/db/connection';
import { connectionTo, knexSettings } from '@/db/knex-settings';
import { logLine } from '@/lib/server/log';
import { retryAfterOf } from '@/lib/server/unavailable';
import { openHaltingLine } from '../builders/halting-line';

const variables = z.record(z.string(), z.union([z.string(), z.number()]));

async function sessionVariables(...names: readonly string[]): Promise<z.output<typeof variables>> {
  const row: unknown = await db.select(Object.fromEntries(names.map((name) => [name, db.raw('@@'.concat(name))]))).first();
  return variables.parse(row);
}

async function errnoOf(work: PromiseLike<unknown>): Promise<number | null> {
  try {
    await work;
    return null;
  } catch (error) {
    return z.object({ errno: z.number() }).parse(error).errno;
  }
}

const DENIED = [1142, 1044, 1227];

test('a session speaks UTF-8, lives in UTC, refuses bad data and notices when another was there first', async () => {
  const names = ['character_set_client', 'collation_connection', 'time_zone', 'innodb_snapshot_isolation', 'innodb_lock_wait_timeout'];
  expect(await sessionVariables(...names)).toEqual({
    character_set_client: 'utf8mb4',
    collation_connection: 'utf8mb4_unicode_ci',
    time_zone: '+00:00',
    innodb_snapshot_isolation: 1,
    innodb_lock_wait_timeout: 5,
  });
  expect((await sessionVariables('sql_mode'))['sql_mode']).toContain('STRICT_ALL_TABLES');
});

test('the server keeps what it has acknowledged and reads no file of a client', async () => {
  expect(await sessionVariables('innodb_flush_log_at_trx_commit', 'sync_binlog', 'log_bin', 'binlog_format', 'local_infile')).toEqual({
    innodb_flush_log_at_trx_commit: 1,
    sync_binlog: 1,
    log_bin: 1,
    binlog_format: 'ROW',
    local_infile: 0,
  });
});

test('legal dates and exact decimals come back as text, instants as instants', async () => {
  const row: unknown = await db
    .select({
      day: db.raw("CAST('2026-02-28' AS DATE)"),
      sum: db.raw('CAST(0.10 AS DECIMAL(20, 6))'),
      at: db.raw("CAST('2026-02-28 23:59:59.123' AS DATETIME(3))"),
    })
    .first();
  expect(row).toEqual({ day: '2026-02-28', sum: '0.100000', at: new Date('2026-02-28T23:59:59.123Z') });
});

test('emoji and Greek come back as they were sent', async () => {
  const row: unknown = await db.select({ said: db.raw('?', ['🏺 κεραμικά']) }).first();
  expect(row).toEqual({ said: '🏺 κεραμικά' });
});

test('an object in place of a value does not become SQL', async () => {
  const [rows] = z.tuple([z.array(z.unknown()), z.unknown()]).parse(await db.raw('SELECT ? AS said', [{ code: 1 }]));
  expect(rows).toEqual([{ said: '[object Object]' }]);
});

test('a statement that takes longer than five seconds is ended by the server', async () => {
  const timedOut = 1969;
  expect(await errnoOf(db.raw('SELECT SLEEP(20) FROM DUAL WHERE SLEEP(20) = 0'))).toBe(timedOut);
}, 15_000);

test.each(['DROP TABLE regions', 'ALTER TABLE regions ADD COLUMN more INT', 'CREATE TABLE more (id INT PRIMARY KEY)', 'TRUNCATE regions'])(
  'the application may not change tables: %s',
  async (statement) => {
    expect(DENIED).toContain(await errnoOf(db.raw(statement)));
  },
);

test('the application may not read the accounts, the notes of the migrations, or write files', async () => {
  expect(DENIED).toContain(await errnoOf(db.raw('SELECT * FROM mysql.user')));
  expect(DENIED).toContain(await errnoOf(db('knex_migrations').select('*')));
  expect([...DENIED, 1045]).toContain(await errnoOf(db.raw("SELECT 1 INTO OUTFILE '/tmp/footring-written'")));
});

test('SRV-21 S40 an error of the database names the statement, and no value that was in it', async () => {
  const fault: unknown = await db('sessions')
    .insert({ agent: 'kestrel glaze', nowhere: 'kept secret' })
    .catch((error: unknown) => error);
  const line = logLine('error', { error: fault }, new Date());
  expect(line).toContain('insert into `sessions`');
  expect(line).not.toMatch(/kestrel|kept secret/);
});

test('SRV-20 S50 a server that stops in the middle of a statement holds nobody, and goes on being asked afterwards', async () => {
  const url = z.string().parse(process.env['DATABASE_URL']);
  const line = await openHaltingLine(url);
  const own = knex({ ...knexSettings({ statementSeconds: 1, most: 2 }), connection: connectionTo(line.url) });
  const ask = async (): Promise<unknown> => own.select({ one: own.raw('1') }).first();
  expect(await ask()).toEqual({ one: 1 });
  line.halt();
  const fault: unknown = await ask().catch((error: unknown) => error);
  expect(retryAfterOf(fault)).toBe(5);
  const inTrx: unknown = await own.transaction((trx) => trx.select(trx.raw('1'))).catch((error: unknown) => error);
  expect(retryAfterOf(inTrx)).toBe(5);
  line.goOn();
  // A connection that was being opened meanwhile may still fail whoever waits for it.
  await expect.poll(() => ask().catch(() => null), { timeout: 10_000 }).toEqual({ one: 1 });
  await own.destroy();
  line.end();
}, 20_000);
