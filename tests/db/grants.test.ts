import knex, { type Knex } from 'knex';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { z } from 'zod';
import { db } from '@/db/connection';
import { grantApplication, planGrants } from '@/db/grants';
import { connectionTo, knexSettings } from '@/db/knex-settings';

const all = (table: string) => ['SELECT', 'INSERT', 'UPDATE', 'DELETE'].map((privilege) => ({ table, privilege }));

test('a table that is only added to may be read and added to, nothing else', () => {
  expect(planGrants(['entries', 'notes'], [], ['entries']).grant).toEqual([
    { table: 'entries', privilege: 'SELECT' },
    { table: 'entries', privilege: 'INSERT' },
    ...all('notes'),
  ]);
});

test('a table that becomes one takes back what was given before, and so does one that is gone', () => {
  expect(planGrants(['entries'], [...all('entries'), { table: 'gone', privilege: 'SELECT' }], ['entries'])).toEqual({
    grant: [],
    revoke: [
      { table: 'entries', privilege: 'UPDATE' },
      { table: 'entries', privilege: 'DELETE' },
      { table: 'gone', privilege: 'SELECT' },
    ],
  });
});

test('the bookkeeping of migrations and seeds is not for the application', () => {
  expect(planGrants(['knex_migrations', 'knex_migrations_lock', 'seed_runs'], [])).toEqual({ grant: [], revoke: [] });
});

let owner: Knex;
let application: Knex;
beforeAll(() => {
  const url = (name: string): string => z.string().parse(process.env[name]);
  const nowhere = new URL(url('DATABASE_URL'));
  nowhere.pathname = '/';
  owner = knex({ ...knexSettings({ most: 1 }), connection: connectionTo(url('DATABASE_OWNER_URL')) });
  application = knex({ ...knexSettings({ most: 1 }), connection: connectionTo(nowhere.href) });
});
afterAll(async () => {
  await owner.raw('DROP TABLE IF EXISTS granted_later');
  await grantApplication(owner, application);
  await owner.destroy();
  await application.destroy();
});

test('on a server: a new table is granted at once, and a second time changes nothing', async () => {
  await owner.raw('CREATE TABLE IF NOT EXISTS granted_later (id INT NOT NULL PRIMARY KEY)');
  await expect(db('granted_later').select('id')).rejects.toMatchObject({ errno: 1142 });
  expect(await grantApplication(owner, application)).toEqual({ grant: all('granted_later'), revoke: [] });
  await expect(db('granted_later').select('id')).resolves.toEqual([]);
  expect(await grantApplication(owner, application)).toEqual({ grant: [], revoke: [] });
});
