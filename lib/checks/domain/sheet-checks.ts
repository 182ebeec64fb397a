import { checkAttacks } from './check-attacks';
import { checkBelow, checkCompiling } from './check-budgets';
import { checkClashes, checkClashesBelow } from './check-clashes';
import { checkDates } from './check-dates';
import { checkDeadRules } from './check-dead-rules';
import { checkMeanings } from './check-meanings';
import { checkNames } from './check-names';
import { checkQuestions } from './check-questions';
import { checkSources } from './check-sources';
import { checkTrials } from './check-trials';
import { bothLines, compiledDays } from './compiled-days';
import { withoutRepeats, type Finding } from './finding';
import { daysOfChange, daysToCheck, isChanged, regionsBelow, type Proposal } from './proposal-lines';

/**
 * The ten checks of a proposed sheet, by check; an error keeps it from coming into use. What rests on compiled lines is looked at
 * on the day and on every later one on which something begins or ends, wherever the line compiles.
 */
export function checkSheet(proposal: Proposal): readonly Finding[] {
  const { proposed, base, sheets, on, questions } = proposal;
  const days = daysToCheck(proposal);
  const changeDays = daysOfChange(proposal);
  const lines = bothLines(proposal);
  const own = compiledDays(lines, proposed.code, days);
  const below = regionsBelow(proposal, changeDays);
  const findings = [
    ...checkNames(proposal, days),
    ...checkAttacks(proposal, days),
    ...checkCompiling(proposed, lines, days),
    ...checkClashes(proposed, own),
    ...checkDeadRules(proposed, own),
    ...checkQuestions(proposal, own),
    ...checkDates(proposed, on),
    ...checkSources(proposed, base),
    ...checkTrials({ proposed, base, below: below.flatMap((code) => sheets.get(code) ?? []), lines, questions }),
    ...(isChanged(proposal) ? checkMeanings({ proposal, lines, days: changeDays, below }) : []),
    ...below.flatMap((code) => [
      ...checkBelow(proposed, lines, code, changeDays),
      ...checkClashesBelow(code, proposed, compiledDays(lines, code, changeDays)),
    ]),
  ];
  return [...withoutRepeats(findings)].sort((a, b) => orderOf(a) - orderOf(b));
}

const orderOf = ({ check, level }: Finding): number => 2 * Number(check.slice(1)) + (level === 'error' ? 0 : 1);
