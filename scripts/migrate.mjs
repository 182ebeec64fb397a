import { ensurePackages } from './machine/packages.mjs';
import { run, stopOnSignals } from './machine/processes.mjs';
import { Trouble, tell } from './machine/say.mjs';
import * as settings from './machine/settings.mjs';

/** Brings a database of one's own up to date, as a release does before its web processes start. `-- --seed` puts in the seeds too. */
async function migrate() {
  settings.checkNode();
  settings.readEnvFile();
  if (settings.readSettings().ownerUrl === null) {
    throw new Trouble(
      'DATABASE_URL and DATABASE_OWNER_URL name the database to bring up to date. `npm start` does it for the one under .data by itself.',
    );
  }
  settings.makeDataFolder();
  await ensurePackages();
  const args = ['--import', 'tsx', 'scripts/migrate.ts', ...process.argv.slice(2)];
  return run(process.execPath, args, { env: { TSX_TSCONFIG_PATH: '.ci/tsconfig.node.json' } });
}

process.chdir(settings.root);
stopOnSignals();
try {
  process.exitCode = await migrate();
} catch (error) {
  tell(error);
  process.exitCode = 1;
}
