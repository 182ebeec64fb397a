import type { Knex } from 'knex';
import { z } from 'zod';
import type { MailEnd } from '@/lib/notices/domain/delivery';
import { clock, clockPlus } from './database-clock';
import { newId } from './new-id';
import { listedMailRow, mailToSendRow, type ListedMail, type MailState, type MailToSend } from './rows/mail-row';
import type { Trx } from './transaction';

export type NewMail = {
  readonly accountId: string | null;
  /** One e-mail address, as it is stored with the account. */
  readonly address: string;
  readonly mail: { readonly subject: string; readonly text: string; readonly html: string };
  /** What it is about: `reset-password`. */
  readonly kind: string;
  readonly at: Date;
  /** Where one post takes the reader off the list. Only for mail one has asked for and may leave. */
  readonly leaveUrl?: string;
};

/** Puts a mail into the outbox, in the transaction of its cause. The worker sends it after that has been committed. */
export async function enqueueMail(trx: Trx, { accountId, address, mail, kind, at, leaveUrl }: NewMail): Promise<void> {
  await trx('outbox').insert({
    id: newId(at),
    account_id: accountId,
    kind,
    address,
    subject: mail.subject,
    body_text: mail.text,
    body_html: mail.html,
    leave_url: leaveUrl ?? null,
    due_at: clock(trx),
    made_at: at,
  });
}

/** Ids of mails that are due, or whose worker has not been heard of in time; the longest due first. */
export async function listDueMails(db: Knex, limit: number): Promise<readonly string[]> {
  const lost: unknown = await db('outbox').where({ state: 'sending' }).where('claimed_until', '<=', clock(db)).limit(limit).pluck('id');
  const waiting = db('outbox').where({ state: 'waiting' }).where('due_at', '<=', clock(db));
  const due: unknown = await waiting.orderBy('due_at').limit(limit).pluck('id');
  return [...idList.parse(lost), ...idList.parse(due)].slice(0, limit);
}
const idList = z.array(z.string());

export type Claim = { readonly id: string; readonly by: string; readonly forMs: number };

/**
 * Claims one mail for a worker: true when this very statement changed its row and was committed. `messageDomain` makes the
 * Message-ID at the first claim; every later try carries the same.
 */
export async function claimMail(db: Knex, { id, by, forMs }: Claim, messageDomain: string): Promise<boolean> {
  const changed = await db('outbox')
    .where({ id })
    .where((either) => {
      void either
        .where((waiting) => void waiting.where({ state: 'waiting' }).where('due_at', '<=', clock(db)))
        .orWhere((lost) => void lost.where({ state: 'sending' }).where('claimed_until', '<=', clock(db)));
    })
    .update({
      state: 'sending',
      claimed_by: by,
      claimed_until: clockPlus(db, forMs),
      tries: db.raw('tries + 1'),
      message_id: db.raw("COALESCE(message_id, CONCAT('<', id, '@', ?, '>'))", [messageDomain]),
    });
  return changed === 1;
}

/** A mail that this worker holds, or null. */
export async function findClaimedMail(db: Knex, id: string, by: string): Promise<MailToSend | null> {
  const row: unknown = await db('outbox')
    .where({ id, claimed_by: by, state: 'sending' })
    .select('id', 'kind', 'address', 'subject', 'body_text', 'body_html', 'leave_url', 'message_id', 'tries')
    .first();
  return row === undefined ? null : mailToSendRow.parse(row);
}

/**
 * Notes what became of a claimed mail; false when this worker does not hold it any more. One that was handed over or refused for good
 * loses its text, which may hold links that open an account; a parked one keeps it for another try.
 */
export async function endClaim(db: Knex, id: string, by: string, end: MailEnd): Promise<boolean> {
  const isOver = end.state !== 'waiting';
  const changed = await db('outbox')
    .where({ id, claimed_by: by, state: 'sending' })
    .update({
      state: end.state,
      claimed_by: null,
      claimed_until: null,
      last_answer: end.lastAnswer.slice(0, 300),
      ended_at: isOver ? clock(db) : null,
      ...(end.state === 'waiting' ? { due_at: clockPlus(db, end.afterMs) } : {}),
      ...(end.state === 'waiting' && !end.counts ? { tries: db.raw('tries - 1') } : {}),
      ...(end.state === 'sent' || end.state === 'bounced' ? { body_text: null, body_html: null, subject: '' } : {}),
    });
  return changed === 1;
}

/** Mails in one of these states, newest first; `before` is the id of the last one of the page before. */
export async function listMails(
  db: Knex,
  states: readonly MailState[],
  page: { readonly before?: string; readonly limit: number },
): Promise<readonly ListedMail[]> {
  const query = db('outbox')
    .whereIn('state', [...states])
    .orderBy('id', 'desc')
    .limit(page.limit)
    .select('id', 'kind', 'account_id', 'address', 'state', 'tries', 'last_answer', 'made_at', 'due_at', 'ended_at');
  if (page.before !== undefined) void query.where('id', '<', page.before);
  const rows: unknown = await query;
  return z.array(listedMailRow).parse(rows);
}

/** How many mails are in each state. */
export async function countMails(db: Knex): Promise<ReadonlyMap<MailState, number>> {
  const rows: unknown = await db('outbox').groupBy('state').select('state').count({ mails: '*' });
  return new Map(listedCount.parse(rows).map(({ state, mails }) => [state, mails]));
}
const listedCount = z.array(z.object({ state: listedMailRow.in.shape.state, mails: z.number() }));

/** Whether a mail waits for a steward. */
export async function isAnyMailParked(db: Knex): Promise<boolean> {
  return (await db('outbox').where({ state: 'parked' }).limit(1).pluck('id')).length > 0;
}

/** Whether a mail has been due for longer than so many milliseconds. */
export async function isAnyMailLate(db: Knex, afterMs: number): Promise<boolean> {
  const late = db('outbox').where({ state: 'waiting' }).where('due_at', '<', clockPlus(db, -afterMs));
  return (await late.limit(1).pluck('id')).length > 0;
}

/** Gives a parked mail another eight tries. False when it is not parked. */
export async function retryParkedMail(trx: Trx, id: string): Promise<boolean> {
  const changed = await trx('outbox')
    .where({ id, state: 'parked' })
    .update({ state: 'waiting', tries: 0, due_at: clock(trx), ended_at: null });
  return changed === 1;
}

/** Deletes all mail of an account, sent or not. */
export async function deleteMailsOf(trx: Trx, accountId: string): Promise<number> {
  return trx('outbox').where({ account_id: accountId }).del();
}

/** Deletes up to `most` mails that were handed over or refused before `since`. Answers with how many went. */
export async function deleteOldMails(db: Knex, since: Date, most: number): Promise<number> {
  return db('outbox').whereIn('state', ['sent', 'bounced']).where('ended_at', '<', since).limit(most).del();
}
