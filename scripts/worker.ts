/* Sends the mail of the outbox, does jobs and tidies up. Any number of workers may run; SIGTERM ends one within 15 seconds. */
import { db } from '../db/connection';
import { MAIL_PATIENCE } from '../lib/notices/domain/delivery';
import { readEnv } from '../lib/server/env';
import { log } from '../lib/server/log';
import { makeMailer } from '../lib/server/mailer';
import { newId } from '../lib/server/new-id';
import { HANDLERS } from '../lib/server/work/handlers';
import { ROUNDS } from '../lib/server/work/rounds';
import { runWorker } from '../lib/server/work/worker';

/** A job that does not report is left to the worker that finds its claim run out. */
const LONGEST_END_MS = 13_000;

async function work(): Promise<void> {
  const { mailUrl, mailFrom } = readEnv();
  const ending = new AbortController();
  const end = (): void => {
    ending.abort();
    setTimeout(() => process.exit(0), LONGEST_END_MS).unref();
  };
  process.once('SIGTERM', end).once('SIGINT', end);
  const mailer = mailUrl === null ? null : makeMailer({ url: mailUrl, from: mailFrom });
  if (mailer === null) log.warn({ doing: 'mail', settings: 'FOOTRING_MAIL_URL is not set: mail stays in the outbox' });
  const id = newId(new Date());
  log.info({ doing: 'work', worker: id });
  await runWorker({
    db,
    id,
    mailer,
    from: mailFrom,
    mailPatience: MAIL_PATIENCE,
    handlers: HANDLERS,
    rounds: ROUNDS,
    signal: ending.signal,
  });
  mailer?.close();
  await db.destroy();
}

try {
  await work();
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
}
