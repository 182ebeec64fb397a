import 'server-only';
import { countMails } from '@/db/outbox';
import { countJobs, listWorkers } from '@/db/service-state';
import type { SeenWorker } from '@/db/rows/service-state-row';
import { mayNow, type AccessRefusal } from '@/lib/access/domain/policy';
import { ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { readHealth, type Health } from '@/lib/server/health';
import { version } from '@/lib/server/version';

export type ServiceState = {
  readonly health: Health;
  readonly workers: readonly SeenWorker[];
  readonly mails: { readonly waiting: number; readonly parked: number; readonly bounced: number };
  readonly jobs: { readonly waiting: number; readonly running: number; readonly parked: number };
  readonly version: string;
};

const WORKERS = 20;

/** How the parts of the site are, for stewards. Whoever reads this got past a session in the database, so that much works. */
export async function readServiceState(ctx: ActorCtx): Promise<Result<ServiceState, AccessRefusal>> {
  const may = mayNow(ctx.actor, 'health.read', ctx.now);
  if (!may.ok) return may;
  const [health, workers, mails, jobs] = await Promise.all([
    readHealth(ctx.db),
    listWorkers(ctx.db, WORKERS),
    countMails(ctx.db),
    countJobs(ctx.db),
  ]);
  return ok({
    health,
    workers,
    mails: { waiting: mails.get('waiting') ?? 0, parked: mails.get('parked') ?? 0, bounced: mails.get('bounced') ?? 0 },
    jobs: { waiting: jobs.get('waiting') ?? 0, running: jobs.get('running') ?? 0, parked: jobs.get('parked') ?? 0 },
    version,
  });
}
