import type { Knex } from 'knex';
import { z } from 'zod';
import { jobCounts, workerRow, type SeenWorker } from './rows/service-state-row';
import type { JobState } from './rows/job-row';

/** Workers, the latest seen first. */
export async function listWorkers(db: Knex, most: number): Promise<readonly SeenWorker[]> {
  const rows: unknown = await db('workers').orderBy('seen_at', 'desc').limit(most).select('id', 'began_at', 'seen_at');
  return z.array(workerRow).parse(rows);
}

/** How many jobs are in each state; none are left out of the answer. */
export async function countJobs(db: Knex): Promise<ReadonlyMap<JobState, number>> {
  const rows: unknown = await db('jobs').groupBy('state').select('state').count({ jobs: '*' });
  return new Map(jobCounts.parse(rows).map(({ state, jobs }) => [state, jobs]));
}
