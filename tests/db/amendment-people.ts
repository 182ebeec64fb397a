import { insertAmendment } from '@/db/amendments';
import { db } from '@/db/connection';
import { findEdition, findNumberInUse } from '@/db/editions';
import { inTransaction } from '@/db/transaction';
import type { AccountRole } from '@/lib/access/domain/actor';
import { ok, type Result } from '@/lib/kernel/result';
import { amendmentId } from '@/lib/regions/amendment-schema';
import { approveAmendment } from '@/lib/regions/approve-amendment';
import type { AmendmentId } from '@/lib/regions/domain/amendment';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { openForReview } from '@/lib/regions/open-for-review';
import { sendAmendment } from '@/lib/regions/send-amendment';
import { tickClaim } from '@/lib/regions/tick-claim';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { newId } from '@/lib/server/new-id';
import { aCtx, aPerson, key, later, NOW } from './account-people';

let people = 0;

/** Somebody with a role who has done all that their role wants of them, and the request they make. */
export async function someone(role: AccountRole, name = `${role} ${String(people)}`, now = NOW): Promise<ActorCtx> {
  people += 1;
  const account = await aPerson(`${role}-${String(people)}@example.test`, { role, name });
  const actor = {
    kind: 'account',
    id: account.id,
    role,
    name,
    confirmed: true,
    secondFactor: 'given',
    freshUntil: later(600_000),
  } as const;
  return aCtx(actor, now);
}

/** The same person, with other connections to the database. */
export const through = (ctx: ActorCtx, other: ActorCtx['db']): ActorCtx => ({ ...ctx, db: other });

export function idOf({ actor }: ActorCtx) {
  if (actor.kind !== 'account') throw new Error('Nobody is signed in');
  return actor.id;
}

export function value<T, E>(result: Result<T, E>): T {
  if (!result.ok) throw new Error(JSON.stringify(result.error));
  return result.value;
}

/** Begins an amendment with a whole document, past the forms. */
export async function aDraft(author: ActorCtx, region: string, mend: (sheet: Sheet) => Sheet): Promise<AmendmentId> {
  const number = await findNumberInUse(db, region);
  const base = number === null ? null : await findEdition(db, region, number);
  if (base === null) throw new Error(`There is no sheet of ${region}`);
  return putDraft(author, { region, baseNumber: base.number, document: mend(base.sheet) });
}

export async function putDraft(
  author: ActorCtx,
  draft: { readonly region: string; readonly baseNumber: number | null; readonly document: Sheet },
): Promise<AmendmentId> {
  const id = amendmentId.parse(newId(NOW));
  await inTransaction(db, async (trx) => {
    await insertAmendment(trx, { id, authorId: idOf(author), at: NOW, ...draft });
    return ok(null);
  });
  return id;
}

export const SUMMARY = 'Sellers give an address as well.';

/** Sends it; answers with the version that moderators meet. */
export async function send(author: ActorCtx, id: AmendmentId, version = 1): Promise<number> {
  const { version: sent } = value(await sendAmendment(author, { key: key(), id, version, summary: SUMMARY, intended: {} }));
  return sent;
}

/** Reads every claim of it. */
export async function readAll(moderator: ActorCtx, id: AmendmentId): Promise<void> {
  const { amendment, claims } = value(await openForReview(moderator, { id }));
  for (const claim of claims) {
    value(await tickClaim(moderator, { key: key(), id, version: amendment.version, claim: claim.key, read: true }));
  }
}

export const approve = (moderator: ActorCtx, id: AmendmentId, version: number) => approveAmendment(moderator, { key: key(), id, version });

/** Nothing of amendments. Before the accounts go. */
export async function emptyAmendments(owner: ActorCtx['db']): Promise<void> {
  for (const table of ['amendment_readings', 'amendment_remarks', 'amendment_decisions', 'amendment_entries', 'amendments']) {
    await owner(table).del();
  }
}
