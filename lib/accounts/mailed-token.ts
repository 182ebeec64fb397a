import 'server-only';
import { putToken } from '@/db/account-tokens';
import { enqueueMail } from '@/db/outbox';
import type { Trx } from '@/db/transaction';
import type { AccountId } from '@/lib/access/domain/actor';
import { writeMail } from '@/lib/server/mail-text';
import { newToken, tokenHash } from '@/lib/server/token';
import { later, TOKEN_MS, type TokenKind } from './domain/session-age';

const MAILS = { confirm: 'confirm-address', link: 'sign-in-link', reset: 'reset-password', address: 'address-changes' } as const;
const PATHS = { confirm: '/confirm', link: '/sign-in/link', reset: '/reset', address: '/confirm' } as const;

type Recipient = { readonly id: AccountId; readonly name: string; readonly email: string };

/**
 * Makes a token of 256 bits, keeps its hash in the place of the last one of its kind, and puts a mail with its link into the outbox.
 * `newEmail` is the address that a change of address waits for: the mail goes there.
 */
export async function mailToken(
  trx: Trx,
  kind: TokenKind,
  to: Recipient,
  { now, site, newEmail = null }: { readonly now: Date; readonly site: string; readonly newEmail?: string | null },
): Promise<void> {
  const token = newToken();
  await putToken(trx, { hash: tokenHash(token), accountId: to.id, kind, email: newEmail, at: now, endsAt: later(now, TOKEN_MS[kind]) });
  const mail = writeMail(MAILS[kind], { name: to.name, link: `${site}${PATHS[kind]}/${token}`, minutes: TOKEN_MS[kind] / 60_000 });
  await enqueueMail(trx, { accountId: to.id, address: newEmail ?? to.email, mail, kind: MAILS[kind], at: now });
}
