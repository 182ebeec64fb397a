import type { Knex } from 'knex';
import { z } from 'zod';

/** Tables that are only ever added to: nobody, not even the application, may change or remove a row. */
export const appendOnly: readonly string[] = ['editions', 'copies', 'day_book', 'amendment_decisions', 'edition_withdrawals'];

const BOOKKEEPING = ['knex_migrations', 'knex_migrations_lock', 'seed_runs'];
const whoRow = z.object({ account: z.string(), schema: z.string().nullable() });
const tableRows = z.array(z.object({ name: z.string() }));
const privilegeRows = z.array(z.object({ name: z.string(), privilege: z.string() }));

export type Privilege = { readonly table: string; readonly privilege: string };
export type GrantChange = { readonly grant: readonly Privilege[]; readonly revoke: readonly Privilege[] };

/** What has to change so that the application holds exactly the rights it needs, table by table. */
export function planGrants(tables: readonly string[], held: readonly Privilege[], onlyAdded: readonly string[] = appendOnly): GrantChange {
  const wanted = tables
    .filter((table) => !BOOKKEEPING.includes(table))
    .flatMap((table) => {
      const privileges = onlyAdded.includes(table) ? ['SELECT', 'INSERT'] : ['SELECT', 'INSERT', 'UPDATE', 'DELETE'];
      return privileges.map((privilege) => ({ table, privilege }));
    });
  const without = (list: readonly Privilege[], other: readonly Privilege[]): readonly Privilege[] =>
    list.filter((one) => !other.some((two) => two.table === one.table && two.privilege === one.privilege));
  return { grant: without(wanted, held), revoke: without(held, wanted) };
}

/**
 * Lets the owner give the application's account its rights in the owner's database. Two connections, because each account sees only
 * its own rights; the application's names no database, since before its first right it may not enter one.
 */
export async function grantApplication(owner: Knex, application: Knex): Promise<GrantChange> {
  const { account, schema } = await whoIs(owner);
  const { account: who } = await whoIs(application);
  if (who === account) return { grant: [], revoke: [] };
  const tables: unknown = await owner('information_schema.tables')
    .where({ table_schema: schema, table_type: 'BASE TABLE' })
    .select({ name: 'table_name' });
  const held: unknown = await application('information_schema.table_privileges')
    .where({ table_schema: schema })
    .select({ name: 'table_name', privilege: 'privilege_type' });
  const change = planGrants(
    tableRows.parse(tables).map(({ name }) => name),
    privilegeRows.parse(held).map(({ name, privilege }) => ({ table: name, privilege })),
  );
  await carryOut(owner, who, change);
  return change;
}

// The words of a privilege come from the lists above and from the server, never from outside.
async function carryOut(owner: Knex, who: string, { grant, revoke }: GrantChange): Promise<void> {
  const at = who.lastIndexOf('@');
  const account = [who.slice(0, at), who.slice(at + 1)];
  for (const { table, privilege } of revoke) await owner.raw('REVOKE '.concat(privilege, ' ON ?? FROM ?@?'), [table, ...account]);
  for (const { table, privilege } of grant) await owner.raw('GRANT '.concat(privilege, ' ON ?? TO ?@?'), [table, ...account]);
}

async function whoIs(db: Knex): Promise<z.output<typeof whoRow>> {
  const row: unknown = await db.select({ account: db.raw('current_user()'), schema: db.raw('database()') }).first();
  return whoRow.parse(row);
}
