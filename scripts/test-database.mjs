import { stop, stopOnSignals } from './machine/processes.mjs';
import { MARIADB, ensurePrograms } from './machine/programs.mjs';
import { say, tell } from './machine/say.mjs';
import { checkNode, makeDataFolder } from './machine/settings.mjs';
import { startTestDatabase } from './machine/test-database.mjs';

/* A database server for tests that are run by hand (`npx vitest`): prints its addresses as JSON, and ends when its input ends. */
stopOnSignals();
try {
  checkNode();
  makeDataFolder();
  await ensurePrograms([MARIADB]);
  const server = await startTestDatabase();
  say(JSON.stringify({ ownerUrl: server.ownerUrl('footring'), appUrl: server.appUrl('footring') }));
  process.stdin.resume().on('end', () => void stop(0));
} catch (error) {
  tell(error);
  await stop(1);
}
