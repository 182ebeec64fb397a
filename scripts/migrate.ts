/* Brings the database up to date: tables, the application's rights, and with --seed what a new database starts with. */
import knex, { type Knex } from 'knex';
import { grantApplication } from '../db/grants';
import { connectionTo, knexSettings } from '../db/knex-settings';
import { migrate } from '../db/migrator';
import { seed } from '../db/seeder';
import { putDemoPeople } from '../lib/accounts/put-demo-people';

const UNREACHABLE = /Access denied|Unknown database|ECONNREFUSED|ENOTFOUND|ETIMEDOUT|EHOSTUNREACH|is not allowed to connect/;

/** Errors in words for whoever runs Footring. */
function say(error: unknown): string {
  const text = error instanceof Error ? error.message : String(error);
  if (UNREACHABLE.test(text)) return `The database does not let us in: ${text}\nPlease check DATABASE_OWNER_URL and DATABASE_URL.`;
  if (text.includes('migration directory is corrupt')) {
    return `The database was last used by a newer Footring than this one. Use that one, or an older copy of the database.\n${text}`;
  }
  return error instanceof Error ? (error.stack ?? text) : text;
}

function addressOf(name: string): URL | null {
  const text = process.env[name];
  return text === undefined || text === '' ? null : new URL(text);
}

function connect(address: URL | null, most: number): Knex | null {
  return address === null ? null : knex({ ...knexSettings({ most }), connection: connectionTo(address.href) });
}

function withoutDatabase(address: URL | null): URL | null {
  if (address !== null) address.pathname = '/';
  return address;
}

async function bringUpToDate(owner: Knex, application: Knex | null): Promise<void> {
  const steps = await migrate(owner);
  console.log(steps.length === 0 ? 'The tables are up to date.' : `Steps taken: ${steps.join(', ')}`);
  if (application !== null) {
    const { grant, revoke } = await grantApplication(owner, application);
    console.log(`Rights given to the application: ${grant.length}, taken away: ${revoke.length}`);
  }
  if (!process.argv.includes('--seed')) return;
  const seeds = await seed(owner);
  if (seeds.length > 0) console.log(`Seeds put in: ${seeds.join(', ')}`);
  if (process.env['FOOTRING_DEMO'] === '1') await putDemoPeople({ db: owner, now: new Date() });
}

const owner = connect(addressOf('DATABASE_OWNER_URL'), 4);
const application = connect(withoutDatabase(addressOf('DATABASE_URL')), 1);
if (owner === null) {
  console.error('DATABASE_OWNER_URL is not set: it names the database and the account that may change its tables.');
  process.exitCode = 1;
} else {
  try {
    await bringUpToDate(owner, application);
  } catch (error) {
    console.error(say(error));
    process.exitCode = 1;
  } finally {
    await owner.destroy();
  }
}
await application?.destroy();
