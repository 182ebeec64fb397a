import 'server-only';
import knex, { type Knex } from 'knex';
import { connectionTo, knexSettings } from './knex-settings';

declare global {
  var footringDatabase: Knex | undefined;
}

/**
 * The one pool of this process. It is kept on the global object because a page and a route handler each load their own copy of
 * this module. The setting is read at the first query: a build loads this file too, and needs no database.
 */
export const db: Knex = (globalThis.footringDatabase ??= knex({
  ...knexSettings({ statementSeconds: 5 }),
  connection: () => connectionTo(address()),
}));

function address(): string {
  const url = process.env['DATABASE_URL'];
  if (url === undefined || url === '') throw new Error('DATABASE_URL is not set: there is no database to ask.');
  return url;
}
