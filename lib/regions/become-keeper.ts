import 'server-only';
import { lockAccount } from '@/db/accounts';
import { writeDayBook } from '@/db/day-book';
import { findNumberInUse } from '@/db/editions';
import { insertKeeper } from '@/db/keepers';
import { can, type AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { change, type ChangeRefusal } from '@/lib/server/change';
import type { KeepSheetInput } from './doubt-schema';

export type KeeperRefusal = AccessRefusal | ChangeRefusal | { readonly kind: 'not-found' };

/** Makes whoever asks a keeper of a sheet: named on it as minding its look-again dates. Who is one already stays one. */
export async function becomeKeeper(ctx: ActorCtx, { key, region }: KeepSheetInput): Promise<Result<null, KeeperRefusal>> {
  const own = askSignedIn(ctx, 'sheet.keep');
  if (!own.ok) return own;
  const { value: actor } = own;
  const { now } = ctx;
  return change(
    ctx,
    { key, who: actor.id, act: 'regions.become-keeper', input: { region } },
    async (trx): Promise<Result<null, KeeperRefusal>> => {
      // The account's row lines up two presses of one person, and shows a role that was taken meanwhile.
      const account = await lockAccount(trx, actor.id);
      if (account === null || !can({ ...actor, role: account.role }, 'sheet.keep')) return err({ kind: 'not-allowed' });
      if ((await findNumberInUse(trx, region)) === null) return err({ kind: 'not-found' });
      if (!(await insertKeeper(trx, { region, accountId: actor.id, at: now }))) return ok(null);
      const subject = { kind: 'sheet', id: region };
      await writeDayBook(trx, { did: 'keeper.take-on', subject, actorId: actor.id, reason: null, details: { region }, at: now });
      return ok(null);
    },
  );
}
