import 'server-only';
import { findAccount } from '@/db/accounts';
import { enqueueMail } from '@/db/outbox';
import type { StoredAmendment } from '@/db/amendments';
import type { Trx } from '@/db/transaction';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { writeMail, type MailValues } from '@/lib/server/mail-text';

export type Told = Pick<MailValues['amendment-decided'], 'answer' | 'reason'> & { readonly edition?: number };

/** Tells the author what became of their amendment. Whoever has left gets nothing. */
export async function mailDecision(trx: Trx, ctx: ActorCtx, { amendment, document }: StoredAmendment, told: Told): Promise<void> {
  const author = await findAccount(trx, amendment.authorId);
  if (author?.email === undefined || author.email === null) return;
  const path = told.answer === 'used' ? `/regions/${amendment.region}` : `/bench/amendments/${amendment.id}`;
  const { answer, reason, edition } = told;
  const said = { name: author.name, link: `${ctx.site}${path}`, place: document.name, answer, reason };
  const mail = writeMail('amendment-decided', { ...said, edition: edition === undefined ? '' : String(edition) });
  await enqueueMail(trx, { accountId: author.id, address: author.email, mail, kind: 'amendment-decided', at: ctx.now });
}
