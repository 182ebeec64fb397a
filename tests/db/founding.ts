import knex from 'knex';
import { connectionTo, knexSettings } from '@/db/knex-settings';
import { seed } from '@/db/seeds/001_founding_sheets';
import { seed as seedSearch } from '@/db/seeds/002_search_entries';

/** Puts the founding sheets into this worker's database, with the owner's rights, as the start of the site does. */
export async function foundSheets(): Promise<void> {
  const owner = knex({ ...knexSettings({ most: 1 }), connection: connectionTo(process.env['DATABASE_OWNER_URL'] ?? '') });
  try {
    await seed(owner);
  } finally {
    await owner.destroy();
  }
}

/** The founding sheets, and the index of all that ships: sheets, studio notes and the word list. */
export async function foundAll(): Promise<void> {
  const owner = knex({ ...knexSettings({ most: 1 }), connection: connectionTo(process.env['DATABASE_OWNER_URL'] ?? '') });
  try {
    await seed(owner);
    await seedSearch(owner);
  } finally {
    await owner.destroy();
  }
}
