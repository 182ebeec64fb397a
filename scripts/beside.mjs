import { ensurePackages } from './machine/packages.mjs';
import { run, stopOnSignals } from './machine/processes.mjs';
import { tell } from './machine/say.mjs';
import * as settings from './machine/settings.mjs';

/* Runs a script with the settings of the site in this folder: node scripts/beside.mjs scripts/day-book.ts … */
process.chdir(settings.root);
stopOnSignals();
try {
  settings.checkNode();
  settings.readEnvFile();
  settings.makeDataFolder();
  const env = { ...settings.besideSettings(), TSX_TSCONFIG_PATH: '.ci/tsconfig.node.json' };
  await ensurePackages();
  process.exitCode = await run(process.execPath, ['--import', 'tsx', ...process.argv.slice(2)], { env });
} catch (error) {
  tell(error);
  process.exitCode = 1;
}
