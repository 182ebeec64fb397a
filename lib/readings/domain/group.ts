import { QUESTIONS } from '@/lib/checks/domain/questions';
import { decimalOf } from '@/lib/kernel/decimal';
import { compare, whole, type Fraction } from '@/lib/kernel/fraction';
import type { Decision } from '@/lib/regions/domain/rule';
import { assess, figureOf, type Assessment } from './assessment';
import type { PossibleLimit } from './possible';
import type { Report } from './reading';
import { addsLids, limitedPart, sizeOfLimit } from './specimen';
import type { Verdict } from './verdict';
import { sayWhy } from './why';

/** What holds for the piece beside its figures. */
export type Piece = {
  /** True when any part of the combination was changed since the test. */
  readonly changedSince: boolean;
  readonly lidded: boolean;
};

type Assessed = PossibleLimit & Assessment;

/** One list for each sheet, strength, substance, part and unit of reference: law and advice are never mixed. */
export function groupLimits(limits: readonly PossibleLimit[]): readonly (readonly PossibleLimit[])[] {
  const groups = new Map<string, PossibleLimit[]>();
  for (const limit of limits) {
    const key = keyOf(limit);
    groups.set(key, [...(groups.get(key) ?? []), limit]);
  }
  return [...groups.values()];
}

const keyOf = ({ rule, limit }: PossibleLimit): string =>
  JSON.stringify([rule.region, rule.strength, limit.substance, limitedPart(limit), limit.per]);

/** One verdict over limits of a group. `limits` is not empty; of an empty one there is nothing to tell. */
export function judgeGroup(limits: readonly PossibleLimit[], report: Report, piece: Piece): readonly Verdict[] {
  const assessed = limits.map((one): Assessed => ({ ...one, ...assessOne(one, report, piece) }));
  const [first] = assessed;
  if (first === undefined) return [];
  const strictest = assessed.reduce((one, other) => (isStricter(other, one) ? other : one), first);
  const joint = joined(assessed, strictest);
  const { rule, limit } = strictest;
  const compared = joint.compared === null ? null : { value: decimalOf(joint.compared), unit: limit.amount.unit };
  const { status, reason } = joint;
  const isLidMissing = reason === 'not-measured' && addsLids(rule.region, limit) && isRead(report, limit);
  return [
    {
      substance: limit.substance,
      part: limitedPart(limit),
      per: limit.per,
      status,
      reason,
      ...(joint.ifConfirmed === undefined ? {} : { ifConfirmed: joint.ifConfirmed }),
      limit: { value: limit.amount.value, unit: limit.amount.unit },
      compared,
      rule: rule.id,
      region: rule.region,
      strength: rule.strength,
      standing: rule.standing,
      evidence: limit.amount.evidence,
      decisionEvidence: limit.decision.evidence,
      decision: limit.decision,
      why: sayWhy({ status, reason, limit, compared, report, isLidMissing }),
      alsoPossible: assessed.flatMap((one) => (one === strictest ? [] : [one.rule.id])),
      assuming: questionsOf(assessed),
      sources: rule.sources,
    },
  ];
}

function assessOne({ rule, limit, method }: PossibleLimit, report: Report, { changedSince, lidded }: Piece): Assessment {
  if (changedSince) return { status: 'cannot-tell', reason: 'not-covered', compared: null };
  return assess({ sheet: rule.region, limit, method, lidded }, report);
}

const isRead = ({ readings, furtherPieces }: Report, limit: PossibleLimit['limit']): boolean =>
  [...readings, ...furtherPieces].some(({ substance, part }) => substance === limit.substance && part === limitedPart(limit));

type Joint = Assessment & Pick<Verdict, 'ifConfirmed'>;

/**
 * What the limits of a group say together. Where they differ it cannot be told until the category is known; where they agree
 * and one of them is from memory, it cannot be told until that one is confirmed.
 */
function joined(all: readonly Assessed[], { status, reason, compared }: Assessed): Joint {
  if (all.some((one) => one.status !== status)) return { status: 'cannot-tell', reason: 'category-open', compared };
  if (status === 'cannot-tell' || all.every(({ limit }) => limit.amount.evidence === 'read')) return { status, reason, compared };
  return { status: 'cannot-tell', reason: 'unconfirmed', compared, ifConfirmed: status };
}

/** Of two limits with the same figure the stricter rule of decision: a mean never exceeds the highest piece. */
const STRICTNESS: readonly Decision['kind'][] = ['each', 'first-then-three', 'mean-of'];

function isStricter(one: Assessed, other: Assessed): boolean {
  const bySize = compare(sizeOf(one), sizeOf(other));
  if (bySize !== 0) return bySize < 0;
  return STRICTNESS.indexOf(one.limit.decision.kind) < STRICTNESS.indexOf(other.limit.decision.kind);
}

const sizeOf = ({ limit }: Assessed): Fraction => sizeOfLimit(limit, figureOf(limit)) ?? whole(0n);

/** Each once, in the order of asking. */
function questionsOf(limits: readonly PossibleLimit[]): readonly string[] {
  const open = new Set(limits.flatMap(({ assuming }) => assuming));
  return QUESTIONS.flatMap(({ id }) => (open.has(id) ? [id] : []));
}
