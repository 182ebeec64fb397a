import 'server-only';
import type { Knex } from 'knex';
import { claimJob, endJob, findJob, listDueJobs, reportJob, type JobEnd } from '@/db/jobs';
import type { Job } from '@/db/rows/job-row';
import { MOST_TRIES, waitBefore, type Patience } from '@/lib/notices/domain/delivery';
import { log } from '../log';
import type { JobHandler, Report } from './job-handler';

export type JobRound = {
  readonly db: Knex;
  readonly worker: string;
  readonly handlers: Readonly<Record<string, JobHandler>>;
  readonly patience: Patience;
  /** When it is aborted, the job at work is let go at its next report. */
  readonly signal: AbortSignal;
};

const CLAIM_MS = 120_000;
export const JOB_PATIENCE: Patience = { baseMs: 2000, mostMs: 600_000 };

/** Thrown by `report` to end a job that is no longer ours, or that has to wait for another worker. */
class LetGo extends Error {}

/** Does the jobs that are due, one after the other. Answers with how many were begun. */
export async function runDueJobs(round: JobRound): Promise<number> {
  let begun = 0;
  for (const id of await listDueJobs(round.db, 10)) {
    if (round.signal.aborted) break;
    if (!(await claimJob(round.db, { id, by: round.worker, forMs: CLAIM_MS }))) continue;
    const job = await findJob(round.db, id);
    if (job === null) continue;
    begun += 1;
    await endJob(round.db, id, round.worker, await endOf(round, job));
  }
  return begun;
}

async function endOf(round: JobRound, job: Job): Promise<JobEnd> {
  const handler = Object.hasOwn(round.handlers, job.kind) ? round.handlers[job.kind] : undefined;
  if (handler === undefined) return { state: 'parked', failure: `Nothing is known of jobs of the kind ${job.kind}` };
  if (job.tries > MOST_TRIES) return { state: 'parked', failure: 'No worker has come to an end with it' };
  try {
    return { state: 'done', result: await handler({ db: round.db, now: new Date() }, job.input, reporter(round, job.id)) };
  } catch (error) {
    if (error instanceof LetGo) return { state: 'waiting', failure: null, afterMs: 0 };
    log.error({ doing: 'job', id: job.id, kind: job.kind, error });
    const failure = error instanceof Error ? error.name : 'unknown';
    if (job.tries >= MOST_TRIES) return { state: 'parked', failure };
    return { state: 'waiting', failure, afterMs: waitBefore(job.tries, Math.random(), round.patience) };
  }
}

const reporter =
  ({ db, worker, signal }: JobRound, id: string): Report =>
  async (done, total) => {
    const isOurs = await reportJob(db, { id, by: worker, forMs: CLAIM_MS }, { done, total });
    if (!isOurs || signal.aborted) throw new LetGo();
  };
