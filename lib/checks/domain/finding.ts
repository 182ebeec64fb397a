import type { Answers } from './knowledge';

/** The ten checks a sheet passes before it can come into use. */
export type SheetCheck = 'C1' | 'C2' | 'C3' | 'C4' | 'C5' | 'C6' | 'C7' | 'C8' | 'C9' | 'C10';

/** Where a finding stands: in which list of the sheet, at which item, in which field. `sheet` is the document's own fields. */
export type FindingAt = { readonly list: FindingList; readonly id: string; readonly field: string };
export type FindingList =
  'sheet' | 'rules' | 'terms' | 'sources' | 'memberships' | 'trials' | 'authorities' | 'accreditation' | 'gaps' | 'leftOut';

/** What was found; each has a message in content/messages/en/sheet-checks.json. */
export type FindingKind =
  // C1
  | 'document'
  | 'unknown-question'
  | 'unknown-term'
  | 'bad-test'
  | 'term-cycle'
  | 'term-not-in-force'
  | 'twice'
  | 'rule-elsewhere'
  | 'parent-unknown'
  | 'membership-circle'
  | 'except-unknown'
  | 'breaks-below'
  // C2
  | 'target-unknown'
  | 'target-never-together'
  | 'target-excepted'
  | 'target-withdrawn'
  | 'attack-upwards'
  | 'attack-on-firm'
  | 'alongside-unknown'
  // C3
  | 'clash'
  | 'clash-below'
  // C4
  | 'never-applies'
  | 'always-applies'
  | 'fully-replaced'
  // C5
  | 'gate-never'
  | 'part-never'
  | 'question-idle'
  | 'question-unused'
  | 'term-unused'
  // C6
  | 'ends-before-start'
  | 'gap-between'
  | 'gap-stated'
  | 'look-again-passed'
  // C7
  | 'no-source'
  | 'no-seen-date'
  | 'no-passage'
  | 'no-passage-changed'
  // C8
  | 'trial-otherwise'
  | 'trial-no-rule'
  | 'trial-bad-answer'
  | 'trial-no-line'
  | 'trial-changed'
  | 'trial-withdrawn'
  | 'trial-below'
  // C9
  | 'meaning-same'
  | 'meaning-added'
  | 'meaning-withdrawn'
  | 'meaning-changed'
  | 'meaning-changed-below'
  // C10
  | 'too-many-cells'
  | 'too-many-questions'
  | 'too-many-nodes';

/** One finding, without words: ids, dates, statuses and counts by name. An error keeps the sheet from coming into use. */
export type Finding = {
  readonly check: SheetCheck;
  readonly level: 'error' | 'note';
  readonly at: FindingAt;
  readonly kind: FindingKind;
  readonly values: Readonly<Record<string, string | number>>;
  /** A piece that shows it, where there is one. */
  readonly example?: Answers;
};

export const inRule = (id: string, field: string): FindingAt => ({ list: 'rules', id, field });
export const inTerm = (id: string, field: string): FindingAt => ({ list: 'terms', id, field });
export const inTrial = (id: string, field: string): FindingAt => ({ list: 'trials', id, field });

type Said = Pick<Finding, 'at' | 'kind'> & { readonly values?: Finding['values'] };

export const fault = (check: SheetCheck, { at, kind, values = {} }: Said): Finding => ({ check, level: 'error', at, kind, values });
export const remark = (check: SheetCheck, { at, kind, values = {} }: Said): Finding => ({ check, level: 'note', at, kind, values });

/** One of each: a finding made on several days or in several lines is told once. */
export function withoutRepeats(findings: readonly Finding[]): readonly Finding[] {
  const seen = new Map<string, Finding>();
  for (const finding of findings) {
    const { check, kind, at, values } = finding;
    const { on: _, ...rest } = values;
    const key = JSON.stringify([check, kind, at, rest]);
    if (!seen.has(key)) seen.set(key, finding);
  }
  return [...seen.values()];
}
