import 'server-only';
import { setTimeout as wait } from 'node:timers/promises';
import type { Knex } from 'knex';
import { beatWorker, removeWorker } from '@/db/workers';
import type { Patience } from '@/lib/notices/domain/delivery';
import { log } from '../log';
import type { Mailer } from '../mailer';
import type { JobHandler, Round } from './job-handler';
import { JOB_PATIENCE, runDueJobs } from './run-jobs';
import { awayMs, sendDueMails } from './send-mails';
import { walkDueRounds } from './walk-rounds';

export type WorkerPlan = {
  readonly db: Knex;
  readonly id: string;
  /** Null leaves mail in the outbox. */
  readonly mailer: Mailer | null;
  readonly from: string;
  readonly mailPatience: Patience;
  readonly handlers: Readonly<Record<string, JobHandler>>;
  readonly rounds: readonly Round[];
  /** Aborted to end: what has begun is brought to its end, nothing new is begun. */
  readonly signal: AbortSignal;
};

const BEAT_MS = 5000;
const IDLE_MS = 500;
const ROUNDS_MS = 30_000;

/** Works until it is told to end: mail, jobs and rounds side by side. Any number of workers may work on one database. */
export async function runWorker(plan: WorkerPlan): Promise<void> {
  const { db, id, signal } = plan;
  await Promise.all([
    again(plan, 'beat', async () => {
      await beatWorker(db, id);
      return BEAT_MS;
    }),
    again(plan, 'mail', mailStep(plan)),
    again(plan, 'job', async () => {
      const begun = await runDueJobs({ db, worker: id, handlers: plan.handlers, patience: JOB_PATIENCE, signal });
      return begun > 0 ? 0 : IDLE_MS;
    }),
    again(plan, 'round', async () => {
      await walkDueRounds(db, plan.rounds, signal);
      return ROUNDS_MS;
    }),
  ]);
  await removeWorker(db, id).catch((error: unknown) => {
    log.warn({ doing: 'leave', error });
  });
}

function mailStep({ db, id, mailer, from, mailPatience, signal }: WorkerPlan): () => Promise<number> {
  let timesAway = 0;
  return async () => {
    if (mailer === null) return BEAT_MS;
    const { tried, away } = await sendDueMails({ db, worker: id, mailer, from, patience: mailPatience, signal });
    timesAway = away ? timesAway + 1 : 0;
    if (away) return awayMs(timesAway);
    return tried > 0 ? 0 : IDLE_MS;
  };
}

/** Takes a step again and again, with the pause it asks for. A step that fails is logged and taken again a little later. */
async function again({ signal }: WorkerPlan, doing: string, step: () => Promise<number>): Promise<void> {
  for (let faults = 0; !signal.aborted;) {
    let pauseMs: number;
    try {
      pauseMs = await step();
      faults = 0;
    } catch (error) {
      faults += 1;
      log.error({ doing, error });
      pauseMs = Math.random() * Math.min(10_000, 250 * 2 ** faults);
    }
    await wait(pauseMs, undefined, { signal }).catch(() => undefined);
  }
}
