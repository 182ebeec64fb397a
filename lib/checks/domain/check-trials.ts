import type { Sheet } from '@/lib/regions/domain/sheet';
import type { Trial } from '@/lib/regions/domain/trial';
import type { BothLines, Lines } from './compiled-days';
import { fault, inTrial, remark, type Finding } from './finding';
import type { Question } from './questions';
import { runTrial, type TrialDifference } from './trial-run';

export type TrialCheck = {
  readonly proposed: Sheet;
  readonly base: Sheet | null;
  /** Sheets of the places below, as they are in use. */
  readonly below: readonly Sheet[];
  readonly lines: BothLines;
  readonly questions: readonly Question[];
};

/**
 * C8: every trial piece of the sheet comes out as it says there. Expectations that the proposal itself changes, pieces it takes
 * out, and pieces of places below that come out otherwise than today are listed for those who decide.
 */
export function checkTrials({ proposed, base, below, lines, questions }: TrialCheck): readonly Finding[] {
  return [
    ...proposed.trials.flatMap((trial) => findingsOfTrial(trial, differencesIn(lines.after, proposed.code, { trial, questions }))),
    ...(base === null ? [] : changedTrials(proposed, base)),
    ...below.flatMap(({ code, trials }) => trials.flatMap((trial) => findingsBelow(code, lines, { trial, questions }))),
  ];
}

type Run = { readonly trial: Trial; readonly questions: readonly Question[] };

/** Null where the line of that day does not compile. */
function differencesIn(lines: Lines, code: string, { trial, questions }: Run): readonly TrialDifference[] | null {
  const line = lines.compiled(code, trial.on);
  return line.ok ? runTrial(line.value, trial, questions) : null;
}

function findingsOfTrial({ id, on }: Trial, differences: readonly TrialDifference[] | null): readonly Finding[] {
  if (differences === null) return [fault('C8', { at: inTrial(id, 'on'), kind: 'trial-no-line', values: { on } })];
  return differences.map((difference): Finding => {
    switch (difference.kind) {
      case 'otherwise': {
        const { rule, expected, found } = difference;
        return fault('C8', { at: inTrial(id, `expected/${rule}`), kind: 'trial-otherwise', values: { rule, expected, found } });
      }
      case 'no-such-rule':
        return fault('C8', {
          at: inTrial(id, `expected/${difference.rule}`),
          kind: 'trial-no-rule',
          values: { rule: difference.rule, on },
        });
      case 'unknown-question':
      case 'wrong-answer':
      case 'answered-and-declined': {
        const { question } = difference;
        return fault('C8', { at: inTrial(id, `answers/${question}`), kind: 'trial-bad-answer', values: { question } });
      }
    }
  });
}

function changedTrials(proposed: Sheet, base: Sheet): readonly Finding[] {
  return base.trials.flatMap((old): readonly Finding[] => {
    const now = proposed.trials.find(({ id }) => id === old.id);
    if (now === undefined) return [remark('C8', { at: inTrial(old.id, 'id'), kind: 'trial-withdrawn', values: { title: old.title } })];
    return Object.entries(old.expected).flatMap(([rule, before]): readonly Finding[] => {
      const after = now.expected[rule];
      if (after === before) return [];
      const values = { rule, before, after: after ?? '' };
      return [remark('C8', { at: inTrial(old.id, `expected/${rule}`), kind: 'trial-changed', values })];
    });
  });
}

/** A piece of a place below that comes out otherwise than it does now. Its expectations belong to that place's own sheet. */
function findingsBelow(region: string, { before, after }: BothLines, run: Run): readonly Finding[] {
  const now = differencesIn(before, region, run) ?? [];
  const known = new Set(now.map((difference) => JSON.stringify(difference)));
  const fresh = (differencesIn(after, region, run) ?? []).filter((difference) => !known.has(JSON.stringify(difference)));
  return fresh.flatMap((difference): readonly Finding[] => {
    if (!('rule' in difference)) return [];
    const { rule, expected } = difference;
    const found = difference.kind === 'otherwise' ? difference.found : '';
    return [
      remark('C8', { at: inTrial(run.trial.id, `expected/${rule}`), kind: 'trial-below', values: { region, rule, expected, found } }),
    ];
  });
}
