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

/** What the application may do to each table. A table that joins stands here with its reason, or with all four rights. */
const ONLY_ADDED = ['amendment_decisions', 'copies', 'day_book', 'edition_withdrawals', 'editions'];

test('S52 the application has exactly these rights: rows of its own tables, no table, no file, nothing else on the server', async () => {
  const rows: unknown = await db.raw('SHOW GRANTS');
  const [answer] = z.tuple([z.array(z.record(z.string(), z.string())), z.unknown()]).parse(rows);
  const grants = answer.flatMap((row) => Object.values(row)).map((line) => line.replace(/ IDENTIFIED BY .*?(?= WITH|$)/, ''));
  const [server = '', ...rest] = grants;
  expect(server).toMatch(/^GRANT USAGE ON \*\.\* TO `footring_app`@`127\.0\.0\.1` WITH MAX_STATEMENT_TIME 5(\.0+)?$/);
  const here = new URL(process.env['DATABASE_URL'] ?? '').pathname.slice(1);
  const given = rest
    .filter((line) => line.includes(`\`${here}\``))
    .map((line) => /^GRANT (.+) ON `\w+`\.`(\w+)` TO /.exec(line)?.slice(1) ?? [line]);
  const tables: unknown = await owner('information_schema.tables').where({ table_schema: here }).select({ name: 'table_name' });
  const names = z
    .array(z.object({ name: z.string() }))
    .parse(tables)
    .map(({ name }) => name);
  const mayTouch = names.filter((name) => !['knex_migrations', 'knex_migrations_lock', 'seed_runs'].includes(name));
  const rightsOf = (name: string) => (ONLY_ADDED.includes(name) ? 'SELECT, INSERT' : 'SELECT, INSERT, UPDATE, DELETE');
  expect(given.map(([rights, name]) => `${String(name)}: ${String(rights)}`).sort()).toEqual(
    mayTouch.map((name) => `${name}: ${rightsOf(name)}`).sort(),
  );
});

test.each([
  'DROP TABLE outbox',
  "SELECT 1 INTO OUTFILE '/tmp/footring-written'",
  "LOAD DATA LOCAL INFILE '/etc/passwd' INTO TABLE limits",
  'SET GLOBAL max_connections = 9',
  "GRANT SELECT ON outbox TO 'other'@'localhost'",
])('S52 the application is refused: %s', async (statement) => {
  await expect(db.raw(statement)).rejects.toMatchObject({ errno: expect.any(Number) as number });
});
