import 'server-only';
import { enqueueMail } from '@/db/outbox';
import type { Trx } from '@/db/transaction';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { writeMail } from '@/lib/server/mail-text';
import type { Account } from './domain/account';

/** Tells an account's owner what was done to the second step. */
export async function mailFactorChange(
  trx: Trx,
  ctx: ActorCtx,
  { id, name, email }: Account,
  what: 'on' | 'off' | 'codes' | 'code-used',
): Promise<void> {
  if (email === null) return;
  const mail = writeMail('second-factor-changed', { name, link: `${ctx.site}/bench/account`, change: what });
  await enqueueMail(trx, { accountId: id, address: email, mail, kind: 'second-factor-changed', at: ctx.now });
}
