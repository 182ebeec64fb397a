import 'server-only';
import { findAccountByEmail, lockAccount } from '@/db/accounts';
import { enqueueMail } from '@/db/outbox';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { take } from '@/lib/server/limits';
import { writeMail } from '@/lib/server/mail-text';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { mailToken } from './mailed-token';
import type { AddressInput } from './schema';

export type AddressRefusal = AccessRefusal | ChangeRefusal | { readonly kind: 'same-address' };

/**
 * Mails a link to the new address; the old one stays in use until its button is pressed. When the new one is somebody's, its owner
 * is told instead, and whoever asked sees no difference.
 */
export async function askAddressChange(ctx: ActorCtx, { key, email }: AddressInput): Promise<Result<null, AddressRefusal>> {
  const own = askSignedIn(ctx, 'account.change-address');
  if (!own.ok) return own;
  const { id } = own.value;
  const mayMail = (await take('link-mail', email, ctx)).ok && (await take('link-mail', id, ctx)).ok;
  return change(
    ctx,
    { key, who: id, act: 'accounts.change-address', input: { email } },
    async (trx): Promise<Result<null, AddressRefusal>> => {
      const account = await lockAccount(trx, id);
      if (account === null || account.email === null) return err({ kind: 'sign-in' });
      if (account.email === email) return err({ kind: 'same-address' });
      if (!mayMail) return ok(null);
      const there = await findAccountByEmail(trx, email);
      if (there === null) await mailToken(trx, 'address', { ...account, email: account.email }, { ...ctx, newEmail: email });
      else if (there.state !== 'closed') {
        const mail = writeMail('someone-tried-to-sign-up', {
          name: there.name,
          link: `${ctx.site}/sign-in`,
          resetLink: `${ctx.site}/reset`,
        });
        await enqueueMail(trx, { accountId: there.id, address: email, mail, kind: 'someone-tried-to-sign-up', at: ctx.now });
      }
      return ok(null);
    },
  );
}
