import { randomBytes } from 'node:crypto';
import { existsSync, readdirSync, rmSync } from 'node:fs';
import path from 'node:path';
import { startDatabase } from './database-server.mjs';
import { atTheEnd } from './processes.mjs';
import { dataFolder, makeDataFolder } from './settings.mjs';

const OURS = path.join(dataFolder, `test-${process.pid}`);

/** A folder for this run alone, so that several runs, and a running site, do not meet. It is removed when the run ends. */
export function testFolder() {
  makeDataFolder();
  for (const name of readdirSync(dataFolder)) {
    const pid = /^test-(\d+)$/.exec(name)?.[1];
    if (pid !== undefined && !existsSync(`/proc/${pid}`)) rmSync(path.join(dataFolder, name), { recursive: true, force: true });
  }
  atTheEnd(() => rmSync(OURS, { recursive: true, force: true }));
  return OURS;
}

/** A database server for tests: the same settings as the real one, new every time, on a port nobody uses. */
export async function startTestDatabase() {
  const password = () => randomBytes(18).toString('base64url');
  const secrets = { databaseOwnerPassword: password(), databaseAppPassword: password() };
  const onDeath = (message) => process.stderr.write(`${message}\n`);
  return startDatabase({ folder: path.join(testFolder(), 'database'), databases: 'footring%', secrets, wantedPort: 0, onDeath });
}
