import type { Json } from '@/lib/kernel/canonical-json';
import type { Ctx } from '../ctx';

/** Says how much of a job is done, and holds it for longer. Throws when the job has to stop: let that through. */
export type Report = (done: number, total: number) => Promise<void>;

/**
 * Does a job and answers with what is kept as its result. A job may be begun again after a kill or a fault, from its start: what it
 * does must bear being done twice. It reports at least every minute.
 */
export type JobHandler = (ctx: Ctx, input: Json, report: Report) => Promise<Json>;

/** A piece of housekeeping: every so often, by one worker. Answers with how many rows it dealt with. It must bear being cut short. */
export type Round = { readonly name: string; readonly everyMs: number; readonly walk: (ctx: Ctx) => Promise<number> };
