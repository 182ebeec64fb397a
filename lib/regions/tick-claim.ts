import 'server-only';
import { deleteReading, putReading } from '@/db/amendment-readings';
import type { Trx } from '@/db/transaction';
import { findEdition } from '@/db/editions';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import type { TickInput } from './amendment-schema';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { claimsToRead } from './domain/claims-to-read';
import { lockFor, type ActRefusal, type LockedAmendment } from './lock-for';

export type TickRefusal =
  | AccessRefusal
  | ChangeRefusal
  | ActRefusal
  | { readonly kind: 'superseded'; readonly version: number }
  | { readonly kind: 'no-such-claim' };

/** A moderator has read the source of a claim, or has not after all. It counts for the version they looked at. */
export async function tickClaim(ctx: ActorCtx, { key, id, version, claim, read }: TickInput): Promise<Result<null, TickRefusal>> {
  const own = askSignedIn(ctx, 'amendment.judge');
  if (!own.ok) return own;
  const who = own.value.id;
  const asked = { key, who, act: 'regions.tick-claim', input: { id, version, claim, read } };
  return change(ctx, asked, async (trx): Promise<Result<null, TickRefusal>> => {
    // To send back is open to a moderator wherever something waits; so is reading.
    const locked = await lockFor(trx, { id, who, act: 'send-back' });
    if (!locked.ok) return locked;
    const { amendment } = locked.value;
    if (amendment.version !== version) return err({ kind: 'superseded', version: amendment.version });
    if (!(await hasClaim(trx, locked.value, claim))) return err({ kind: 'no-such-claim' });
    const reading = { amendment: id, version, reader: who };
    if (read) await putReading(trx, reading, claim, ctx.now);
    else await deleteReading(trx, reading, claim);
    return ok(null);
  });
}

async function hasClaim(trx: Trx, { amendment, document }: LockedAmendment, claim: string): Promise<boolean> {
  const { region, baseNumber } = amendment;
  const base = baseNumber === null ? null : await findEdition(trx, region, baseNumber);
  return claimsToRead(base?.sheet ?? null, document).some(({ key }) => key === claim);
}
