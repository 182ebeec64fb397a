import { checklistOf, type LoadedLine } from '@/lib/checks/domain/checklist';
import type { Answers } from '@/lib/checks/domain/knowledge';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Strength } from '@/lib/regions/domain/rule';
import { groupLimits, judgeGroup, type Piece } from './group';
import { possibleLimits, type PossibleLimit } from './possible';
import type { Reading, Report } from './reading';
import { addsLids, findLid } from './specimen';
import type { RegionVerdicts, Verdict } from './verdict';
import { sayNoLimit } from './why';

/**
 * Judges a lab report for one place on a day. Pure: the same sheets, answers and figures give the same verdicts. A changed
 * combination is not covered by its report, before all else: then no entry says anything else, not even that a limit is unknown.
 */
export function regionVerdicts(loaded: LoadedLine, answers: Answers, report: Report, on: CalendarDate): RegionVerdicts {
  const { code, rules, categories, authorities, accreditation } = checklistOf(loaded, answers, [], on);
  const piece: Piece = { changedSince: answers['changed-since-test'] === true, lidded: answers['lidded'] === true };
  const limits = possibleLimits(loaded, rules, answers);
  const limited = groupLimits(limits).flatMap((group) => judgeGroup(group, report, piece));
  const unlimited = readWithoutLimit(report, limits, limited).map((reading) => noLimit(code, reading, piece));
  const verdicts = [...limited, ...unlimited].sort((a, b) => compareVerdicts(a, b, loaded.line.layers));
  return { code, categories, verdicts, authorities, accreditation };
}

/** One reading for each substance and part that was read and has no possible limit. A lid added to its vessel needs none. */
function readWithoutLimit(report: Report, limits: readonly PossibleLimit[], limited: readonly Verdict[]): readonly Reading[] {
  const isLimited = ({ substance, part }: Reading): boolean => limited.some((one) => one.substance === substance && one.part === part);
  const isAdded = ({ substance }: Reading): boolean =>
    limits.some(({ rule, limit }) => limit.substance === substance && addsLids(rule.region, limit));
  const left = [report.readings, report.furtherPieces].flatMap((list) =>
    list.filter((one) => !isLimited(one) && !(isAdded(one) && isLidOfVessel(list, one))),
  );
  return [...new Map(left.map((one) => [JSON.stringify([one.substance, one.part]), one])).values()];
}

const isLidOfVessel = (list: readonly Reading[], one: Reading): boolean =>
  one.part === 'lid' && list.some((other) => other.part === 'vessel' && findLid(list, other) === one);

function noLimit(code: string, { substance, part }: Reading, { changedSince }: Piece): Verdict {
  return {
    substance,
    part,
    per: null,
    status: 'cannot-tell',
    reason: changedSince ? 'not-covered' : 'no-limit',
    limit: null,
    compared: null,
    rule: null,
    region: code,
    strength: null,
    standing: null,
    evidence: null,
    decisionEvidence: null,
    decision: null,
    why: sayNoLimit(substance, part, changedSince),
    alsoPossible: [],
    assuming: [],
    sources: [],
  };
}

const STRENGTHS: readonly (Strength | null)[] = ['must', 'should', 'may', 'note', null];

/** By strength, then the most local sheet, then substance, part and what the limit is per, by their letters. */
function compareVerdicts(a: Verdict, b: Verdict, line: readonly string[]): number {
  const byStrength = STRENGTHS.indexOf(a.strength) - STRENGTHS.indexOf(b.strength);
  const byLayer = line.indexOf(b.region) - line.indexOf(a.region);
  return byStrength || byLayer || byLetters(a.substance, b.substance) || byLetters(a.part, b.part) || byLetters(a.per ?? '', b.per ?? '');
}

const byLetters = (a: string, b: string): number => (a === b ? 0 : a < b ? -1 : 1);
