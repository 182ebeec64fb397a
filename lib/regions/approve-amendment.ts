import 'server-only';
import { insertDecision, listDecisions } from '@/db/amendment-decisions';
import { carryReadings, listReadings } from '@/db/amendment-readings';
import { findAmendment, updateAmendment } from '@/db/amendments';
import { lockWorld, type WorldEditions } from '@/db/editions';
import type { Trx } from '@/db/transaction';
import type { AccountId } from '@/lib/access/domain/actor';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import type { Finding } from '@/lib/checks/domain/finding';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import type { VersionedInput } from './amendment-schema';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { noteDecision, outdated } from './decide-amendment';
import { judgeAct } from './domain/amendment';
import { approvalsNeeded, judgeApproval, type ApprovalOutcome, type ApprovalRefusal } from './domain/approval';
import { claimsToRead } from './domain/claims-to-read';
import type { Sheet } from './domain/sheet';
import { errorsIn, examineAmendment, isSameWorld, type Examined } from './examine-amendment';
import { lockFor, type ActRefusal, type LockedAmendment } from './lock-for';
import { mailDecision } from './mail-decision';
import { putInUse } from './put-in-use';
import { readBase } from './read-around';

export type Approved =
  | { readonly outcome: 'once-approved' }
  | { readonly outcome: 'in-use'; readonly region: string; readonly edition: number }
  /** The sheet moved on: it goes back to its author, who carries it over. */
  | { readonly outcome: 'refused-stale'; readonly to: number | null };

export type ApproveRefusal =
  | AccessRefusal
  | ChangeRefusal
  | ActRefusal
  | Exclude<ApprovalRefusal, { kind: 'already-decided' }>
  /** Claims, as `rules/dk-register#0`, that this moderator has not ticked on this version. */
  | { readonly kind: 'not-all-read'; readonly claims: readonly string[] }
  | { readonly kind: 'findings'; readonly errors: readonly Finding[] };

const TRIES = 3;

/**
 * A moderator's approval. The last one that is needed puts the amendment in use: decision, edition, mail and line of the day book in
 * one transaction that holds every sheet. REG-51 REG-52 REG-53 REG-56
 */
export async function approveAmendment(ctx: ActorCtx, input: VersionedInput): Promise<Result<Approved, ApproveRefusal>> {
  const own = askSignedIn(ctx, 'amendment.judge');
  if (!own.ok) return own;
  for (let tries = 0; tries < TRIES; tries += 1) {
    // Checked before the transaction, so that nobody waits for it; inside it is only seen whether the world is still that one.
    const seen = await look(ctx, own.value.id, input);
    const approved = await approve(ctx, own.value.id, { input, seen });
    if (approved.ok) return approved;
    const { error } = approved;
    if (error.kind !== 'look-again') return err(error);
  }
  return err({ kind: 'busy' });
}

type Seen = Examined & { readonly base: Sheet | null };
type Again = { readonly kind: 'look-again' };
type Approving = { readonly input: VersionedInput; readonly seen: Seen | null };

async function look(ctx: ActorCtx, who: AccountId, { id, version }: VersionedInput): Promise<Seen | null> {
  const stored = await findAmendment(ctx.db, id);
  if (stored?.amendment.version !== version || !judgeAct(stored.amendment, who, 'approve').ok) return null;
  return { ...(await examineAmendment(ctx, stored)), base: await readBase(ctx, stored.amendment) };
}

async function approve(ctx: ActorCtx, who: AccountId, { input, seen }: Approving): Promise<Result<Approved, ApproveRefusal | Again>> {
  const { key, id, version } = input;
  const asked = { key, who, act: 'regions.approve-amendment', input: { id, version } };
  return change(ctx, asked, async (trx): Promise<Result<Approved, ApproveRefusal | Again>> => {
    const world = await lockWorld(trx);
    const locked = await lockFor(trx, { id, who, act: 'approve' });
    if (!locked.ok) return locked;
    const { amendment } = locked.value;
    if (amendment.version !== version) return err(await outdated(trx, amendment, version));
    if (seen?.version !== version) return err({ kind: 'look-again' });
    const outcome = await judge(trx, locked.value, { who, seen, world });
    if (!outcome.ok) return outcome;
    return ok(await carryOut(trx, ctx, { who, locked: locked.value, seen, outcome: outcome.value }));
  });
}

type Judging = { readonly who: AccountId; readonly seen: Seen; readonly world: WorldEditions };

async function judge(
  trx: Trx,
  { amendment, document }: LockedAmendment,
  { who, seen, world }: Judging,
): Promise<Result<ApprovalOutcome, ApproveRefusal | Again>> {
  const { id, version, region } = amendment;
  const needed = approvalsNeeded(seen.base, document);
  const decisions = await listDecisions(trx, id);
  const judged = judgeApproval(amendment, { by: who, version, inUse: world.get(region) ?? null, needed, decisions });
  if (!judged.ok) return err(judged.error.kind === 'already-decided' ? await outdated(trx, amendment, version) : judged.error);
  if (judged.value.outcome === 'refused-stale') return judged;
  const read = await listReadings(trx, { amendment: id, version, reader: who });
  const claims = claimsToRead(seen.base, document).map((claim) => claim.key);
  const unread = claims.filter((claim) => !read.has(claim));
  if (unread.length > 0) return err({ kind: 'not-all-read', claims: unread });
  if (!isSameWorld(seen.world, world)) return err({ kind: 'look-again' });
  const errors = errorsIn(seen.findings);
  return errors.length > 0 ? err({ kind: 'findings', errors }) : judged;
}

type Deciding = {
  readonly who: AccountId;
  readonly locked: LockedAmendment;
  readonly seen: Seen;
  readonly outcome: ApprovalOutcome;
};

async function carryOut(trx: Trx, ctx: ActorCtx, { who, locked, seen, outcome }: Deciding): Promise<Approved> {
  const { amendment, document } = locked;
  const { id, version, region, summary } = amendment;
  const at = ctx.now;
  const decide = (kind: 'approve' | 'approve-once' | 'refuse-stale') =>
    insertDecision(trx, id, { kind, version, by: who, reason: null, at });
  switch (outcome.outcome) {
    case 'once-approved':
      await decide('approve-once');
      await updateAmendment(trx, id, version, { state: 'once-approved', at });
      await carryReadings(trx, { amendment: id, version }, version + 1);
      await noteDecision(trx, ctx, { who, did: 'amendment.once-approve', amendment });
      return outcome;
    case 'refused-stale':
      await decide('refuse-stale');
      await updateAmendment(trx, id, version, { state: 'refused-stale', at });
      await mailDecision(trx, ctx, locked, { answer: 'overtaken', reason: summary });
      await noteDecision(trx, ctx, { who, did: 'amendment.refuse-stale', amendment });
      return outcome;
    case 'in-use': {
      const { edition } = outcome;
      await decide('approve');
      await putInUse(trx, { number: edition, before: seen.base, sheet: document, origin: 'amendment', summary, at });
      await updateAmendment(trx, id, version, { state: 'in-use', editionNumber: edition, at });
      await mailDecision(trx, ctx, locked, { answer: 'used', reason: summary, edition });
      await noteDecision(trx, ctx, { who, did: 'amendment.approve', amendment, details: { edition, summary } });
      return { outcome: 'in-use', region, edition };
    }
  }
}
