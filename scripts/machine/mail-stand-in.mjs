import { setTimeout as wait } from 'node:timers/promises';
import path from 'node:path';
import { begin } from './processes.mjs';
import { Trouble } from './say.mjs';
import { freePort, root } from './settings.mjs';

/**
 * Starts the stand-in that takes mail instead of a real server and shows it on this machine alone. Answers with the setting for those who
 * send, and the address where the mails can be read.
 */
export async function startMailStandIn({ folder, wantedSmtpPort = 0, wantedHttpPort = 0, onDeath, output }) {
  const smtpPort = await freePort(wantedSmtpPort);
  const httpPort = await freePort(wantedHttpPort);
  const program = path.join(root, 'scripts/mail-stand-in.mjs');
  const started = begin(process.execPath, [program, folder, String(smtpPort), String(httpPort)], { output });
  started.onDeath = (code) => onDeath?.(`The mail stand-in ended by itself (${code}).`);
  const box = `http://localhost:${httpPort}`;
  for (let i = 0; i < 200 && !started.over; i += 1) {
    if (await answers(`${box}/mails.json?after=9`)) return { started, mailUrl: `smtp://127.0.0.1:${smtpPort}`, box };
    await wait(50);
  }
  throw new Trouble('The mail stand-in did not start.');
}

async function answers(url) {
  try {
    return (await fetch(url, { signal: AbortSignal.timeout(2000) })).ok;
  } catch {
    return false;
  }
}
