import 'server-only';
import type { Knex } from 'knex';
import { claimMail, endClaim, findClaimedMail, listDueMails } from '@/db/outbox';
import { AWAY_PATIENCE, MOST_TRIES, afterHandover, waitBefore, type Patience } from '@/lib/notices/domain/delivery';
import { log } from '../log';
import { domainOf, type Mailer } from '../mailer';

export type MailRound = {
  readonly db: Knex;
  readonly worker: string;
  readonly mailer: Mailer;
  readonly from: string;
  readonly patience: Patience;
  /** No further mail is begun after it is aborted. */
  readonly signal: AbortSignal;
};

/** Mails on their way at once, by one worker. What is sent twice after a kill is at most this. */
export const MAILS_AT_ONCE = 4;
const LISTED = 20;
/** Longer than any conversation may take, with the question whether the server is there. */
const CLAIM_MS = 90_000;

/** `sent` counts mails whose end was noted. `away`: the server took none, so that asking again at once is of no use. */
export type MailRoundEnd = { readonly tried: number; readonly away: boolean };

/** Sends the mails that are due now. Any number of workers may do this at once. */
export async function sendDueMails(round: MailRound): Promise<MailRoundEnd> {
  const waiting = [...(await listDueMails(round.db, LISTED))];
  const end = { tried: 0, away: false };
  const lane = async (): Promise<void> => {
    for (let id = waiting.shift(); id !== undefined && !end.away && !round.signal.aborted; id = waiting.shift()) {
      const sent = await sendOne(round, id);
      if (sent === 'not-mine') continue;
      end.tried += 1;
      if (sent === 'away') end.away = true;
    }
  };
  await Promise.all(Array.from({ length: MAILS_AT_ONCE }, lane));
  return end;
}

async function sendOne({ db, worker, mailer, from, patience }: MailRound, id: string): Promise<'done' | 'away' | 'not-mine'> {
  // Nothing leaves before the claim has been committed.
  if (!(await claimMail(db, { id, by: worker, forMs: CLAIM_MS }, domainOf(from)))) return 'not-mine';
  const mail = await findClaimedMail(db, id, worker);
  if (mail === null) return 'not-mine';
  // Its workers died over it each time, before they could say how it went.
  if (mail.tries > MOST_TRIES) {
    await endClaim(db, id, worker, { state: 'parked', lastAnswer: 'no worker has come to an end with it' });
    return 'done';
  }
  const handover = await mailer.send(mail);
  const end = afterHandover(handover, mail.tries, Math.random(), patience);
  if (!(await endClaim(db, id, worker, end))) log.warn({ doing: 'mail', id, lost: 'the claim ran out while it was sent' });
  if (end.state === 'bounced' || end.state === 'parked') log.warn({ doing: 'mail', id, kind: mail.kind, became: end.state });
  return handover.kind === 'away' ? 'away' : 'done';
}

/** How long to leave a server alone that was away so many times in a row. */
export const awayMs = (times: number): number => waitBefore(times, Math.random(), AWAY_PATIENCE);
