import 'server-only';
import { insertDecision, listDecisions } from '@/db/amendment-decisions';
import { carryReadings } from '@/db/amendment-readings';
import { updateAmendment } from '@/db/amendments';
import { writeDayBook } from '@/db/day-book';
import type { Trx } from '@/db/transaction';
import type { AccountId } from '@/lib/access/domain/actor';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import type { VersionedInput } from './amendment-schema';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import type { Amendment } from './domain/amendment';
import { lockFor, withWinner, type ActRefusal } from './lock-for';
import { mailDecision } from './mail-decision';

export type Superseded = { readonly kind: 'superseded'; readonly version: number };
export type DecideRefusal = AccessRefusal | ChangeRefusal | ActRefusal | Superseded;

type Plan = {
  readonly act: 'hold' | 'release' | 'send-back';
  /** The line of the day book; what is only let go again has none. */
  readonly did: 'amendment.hold' | 'amendment.send-back' | null;
  readonly tell: 'held' | 'returned' | null;
  readonly reason: string | null;
};

/** The ground of the decisions that put nothing in use: the step, the decision, the mail and the line of the day book at once. */
export async function decideAmendment(
  ctx: ActorCtx,
  { key, id, version }: VersionedInput,
  plan: Plan,
): Promise<Result<null, DecideRefusal>> {
  const own = askSignedIn(ctx, 'amendment.judge');
  if (!own.ok) return own;
  const who = own.value.id;
  const { act, did, tell, reason } = plan;
  const asked = { key, who, act: `regions.${act}-amendment`, input: { id, version, reason } };
  return change(ctx, asked, async (trx): Promise<Result<null, DecideRefusal>> => {
    const locked = await lockFor(trx, { id, who, act });
    if (!locked.ok) return locked;
    const { amendment, next } = locked.value;
    if (amendment.version !== version) return err(await outdated(trx, amendment, version));
    await insertDecision(trx, id, { kind: act, version, by: who, reason, at: ctx.now });
    await updateAmendment(trx, id, version, { state: next, at: ctx.now });
    await carryReadings(trx, { amendment: id, version }, version + 1);
    if (tell !== null) await mailDecision(trx, ctx, locked.value, { answer: tell, reason: reason ?? '' });
    if (did !== null) await noteDecision(trx, ctx, { who, did, amendment, reason });
    return ok(null);
  });
}

/** Another moderator decided on that very version meanwhile, or its author has changed it. */
export async function outdated(trx: Trx, amendment: Amendment, version: number): Promise<ActRefusal | Superseded> {
  const decided = (await listDecisions(trx, amendment.id)).some((one) => one.version >= version);
  const { id, state } = amendment;
  return decided ? withWinner(trx, id, { kind: 'already-decided', state }) : { kind: 'superseded', version: amendment.version };
}

type Noted = {
  readonly who: AccountId;
  readonly did: string;
  readonly amendment: Amendment;
  readonly reason?: string | null;
  readonly details?: Readonly<Record<string, string | number>>;
};

/** What the day book says of a decision: the place and the moderator's reason, never what was proposed while that is not public. */
export async function noteDecision(trx: Trx, ctx: ActorCtx, { who, did, amendment, reason = null, details }: Noted): Promise<void> {
  await writeDayBook(trx, {
    actorId: who,
    did,
    subject: { kind: 'amendment', id: amendment.id },
    reason,
    details: { region: amendment.region, ...details },
    at: ctx.now,
  });
}
