import 'server-only';
import type { Knex } from 'knex';
import { findEdition } from '@/db/editions';
import type { Edition } from '@/db/rows/edition-row';
import { keep } from './keep';

type Kept = { readonly of: Knex; readonly read: (key: string) => Promise<Edition | null> };
declare global {
  var footringEditions: Kept | undefined;
}

/** Some 60 kB each: all sheets of the world in their editions in use, and room for earlier ones. */
const LIMIT = 300;

/** An edition with its document, kept in memory: an edition never changes. Null when there is none of that number. */
export async function readEdition(db: Knex, region: string, number: number): Promise<Edition | null> {
  // On globalThis, as the pool is: a page and a route handler would each hold their own otherwise.
  if (globalThis.footringEditions?.of !== db) {
    const read = keep<Edition>(LIMIT, (key) => {
      const [code = '', count = ''] = key.split('/');
      return findEdition(db, code, Number(count));
    });
    globalThis.footringEditions = { of: db, read };
  }
  return globalThis.footringEditions.read(`${region}/${String(number)}`);
}
