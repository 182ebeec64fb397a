import type { AccountId } from '@/lib/access/domain/actor';
import { err, ok, type Result } from '@/lib/kernel/result';
import { canonicalJson } from '@/lib/kernel/canonical-json';
import { judgeAct, type Amendment, type AmendmentRefusal } from './amendment';
import type { Sheet } from './sheet';

/** What a moderator has decided on one version of an amendment. */
export type Decision = {
  readonly kind: 'hold' | 'release' | 'send-back' | 'approve-once' | 'approve' | 'refuse-stale';
  readonly version: number;
  readonly by: AccountId;
  readonly reason: string | null;
  readonly at: Date;
};

export type Approval = {
  /** Of the moderator who would approve now. */
  readonly by: AccountId;
  /** The version they have read. */
  readonly version: number;
  /** The edition in use as the approval is made; null while the place has no sheet. */
  readonly inUse: number | null;
  readonly needed: 1 | 2;
  readonly decisions: readonly Decision[];
};

export type ApprovalRefusal =
  | AmendmentRefusal
  /** Its author has changed it since it was read. */
  | { readonly kind: 'superseded'; readonly version: number }
  /** The second approval has to come from somebody else than the first. */
  | { readonly kind: 'same-moderator' };

export type ApprovalOutcome =
  | { readonly outcome: 'once-approved' }
  | { readonly outcome: 'in-use'; readonly edition: number }
  /** The sheet moved on: an approval never buries what came into use since. */
  | { readonly outcome: 'refused-stale'; readonly to: number | null };

/** What an approval leads to. REG-51 four eyes; REG-52 two approvals where two are needed; REG-53 never over a newer edition. */
export function judgeApproval(amendment: Amendment, approval: Approval): Result<ApprovalOutcome, ApprovalRefusal> {
  const { by, version, inUse, needed, decisions } = approval;
  const may = judgeAct(amendment, by, 'approve');
  if (!may.ok) return may;
  if (amendment.version !== version) return err({ kind: 'superseded', version: amendment.version });
  if (amendment.baseNumber !== inUse) return ok({ outcome: 'refused-stale', to: inUse });
  const first = firstApproval(amendment, decisions);
  if (first?.by === by) return err({ kind: 'same-moderator' });
  const isFirstOfTwo = needed === 2 && first === null;
  return ok(isFirstOfTwo ? { outcome: 'once-approved' } : { outcome: 'in-use', edition: numberAfter(inUse) });
}

const numberAfter = (inUse: number | null): number => (inUse ?? 0) + 1;

/** The approval that still counts: given while it was last waiting, to the version that stands. */
export function firstApproval({ state }: Amendment, decisions: readonly Decision[]): Decision | null {
  if (state !== 'once-approved') return null;
  return decisions.findLast(({ kind }) => kind === 'approve-once') ?? null;
}

/**
 * How many moderators have to approve: two where a limit, a term or a fixed rule is added, changed or withdrawn, or where such a
 * rule stops or starts being inherited, and where a place becomes one of another kind; one for all else.
 */
export function approvalsNeeded(base: Sheet | null, proposed: Sheet): 1 | 2 {
  const was = base ?? { terms: [], rules: [], memberships: [], kind: proposed.kind };
  const weighty = [
    [was.terms, proposed.terms],
    [was.rules.filter(isWeighty), proposed.rules.filter(isWeighty)],
    [was.memberships, proposed.memberships],
    [was.kind, proposed.kind],
  ] as const;
  return weighty.some(([before, after]) => canonicalJson(before) !== canonicalJson(after)) ? 2 : 1;
}

const isWeighty = ({ firm, payload }: Sheet['rules'][number]): boolean => firm || payload.topic === 'limit';
