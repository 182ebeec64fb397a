import 'server-only';
import { strToU8, zipSync } from 'fflate';
import { z } from 'zod';
import { putArchive } from '@/db/account-exports';
import type { Json } from '@/lib/kernel/canonical-json';
import { words } from '@/lib/kernel/words';
import type { Ctx } from '@/lib/server/ctx';
import { collectOwn } from './collect-own';
import { accountId } from './schema';

const jobInput = z.object({ accountId, archive: z.uuid() });

/** Puts together one archive of all that is an account's own: a JSON file a kind, and a word about them. Done twice, it is one archive. */
export async function makeExport(ctx: Ctx, input: Json, report: (done: number, total: number) => Promise<void>): Promise<Json> {
  const { accountId: id, archive } = jobInput.parse(input);
  const parts = await collectOwn(ctx, id, report);
  const files = Object.entries(parts).map(([name, value]) => [`${name}.json`, strToU8(`${JSON.stringify(value, null, 2)}\n`)] as const);
  const readme = strToU8(`${words('accounts.export.readme', { on: ctx.now.toISOString() })}\n`);
  const zipped = zipSync(Object.fromEntries([['README.txt', readme] as const, ...files]), { mtime: ctx.now });
  await putArchive(ctx.db, { id: archive, accountId: id, archive: Buffer.from(zipped), at: ctx.now });
  return { archive };
}
