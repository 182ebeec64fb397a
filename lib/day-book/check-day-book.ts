import 'server-only';
import { listDayBookAfter } from '@/db/day-book';
import { putDayBookCheck } from '@/db/day-book-checks';
import type { Ctx } from '@/lib/server/ctx';
import { log } from '@/lib/server/log';
import { BEGINNING } from './domain/entry';
import { verifyDayBook } from './verify-day-book';

/** Reads the whole day book and notes for its page what was found. A round of the worker; answers with the number of breaks. */
export async function checkDayBook(ctx: Ctx): Promise<number> {
  const found = await verifyDayBook(ctx);
  const number = found.ok ? found.value.lines : found.error.number - 1;
  const [last] = number === 0 ? [] : await listDayBookAfter(ctx.db, number - 1, 1);
  const hash = last?.hash ?? BEGINNING;
  await putDayBookCheck(ctx.db, { checkedAt: ctx.now, number, hash, break: found.ok ? null : found.error });
  if (!found.ok) log.error({ doing: 'day-book', ...found.error });
  return found.ok ? 0 : 1;
}
