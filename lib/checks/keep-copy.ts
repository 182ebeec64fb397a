import 'server-only';
import { insertCopy } from '@/db/copies';
import { fingerprint } from '@/db/fingerprint';
import { inTransaction } from '@/db/transaction';
import { ok } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';

/** Keeps a dated copy under the fingerprint of its canonical text. Keeping it again changes nothing. */
export async function keepCopy(ctx: Ctx, text: string): Promise<string> {
  const hash = fingerprint(text);
  await inTransaction(ctx.db, async (trx) => {
    await insertCopy(trx, { hash, document: text, madeAt: ctx.now });
    return ok(null);
  });
  return hash;
}
