import knex from 'knex';
import { connectionTo, knexSettings } from '@/db/knex-settings';
import { seed } from '@/db/seeds/001_founding_sheets';

/** Puts the founding sheets into this worker's database, with the owner's rights, as the start of the site does. */
export async function foundSheets(): Promise<void> {
  const owner = knex({ ...knexSettings({ most: 1 }), connection: connectionTo(process.env['DATABASE_OWNER_URL'] ?? '') });
  try {
    await seed(owner);
  } finally {
    await owner.destroy();
  }
}
