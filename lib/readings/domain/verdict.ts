import type { JudgedRule, RegionChecklist } from '@/lib/checks/domain/checklist';
import type { Decision, Evidence, Standing, Strength } from '@/lib/regions/domain/rule';
import type { Reason } from './assessment';
import type { Status } from './decision';
import type { LimitedPart } from './specimen';
import type { Per } from './unit';

/** How a report stands against the limits of one sheet, of one strength, for one substance and part. */
export type Verdict = {
  readonly substance: string;
  readonly part: LimitedPart;
  /** Null where no limit is possible. */
  readonly per: Per | null;
  readonly status: Status;
  /** Why it cannot be told; null beside every other status. */
  readonly reason: Reason | null;
  /** What follows once the limits that are from memory are confirmed. */
  readonly ifConfirmed?: Exclude<Status, 'cannot-tell'>;
  /** As the source quotes it. */
  readonly limit: { readonly value: number; readonly unit: string } | null;
  /** The figure that counts, in the limit's unit: a decimal, exact while it ends. */
  readonly compared: { readonly value: string; readonly unit: string } | null;
  /** The strictest of the possible limits; the others are `alsoPossible`. */
  readonly rule: string | null;
  readonly region: string;
  readonly strength: Strength | null;
  readonly standing: Standing | null;
  readonly evidence: Evidence | null;
  readonly decisionEvidence: Evidence | null;
  readonly decision: Decision | null;
  readonly why: string;
  readonly alsoPossible: readonly string[];
  /** Questions that still decide which of these limits apply. */
  readonly assuming: readonly string[];
  readonly sources: JudgedRule['sources'];
};

/** What one place says to a report. */
export type RegionVerdicts = Pick<RegionChecklist, 'code' | 'categories' | 'authorities' | 'accreditation'> & {
  readonly verdicts: readonly Verdict[];
};
