import path from 'node:path';
import { startDatabase } from './machine/database-server.mjs';
import { startMailStandIn } from './machine/mail-stand-in.mjs';
import { checkRoom, ensurePackages, roomNeeded } from './machine/packages.mjs';
import { must, stop, stopOnSignals } from './machine/processes.mjs';
import { MARIADB, ensurePrograms } from './machine/programs.mjs';
import { during, say, tell } from './machine/say.mjs';
import * as settings from './machine/settings.mjs';
import { appEnv, build, isBuilt, pagesThere, startSite, startWorker, untilHealthy } from './machine/site.mjs';

const TO_TRY = [
  ['/check', 'check a piece: choose regions, answer what matters, get the list'],
  ['/regions', 'region sheets: what each place asks, with its sources'],
  ['/readings', 'readings: hold a lab’s figures against the limits of every place'],
  ['/notes', 'studio notes: crazing, raw insides, leach tests, each figure with its source'],
  ['/sign-in', 'accounts: with no database of your own, that page shows one to try for every role'],
  ['/api/v1/regions', 'the same as data'],
];
const { dataFolder } = settings;

/** From a bare machine to the running site; each step is skipped when an earlier start has done it. */
async function start() {
  settings.checkNode();
  settings.readEnvFile();
  const wanted = settings.readSettings();
  await settings.holdAlone('start', `${wanted.site}, process ${process.pid}`);
  await settings.checkPort(wanted);
  settings.makeDataFolder();
  checkRoom(dataFolder, roomNeeded());
  const secrets = settings.readSecrets();
  const key = process.env.NEXT_SERVER_ACTIONS_ENCRYPTION_KEY || secrets.serverActionsKey;

  if (wanted.databaseUrl === null) await ensurePrograms([MARIADB]);
  await ensurePackages();
  const { databaseUrl, ownerUrl } = wanted.databaseUrl === null ? await localDatabase(secrets) : wanted;
  const { mailUrl, box } = await mailPlace(wanted);
  const env = appEnv({ ...wanted, databaseUrl, mailUrl, secret: wanted.secret ?? secrets.siteSecret });
  if (ownerUrl === null) say('DATABASE_OWNER_URL is not set: the tables stay as they are.');
  else await during('Bringing the tables up to date', () => migrate({ ...env, DATABASE_OWNER_URL: ownerUrl }));

  const made = { dist: '.next', record: path.join(dataFolder, 'built'), key };
  if (!isBuilt(made)) await during('Building the site', () => build({ ...made, env: { ...env, DATABASE_OWNER_URL: '' } }));
  startWorker({ env, onDeath: giveUp });
  startSite({ ...made, ...wanted, env, onDeath: giveUp });
  settings.noteRunning({ site: wanted.site, databaseUrl, local: wanted.databaseUrl === null });
  const local = `http://${wanted.host ?? 'localhost'}:${wanted.port}`;
  await untilHealthy(local);
  await welcome(wanted.site, local, box);
}

async function localDatabase(secrets) {
  const server = await during('Starting the database', () =>
    startDatabase({ folder: path.join(dataFolder, 'database'), secrets, onDeath: giveUp }),
  );
  return { databaseUrl: server.appUrl('footring'), ownerUrl: server.ownerUrl('footring') };
}

/** Where mail is handed over: the server in the settings, or a stand-in of our own with a place to read it. */
async function mailPlace({ mailUrl, port }) {
  if (mailUrl !== null) return { mailUrl, box: null };
  const folder = path.join(dataFolder, 'mail');
  const beside = port < 65_000 ? port : 3000;
  return startMailStandIn({ folder, wantedSmtpPort: beside + 24, wantedHttpPort: beside + 25, output: 'ignore', onDeath: giveUp });
}

async function migrate(env) {
  const args = ['--import', 'tsx', 'scripts/migrate.ts', '--seed'];
  await must('The tables could not be brought up to date.', process.execPath, args, {
    log: path.join(dataFolder, 'migrate.log'),
    env: { ...env, TSX_TSCONFIG_PATH: '.ci/tsconfig.node.json' },
  });
}

async function welcome(site, local, box) {
  const pages = await pagesThere(local, TO_TRY);
  say(`\nFootring is at ${site}`);
  if (pages.length > 0) say('\nTo try:');
  for (const [place, words] of pages) say(`  ${site}${place}  ${words}`);
  if (box !== null) say(`\nMail stays on this machine: ${box}`);
  say('\nCtrl-C stops it.');
}

function giveUp(message) {
  tell(message);
  void stop(1);
}

process.chdir(settings.root);
process.umask(0o022);
stopOnSignals();
try {
  await start();
} catch (error) {
  tell(error);
  await stop(1);
}
