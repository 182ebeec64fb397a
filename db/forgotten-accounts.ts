import type { AccountId } from '@/lib/access/domain/actor';
import { deleteArchivesOf } from './account-exports';
import { deleteTokensOf } from './account-tokens';
import { emptyAccount } from './accounts';
import { letGoOfFiles } from './files';
import { deleteJobsOf } from './jobs';
import { deleteKeepingsOf } from './keepers';
import { deleteMailsOf } from './outbox';
import { deleteUnsentOf } from './amendments';
import { deleteRecoveryCodes } from './recovery-codes';
import { deleteRoleRequestsOf } from './role-requests';
import { deleteSessionsOf } from './sessions';
import type { Trx } from './transaction';

/**
 * Takes a person out of every table: the account's row keeps its id, so that what it wrote stays joined, and nothing that says who
 * it was. A slice that keeps something of a person's own adds a line here.
 */
export async function forgetPerson(trx: Trx, id: AccountId): Promise<void> {
  await deleteSessionsOf(trx, id);
  await deleteTokensOf(trx, id);
  await deleteRecoveryCodes(trx, id);
  await deleteRoleRequestsOf(trx, id);
  await deleteArchivesOf(trx, id);
  await deleteKeepingsOf(trx, id);
  await deleteMailsOf(trx, id);
  await deleteJobsOf(trx, id);
  await deleteUnsentOf(trx, id);
  await letGoOfFiles(trx, id);
  await trx('request_keys').where({ who: id }).del();
  await emptyAccount(trx, id);
}
