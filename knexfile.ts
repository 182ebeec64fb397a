import { connectionTo, knexSettings } from './db/knex-settings';

const owner = process.env['DATABASE_OWNER_URL'] ?? 'mysql://footring_owner@127.0.0.1:33106/footring';

/** For knex's own commands, such as making a migration. They need the owner's account: DATABASE_OWNER_URL. */
export default { ...knexSettings({ most: 4 }), connection: connectionTo(owner) };
