import 'server-only';
import { lockAccount } from '@/db/accounts';
import { writeDayBook } from '@/db/day-book';
import { deleteKeeper } from '@/db/keepers';
import { ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { change } from '@/lib/server/change';
import type { KeeperRefusal } from './become-keeper';
import type { KeepSheetInput } from './doubt-schema';

/** Whoever asks is no keeper of that sheet any more. Who was none stays none. */
export async function stopKeeping(ctx: ActorCtx, { key, region }: KeepSheetInput): Promise<Result<null, KeeperRefusal>> {
  const own = askSignedIn(ctx, 'sheet.keep');
  if (!own.ok) return own;
  const { value: actor } = own;
  const { now } = ctx;
  return change(
    ctx,
    { key, who: actor.id, act: 'regions.stop-keeping', input: { region } },
    async (trx): Promise<Result<null, KeeperRefusal>> => {
      await lockAccount(trx, actor.id);
      if (!(await deleteKeeper(trx, region, actor.id))) return ok(null);
      const subject = { kind: 'sheet', id: region };
      await writeDayBook(trx, { did: 'keeper.give-up', subject, actorId: actor.id, reason: null, details: { region }, at: now });
      return ok(null);
    },
  );
}
