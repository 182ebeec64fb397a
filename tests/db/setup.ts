import { rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import knex, { type Knex } from 'knex';
import { afterAll, inject } from 'vitest';
import { z } from 'zod';
import { grantApplication } from '../../db/grants';
import { connectionTo, knexSettings } from '../../db/knex-settings';
import { migrate } from '../../db/migrator';

/*
 * Runs before every test file: this worker's own database is there, up to date and empty. Tests reach it as the application does,
 * through db/connection and with the application's rights; DATABASE_OWNER_URL is there for what only the owner may do.
 */
const name = `footring_test_${process.env['VITEST_POOL_ID'] ?? '1'}`;
/** Of this very file of tests: others may run beside it on the same machine. */
const store = join(tmpdir(), `${name}-${String(process.pid)}`);
const BOOKKEEPING = ['knex_migrations', 'knex_migrations_lock'];

function at(url: string, database: string): string {
  const address = new URL(url);
  address.pathname = `/${database}`;
  return address.href;
}

function connect(url: string): Knex {
  return knex({ ...knexSettings({ most: 2 }), connection: connectionTo(url) });
}

async function during<T>(url: string, work: (db: Knex) => Promise<T>): Promise<T> {
  const db = connect(url);
  try {
    return await work(db);
  } finally {
    await db.destroy();
  }
}

async function empty(owner: Knex): Promise<void> {
  const rows: unknown = await owner('information_schema.tables')
    .where({ table_schema: name, table_type: 'BASE TABLE' })
    .select({ table: 'table_name' });
  const tables = z
    .array(z.object({ table: z.string() }))
    .parse(rows)
    .map(({ table }) => table);
  await owner.transaction(async (trx) => {
    await trx.raw('SET SESSION foreign_key_checks = 0');
    for (const table of tables.filter((one) => !BOOKKEEPING.includes(one))) await trx(table).delete();
    await trx.raw('SET SESSION foreign_key_checks = 1');
  });
}

process.env['DATABASE_URL'] = at(inject('appUrl'), name);
process.env['DATABASE_OWNER_URL'] = at(inject('ownerUrl'), name);
process.env['FOOTRING_SECRET'] = Buffer.from('footring tests, not a secret one').toString('base64');
process.env['FOOTRING_SITE'] = 'http://footring.example.test';
process.env['FOOTRING_API_PER_MINUTE'] = '1000000';
process.env['FOOTRING_STORE_DIR'] = store;

await during(inject('ownerUrl'), (owner) =>
  owner.raw('CREATE DATABASE IF NOT EXISTS ?? CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci', [name]),
);
await during(at(inject('ownerUrl'), name), async (owner) => {
  await migrate(owner);
  await during(at(inject('appUrl'), ''), (application) => grantApplication(owner, application));
  await empty(owner);
});

afterAll(async () => {
  const { db } = await import('../../db/connection');
  await db.destroy();
  await rm(store, { recursive: true, force: true });
});
