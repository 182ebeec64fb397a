import 'server-only';
import { findDayBookEnd, listDayBookAfter } from '@/db/day-book';
import { fingerprint } from '@/db/fingerprint';
import { inTransaction } from '@/db/transaction';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { BEGINNING, firstBreak, type Break } from './domain/entry';

const AT_A_TIME = 500;

/**
 * Reads the whole day book as it is at this moment and answers with the number of its last line, or with the first place where
 * its chain does not hold: a line that is missing or changed, one that does not continue the one before it, or an end cut off.
 */
export async function verifyDayBook(ctx: Ctx): Promise<Result<{ readonly lines: number }, Break>> {
  // One transaction reads one state: the end of the book and its lines belong together.
  return inTransaction(ctx.db, async (trx): Promise<Result<{ readonly lines: number }, Break>> => {
    const end = (await findDayBookEnd(trx)) ?? { number: 0, hash: BEGINNING };
    let last: { readonly number: number; readonly hash: string } = { number: 0, hash: BEGINNING };
    for (;;) {
      const entries = await listDayBookAfter(trx, last.number, AT_A_TIME);
      const found = firstBreak(entries, last, fingerprint);
      if (found !== null) return err(found);
      last = entries.at(-1) ?? last;
      if (entries.length < AT_A_TIME) break;
    }
    if (last.number < end.number || last.hash !== end.hash) return err({ number: last.number + 1, why: 'cut-off' });
    return ok({ lines: last.number });
  });
}
