import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { atTheEnd, endOf, run } from './processes.mjs';
import { Trouble, during } from './say.mjs';
import { dataFolder } from './settings.mjs';

/** What a machine must have beside Node, by the names the programs go by and the Debian packages that bring them. */
export const MARIADB = {
  name: 'MariaDB',
  programs: [['mariadbd'], ['mariadb-install-db'], ['mariadb'], ['my_print_defaults']],
  packages: ['mariadb-server-core', 'mariadb-client-core'],
};
export const CHROMIUM = { name: 'Chromium', programs: [['chromium', 'chromium-browser', 'google-chrome']], packages: ['chromium'] };

const POLICY = '/usr/sbin/policy-rc.d';
const MARK = '# Written by Footring while it installs packages, so that no system service starts. May be removed.\n';

/** Where a program is, or null. Looks where servers are kept too, which the search path of an ordinary user leaves out. */
export function findProgram(...names) {
  const folders = [...(process.env.PATH ?? '').split(':'), '/usr/local/sbin', '/usr/sbin', '/usr/local/bin', '/usr/bin'];
  const places = names.flatMap((name) => folders.filter((folder) => folder.startsWith('/')).map((folder) => path.join(folder, name)));
  return places.find((place) => existsSync(place)) ?? null;
}

/** Installs by apt what the machine lacks. Without root it says which one command root must run. */
export async function ensurePrograms(needs) {
  const missing = needs.filter(({ programs }) => programs.some((names) => findProgram(...names) === null));
  if (missing.length === 0) return;
  const packages = missing.flatMap((need) => need.packages);
  const names = missing.map(({ name }) => name).join(' and ');
  if (findProgram('apt-get') === null) {
    throw new Trouble(`${names} cannot be found, and this machine has no apt-get to install it with. Please install it and start again.`);
  }
  const command = `apt-get update && apt-get install --no-install-recommends -y ${packages.join(' ')}`;
  if (process.getuid() !== 0) throw new Trouble(`${names} cannot be found. Root must run this once:\n\n  ${command}\n\nThen start again.`);
  await during(`Installing ${names} from the packages of this machine`, () => withoutServices(() => install(command, packages)));
}

async function install(command, packages) {
  const env = { DEBIAN_FRONTEND: 'noninteractive' };
  const wait = ['-o', 'DPkg::Lock::Timeout=300'];
  const log = path.join(dataFolder, 'apt.log');
  await run('dpkg', ['--configure', '-a'], { env, log, lastSignal: 'TERM' }); // an earlier installation may have been cut short
  const get = async (...args) => (await run('apt-get', [...wait, ...args], { env, log, lastSignal: 'TERM' })) === 0;
  const packed = ['install', '--no-install-recommends', '-y', ...packages];
  if (await get('update').then(() => get(...packed))) return;
  throw new Trouble(`The packages could not be installed. You can try it by hand:\n\n  ${command}\n\nThe end of ${log}:\n\n${endOf(log)}`);
}

// Packages that bring a server start it at once unless this file forbids it. Ours runs beside any other, on a port of its own.
async function withoutServices(work) {
  const ours = !existsSync(POLICY) || readFileSync(POLICY, 'utf8').includes(MARK);
  const tidy = () => ours && rmSync(POLICY, { force: true });
  if (ours) writeFileSync(POLICY, `#!/bin/sh\n${MARK}exit 101\n`, { mode: 0o755 });
  atTheEnd(tidy);
  try {
    return await work();
  } finally {
    tidy();
  }
}
