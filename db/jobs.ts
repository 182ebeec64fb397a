import type { Knex } from 'knex';
import { z } from 'zod';
import type { Json } from '@/lib/kernel/canonical-json';
import { clock, clockPlus } from './database-clock';
import { newId } from './new-id';
import { jobRow, type Job, type JobState } from './rows/job-row';
import type { Trx } from './transaction';
import { storedJson } from './well-formed';

const COLUMNS = [
  'id',
  'kind',
  'input',
  'account_id',
  'state',
  'tries',
  'done_count',
  'total_count',
  'result',
  'failure',
  'made_at',
  'ended_at',
] as const;

export type NewJob = {
  readonly kind: string;
  readonly input: Json;
  readonly accountId: string | null;
  readonly at: Date;
  /** Not before this instant. Left out: as soon as a worker is free. */
  readonly runAt?: Date;
};

/** Asks for a piece of work, in the transaction of its cause. Answers with its id. */
export async function enqueueJob(trx: Trx, { kind, input, accountId, at, runAt }: NewJob): Promise<string> {
  const id = newId(at);
  await trx('jobs').insert({
    id,
    kind,
    input: storedJson(input),
    account_id: accountId,
    run_at: runAt ?? clock(trx),
    made_at: at,
  });
  return id;
}

/** The job, or null. */
export async function findJob(db: Knex, id: string): Promise<Job | null> {
  const row: unknown = await db('jobs')
    .where({ id })
    .select(...COLUMNS)
    .first();
  return row === undefined ? null : jobRow.parse(row);
}

/** Jobs of an account, newest first. */
export async function listJobsOf(db: Knex, accountId: string, limit: number): Promise<readonly Job[]> {
  const rows: unknown = await db('jobs')
    .where({ account_id: accountId })
    .orderBy('id', 'desc')
    .limit(limit)
    .select(...COLUMNS);
  return z.array(jobRow).parse(rows);
}

/** Jobs in one of these states, newest first; `before` is the id of the last one of the page before. */
export async function listJobs(
  db: Knex,
  states: readonly JobState[],
  page: { readonly before?: string; readonly limit: number },
): Promise<readonly Job[]> {
  const query = db('jobs')
    .whereIn('state', [...states])
    .orderBy('id', 'desc')
    .limit(page.limit)
    .select(...COLUMNS);
  if (page.before !== undefined) void query.where('id', '<', page.before);
  const rows: unknown = await query;
  return z.array(jobRow).parse(rows);
}

const idList = z.array(z.string());

/** Ids of jobs that are due, or whose worker has not been heard of in time. */
export async function listDueJobs(db: Knex, limit: number): Promise<readonly string[]> {
  const lost: unknown = await db('jobs').where({ state: 'running' }).where('claimed_until', '<=', clock(db)).limit(limit).pluck('id');
  const due: unknown = await db('jobs')
    .where({ state: 'waiting' })
    .where('run_at', '<=', clock(db))
    .orderBy('run_at')
    .limit(limit)
    .pluck('id');
  return [...idList.parse(lost), ...idList.parse(due)];
}

/** Claims one job for a worker: true when this very statement changed its row and was committed. */
export async function claimJob(db: Knex, { id, by, forMs }: { id: string; by: string; forMs: number }): Promise<boolean> {
  const changed = await db('jobs')
    .where({ id })
    .where((either) => {
      void either
        .where((waiting) => void waiting.where({ state: 'waiting' }).where('run_at', '<=', clock(db)))
        .orWhere((lost) => void lost.where({ state: 'running' }).where('claimed_until', '<=', clock(db)));
    })
    .update({ state: 'running', claimed_by: by, claimed_until: clockPlus(db, forMs), tries: db.raw('tries + 1') });
  return changed === 1;
}

export type Progress = { readonly done: number; readonly total: number };

/** Notes how far a job is and holds it for longer. False when this worker does not hold it any more, and must stop. */
export async function reportJob(db: Knex, held: { id: string; by: string; forMs: number }, progress: Progress | null): Promise<boolean> {
  const said = progress === null ? {} : { done_count: progress.done, total_count: progress.total };
  const changed = await db('jobs')
    .where({ id: held.id, claimed_by: held.by, state: 'running' })
    .update({ ...said, claimed_until: clockPlus(db, held.forMs) });
  return changed === 1;
}

export type JobEnd =
  | { readonly state: 'done'; readonly result: Json }
  | { readonly state: 'parked'; readonly failure: string }
  /** To be run again. A job that was let go, because the worker stops, keeps its number of tries. */
  | { readonly state: 'waiting'; readonly failure: string | null; readonly afterMs: number };

/** Notes how a claimed job ended. False when this worker does not hold it any more. */
export async function endJob(db: Knex, id: string, by: string, end: JobEnd): Promise<boolean> {
  const changed = await db('jobs')
    .where({ id, claimed_by: by, state: 'running' })
    .update({
      state: end.state,
      claimed_by: null,
      claimed_until: null,
      ...(end.state === 'done' ? { result: storedJson(end.result), failure: null } : { failure: end.failure?.slice(0, 300) ?? null }),
      ...(end.state === 'waiting' ? { run_at: clockPlus(db, end.afterMs) } : { ended_at: clock(db) }),
      ...(end.state === 'waiting' && end.failure === null ? { tries: db.raw('tries - 1') } : {}),
    });
  return changed === 1;
}

/** Gives a parked job another eight tries. False when it is not parked. */
export async function retryParkedJob(trx: Trx, id: string): Promise<boolean> {
  const changed = await trx('jobs')
    .where({ id, state: 'parked' })
    .update({ state: 'waiting', tries: 0, run_at: clock(trx), ended_at: null });
  return changed === 1;
}

/** Deletes all jobs of an account. */
export async function deleteJobsOf(trx: Trx, accountId: string): Promise<number> {
  return trx('jobs').where({ account_id: accountId }).del();
}

/** Deletes up to `most` jobs done before `since`. Answers with how many went. */
export async function deleteOldJobs(db: Knex, since: Date, most: number): Promise<number> {
  return db('jobs').where({ state: 'done' }).where('ended_at', '<', since).limit(most).del();
}
