import { randomBytes } from 'node:crypto';
import path from 'node:path';
import { createInterface } from 'node:readline';
import { startDatabase } from '../../scripts/machine/database-server.mjs';
import { stop, stopOnSignals } from '../../scripts/machine/processes.mjs';
import { tell } from '../../scripts/machine/say.mjs';
import { testFolder } from '../../scripts/machine/test-database.mjs';

/*
 * A database server that a test may kill. Reads a word a line: "kill" ends it as a crash does, "start" starts it on the same data and
 * port. Prints {"up": true, …} or {"up": false} after each. Ends when its input ends.
 */
const secrets = {
  databaseOwnerPassword: randomBytes(18).toString('base64url'),
  databaseAppPassword: randomBytes(18).toString('base64url'),
};
const folder = path.join(testFolder(), 'own-database');
const print = (line) => process.stdout.write(`${JSON.stringify(line)}\n`);
let server;
let port = 0;

async function start() {
  server = await startDatabase({ folder, databases: 'footring%', secrets, wantedPort: port });
  port = Number(new URL(server.ownerUrl('footring')).port);
  print({ up: true, ownerUrl: server.ownerUrl('footring'), appUrl: server.appUrl('footring') });
}

async function kill() {
  process.kill(server.started.child.pid, 'SIGKILL');
  await server.started.ended;
  print({ up: false });
}

stopOnSignals();
try {
  await start();
  for await (const word of createInterface(process.stdin)) await (word === 'kill' ? kill() : start());
  await stop(0);
} catch (error) {
  tell(error);
  await stop(1);
}
