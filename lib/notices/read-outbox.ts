import 'server-only';
import { listJobs } from '@/db/jobs';
import { countMails, listMails } from '@/db/outbox';
import type { Job } from '@/db/rows/job-row';
import type { ListedMail, MailState } from '@/db/rows/mail-row';
import { mayNow, type AccessRefusal } from '@/lib/access/domain/policy';
import { ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import type { OutboxPart, OutboxQuery } from './schema';

const AT_A_TIME = 50;
const JOBS = 50;

export type ListedJob = Omit<Job, 'input' | 'result' | 'accountId'>;

export type Outbox = {
  readonly part: OutboxPart;
  readonly counts: Readonly<Record<MailState, number>>;
  readonly mails: readonly ListedMail[];
  /** The id before which the next page begins; null on the last one. */
  readonly next: string | null;
  /** Jobs that wait, run or are parked, the newest first. What they are about stays unseen. */
  readonly jobs: readonly ListedJob[];
};

const STATES: Readonly<Record<OutboxPart, readonly MailState[]>> = {
  waiting: ['waiting', 'sending'],
  parked: ['parked'],
  bounced: ['bounced'],
};

/** Mail on its way or stuck, and the work in the background, for stewards. Never the text of a mail. */
export async function readOutbox(ctx: ActorCtx, { part = 'waiting', before }: OutboxQuery): Promise<Result<Outbox, AccessRefusal>> {
  const may = mayNow(ctx.actor, 'outbox.read', ctx.now);
  if (!may.ok) return may;
  const page = { limit: AT_A_TIME + 1, ...(before === undefined ? {} : { before }) };
  const found = await listMails(ctx.db, STATES[part], page);
  const mails = found.slice(0, AT_A_TIME);
  const counted = await countMails(ctx.db);
  const jobs = await listJobs(ctx.db, ['waiting', 'running', 'parked'], { limit: JOBS });
  const count = (state: MailState): number => counted.get(state) ?? 0;
  return ok({
    part,
    counts: {
      waiting: count('waiting'),
      sending: count('sending'),
      sent: count('sent'),
      bounced: count('bounced'),
      parked: count('parked'),
    },
    mails,
    next: found.length > AT_A_TIME ? (mails.at(-1)?.id ?? null) : null,
    jobs: jobs.map(({ input: _, result: __, accountId: ___, ...job }) => job),
  });
}
