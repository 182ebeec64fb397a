import 'server-only';
import { z } from 'zod';
import { findArchive } from '@/db/account-exports';
import { findJob, listJobsOf } from '@/db/jobs';
import type { Job } from '@/db/rows/job-row';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { EXPORT_JOB, EXPORT_KEPT_MS, type ExportProgress } from './domain/export';
import { earlier, later } from './domain/session-age';

const made = z.object({ archive: z.string() });
const RECENT = 20;

function progressOf(job: Job, now: Date): ExportProgress {
  const result = made.safeParse(job.result);
  if (job.state === 'done' && result.success && job.endedAt !== null) {
    const until = later(job.endedAt, EXPORT_KEPT_MS);
    return until > now ? { state: 'ready', archive: result.data.archive, until } : { state: 'over' };
  }
  if (job.state === 'parked') return { state: 'failed' };
  return job.state === 'running' ? { state: 'at-work', done: job.done, total: job.total } : { state: 'waiting' };
}

type Read = Result<ExportProgress, AccessRefusal | { readonly kind: 'not-found' }>;

/** How far one's own export has come. Another's is not there. */
export async function readExport(ctx: ActorCtx, id: string): Promise<Read> {
  const own = askSignedIn(ctx, 'account.read-own');
  if (!own.ok) return own;
  const job = await findJob(ctx.db, id);
  if (job === null || job.kind !== EXPORT_JOB || job.accountId !== own.value.id) return err({ kind: 'not-found' });
  return ok(progressOf(job, ctx.now));
}

/** The latest export of one's own, and how far it has come; null when there was none of late. */
export async function readLastExport(
  ctx: ActorCtx,
): Promise<Result<{ readonly id: string; readonly progress: ExportProgress } | null, AccessRefusal>> {
  const own = askSignedIn(ctx, 'account.read-own');
  if (!own.ok) return own;
  const job = (await listJobsOf(ctx.db, own.value.id, RECENT)).find(({ kind }) => kind === EXPORT_JOB);
  return ok(job === undefined ? null : { id: job.id, progress: progressOf(job, ctx.now) });
}

/** The bytes of one's own archive while it is kept; asks for the password again like the export itself. */
export async function readArchive(ctx: ActorCtx, id: string): Promise<Result<Buffer, AccessRefusal | { readonly kind: 'not-found' }>> {
  const own = askSignedIn(ctx, 'account.export');
  if (!own.ok) return own;
  const found = await findArchive(ctx.db, id, own.value.id, earlier(ctx.now, EXPORT_KEPT_MS));
  return found === null ? err({ kind: 'not-found' }) : ok(found.archive);
}
