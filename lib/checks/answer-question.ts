import 'server-only';
import { lockCheck, updateCheck } from '@/db/checks';
import { inTransaction } from '@/db/transaction';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { keptSince } from './check-age';
import { mergeEntry, readEntry, type EntryFault } from './domain/entry';
import type { CheckId } from './domain/ids';
import { readCheck } from './read-check';
import type { AnswerInput } from './schema';

export type AnswerRefusal = { readonly kind: 'not-found' } | { readonly kind: 'not-understood'; readonly faults: readonly EntryFault[] };

/** Where to go on: the next question, or null when nothing is left to ask. */
export type Answered = { readonly next: string | null };

/**
 * Takes what one page of questions was answered. An entry that is not understood changes no answer; it is kept as it was
 * typed, so that the page can show it again.
 */
export async function answerQuestion(ctx: Ctx, input: AnswerInput): Promise<Result<Answered, AnswerRefusal>> {
  const faults: EntryFault[] = [];
  const answered = await inTransaction(ctx.db, async (trx): Promise<Result<Answered, AnswerRefusal>> => {
    const check = await lockCheck(trx, input.id, keptSince(ctx.now));
    if (check === null) return err({ kind: 'not-found' });
    const read = readEntry(input.asked, input.fields);
    if (!read.ok) {
      faults.push(...read.error);
      await updateCheck(trx, { ...check, entry: { question: input.question, fields: input.fields } }, ctx.now);
      return ok({ next: null });
    }
    const said = mergeEntry(check, input.asked, read.value);
    await updateCheck(trx, { ...check, ...said, entry: null }, ctx.now);
    return ok({ next: null });
  });
  if (!answered.ok) return answered;
  return faults.length > 0 ? err({ kind: 'not-understood', faults }) : nextOf(ctx, input.id);
}

async function nextOf(ctx: Ctx, id: CheckId): Promise<Result<Answered, AnswerRefusal>> {
  const open = await readCheck(ctx, id);
  return open.ok ? ok({ next: open.value.next?.question ?? null }) : open;
}
