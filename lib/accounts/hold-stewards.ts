import 'server-only';
import { countHolders, lockAccount } from '@/db/accounts';
import type { Trx } from '@/db/transaction';
import type { SignedIn } from '@/lib/access/domain/actor';
import { can, type Action } from '@/lib/access/domain/policy';

/**
 * Holds the rows of all stewards for the rest of the transaction and answers with how many there are; null when whoever acts may not
 * do `action` any more. First thing in the work of every act on another's role or account: all of them line up here, so that two
 * stewards who take each other's role leave one.
 */
export async function holdStewards(trx: Trx, actor: SignedIn, action: Action): Promise<number | null> {
  const stewards = await countHolders(trx, 'steward');
  const self = await lockAccount(trx, actor.id);
  const mayStill = self !== null && self.state === 'open' && can({ ...actor, role: self.role }, action);
  return mayStill ? stewards : null;
}
