import { existsSync, readFileSync, rmSync, statfsSync } from 'node:fs';
import path from 'node:path';
import { must } from './processes.mjs';
import { Trouble, during } from './say.mjs';
import { dataFolder, root } from './settings.mjs';

const HIDDEN = 'node_modules/.package-lock.json';

/** Installs the npm packages unless exactly those of package-lock.json are there already. */
export async function ensurePackages() {
  if (packagesAreThere()) return;
  rmSync(path.join(root, HIDDEN), { force: true }); // so that one cut short is seen the next time
  const npm = process.env.npm_execpath?.endsWith('.js') ? [process.execPath, process.env.npm_execpath] : ['npm'];
  // NODE_ENV=production would leave out what the build needs.
  const args = [...npm.slice(1), 'ci', '--include=dev', '--include=optional', '--no-audit', '--no-fund'];
  const log = path.join(dataFolder, 'npm.log');
  await during('Installing npm packages', async () => {
    await must('The npm packages could not be installed.', npm[0], args, { log, env: { NODE_ENV: '' } });
    if (!packagesAreThere())
      throw new Trouble('The npm packages are not all there. Does another program write to node_modules? Please start again.');
  });
}

/** True when every package of package-lock.json is installed in the version it names. */
export function packagesAreThere(folder = root) {
  const wanted = readPackages(path.join(folder, 'package-lock.json'));
  const there = readPackages(path.join(folder, HIDDEN));
  if (wanted === null || there === null) return false;
  const right = ([place, { version }]) => wanted[place]?.version === version && existsSync(path.join(folder, place, 'package.json'));
  const needed = ([place, entry]) => place === '' || entry.optional || entry.devOptional || entry.link || place in there;
  return Object.entries(there).every(right) && Object.entries(wanted).every(needed);
}

/** Refuses to begin what the disk has no room for: a database that meets a full disk stops in the middle of its work. */
export function checkRoom(folder, wantedMb) {
  const { bavail, bsize } = statfsSync(folder);
  const freeMb = Math.floor((bavail * bsize) / 1_048_576);
  if (freeMb < wantedMb) {
    throw new Trouble(`The disk is too full: ${freeMb} MB are free for ${folder}, and about ${wantedMb} MB are needed.`);
  }
}

/** About how much this checkout still has to write, in MB. */
export function roomNeeded() {
  const packages = packagesAreThere() ? 0 : 1000;
  const database = existsSync(path.join(dataFolder, 'database', 'data')) ? 0 : 300;
  return 200 + packages + database;
}

function readPackages(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8')).packages;
  } catch {
    return null;
  }
}
