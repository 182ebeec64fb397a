import 'server-only';
import { deleteOldArchives } from '@/db/account-exports';
import { deleteEndedTokens } from '@/db/account-tokens';
import { deleteOldChecks } from '@/db/checks';
import { dropDoubtTraces } from '@/db/doubts';
import { deleteOldJobs } from '@/db/jobs';
import { deleteOldKeptForms } from '@/db/kept-forms';
import { deleteOldLimits } from '@/db/limits';
import { deleteOldMails } from '@/db/outbox';
import { deleteOldReadingSheets } from '@/db/reading-sheets';
import { deleteOldRequestKeys } from '@/db/request-keys';
import { deleteEndedSessions } from '@/db/sessions';
import { deleteLostWorkers } from '@/db/workers';
import { forgetLeavers } from '@/lib/accounts/forget-leavers';
import { keptSince } from '@/lib/checks/check-age';
import { checkDayBook } from '@/lib/day-book/check-day-book';
import { cleanFiles } from '@/lib/files/clean-files';
import { sheetsSince } from '@/lib/readings/sheet-age';
import type { Ctx } from '../ctx';
import type { Round } from './job-handler';

const MINUTE_MS = 60_000;
const HOUR_MS = 60 * MINUTE_MS;
const DAY_MS = 24 * HOUR_MS;
const AT_A_TIME = 500;

/** Deletes in small portions until nothing old is left, so that nobody waits for a long lock. */
export async function sweep(some: (most: number) => Promise<number>): Promise<number> {
  let gone = 0;
  for (;;) {
    const now = await some(AT_A_TIME);
    gone += now;
    if (now < AT_A_TIME) return gone;
  }
}

const ago = ({ now }: Ctx, ms: number): Date => new Date(now.getTime() - ms);

/** What is tidied up, and how often. A slice adds a line; `sweep` is there for deleting. */
export const ROUNDS: readonly Round[] = [
  { name: 'old-checks', everyMs: HOUR_MS, walk: (ctx) => sweep((most) => deleteOldChecks(ctx.db, keptSince(ctx.now), most)) },
  {
    name: 'old-reading-sheets',
    everyMs: HOUR_MS,
    walk: (ctx) => sweep((most) => deleteOldReadingSheets(ctx.db, sheetsSince(ctx.now), most)),
  },
  { name: 'old-request-keys', everyMs: HOUR_MS, walk: (ctx) => sweep((most) => deleteOldRequestKeys(ctx.db, ago(ctx, 7 * DAY_MS), most)) },
  { name: 'old-limits', everyMs: 10 * MINUTE_MS, walk: (ctx) => sweep((most) => deleteOldLimits(ctx.db, ago(ctx, MINUTE_MS), most)) },
  { name: 'old-mails', everyMs: HOUR_MS, walk: (ctx) => sweep((most) => deleteOldMails(ctx.db, ago(ctx, 30 * DAY_MS), most)) },
  { name: 'old-jobs', everyMs: HOUR_MS, walk: (ctx) => sweep((most) => deleteOldJobs(ctx.db, ago(ctx, 30 * DAY_MS), most)) },
  {
    name: 'old-sessions',
    everyMs: HOUR_MS,
    walk: (ctx) => sweep((most) => deleteEndedSessions(ctx.db, ctx.now, ago(ctx, 7 * DAY_MS), most)),
  },
  { name: 'old-tokens', everyMs: HOUR_MS, walk: (ctx) => sweep((most) => deleteEndedTokens(ctx.db, ctx.now, most)) },
  { name: 'old-kept-forms', everyMs: 10 * MINUTE_MS, walk: (ctx) => sweep((most) => deleteOldKeptForms(ctx.db, ago(ctx, HOUR_MS), most)) },
  { name: 'old-archives', everyMs: HOUR_MS, walk: (ctx) => sweep((most) => deleteOldArchives(ctx.db, ago(ctx, DAY_MS), most)) },
  { name: 'day-book', everyMs: HOUR_MS, walk: checkDayBook },
  { name: 'doubt-traces', everyMs: HOUR_MS, walk: (ctx) => sweep((most) => dropDoubtTraces(ctx.db, ago(ctx, DAY_MS), most)) },
  { name: 'leavers', everyMs: 10 * MINUTE_MS, walk: forgetLeavers },
  { name: 'files', everyMs: 10 * MINUTE_MS, walk: (ctx) => cleanFiles(ctx) },
  { name: 'lost-workers', everyMs: 10 * MINUTE_MS, walk: ({ db }) => deleteLostWorkers(db, HOUR_MS) },
];
