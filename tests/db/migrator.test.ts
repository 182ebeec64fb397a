import knex, { type Knex } from 'knex';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { z } from 'zod';
import { connectionTo, knexSettings } from '@/db/knex-settings';
import { migrate } from '@/db/migrator';

let owner: Knex;
let other: Knex;
beforeAll(() => {
  const connection = connectionTo(z.string().parse(process.env['DATABASE_OWNER_URL']));
  owner = knex({ ...knexSettings({ most: 1 }), connection });
  other = knex({ ...knexSettings({ most: 1 }), connection });
});
afterAll(async () => {
  await owner.destroy();
  await other.destroy();
});

const lock = (db: Knex, locked: 0 | 1) => db('knex_migrations_lock').update({ is_locked: locked });

test('there is nothing to do twice', async () => {
  expect(await migrate(owner)).toEqual([]);
});

test('the lock of a migrator that was killed is taken away', async () => {
  await lock(owner, 1);
  expect(await migrate(owner)).toEqual([]);
  expect(await owner('knex_migrations_lock').select('is_locked')).toEqual([{ is_locked: 0 }]);
});

test('the lock of a migrator that lives is left alone, until patience ends', async () => {
  await lock(other, 1); // and stays connected
  await expect(migrate(owner, 300)).rejects.toThrow('Another migration is at work');
  expect(await owner('knex_migrations_lock').select('is_locked')).toEqual([{ is_locked: 1 }]);
  const waiting = migrate(owner);
  await lock(other, 0);
  expect(await waiting).toEqual([]);
});

test('every table has a primary key, without which a cluster cannot tell its rows apart', async () => {
  const rows: unknown = await owner('information_schema.tables as t')
    .leftJoin('information_schema.table_constraints as c', function () {
      this.on('c.table_schema', 't.table_schema').andOn('c.table_name', 't.table_name').andOnVal('c.constraint_type', 'PRIMARY KEY');
    })
    .whereRaw('t.table_schema = database()')
    .where('t.table_type', 'BASE TABLE')
    .whereNull('c.constraint_name')
    .select({ table: 't.table_name' });
  expect(rows).toEqual([]);
});
