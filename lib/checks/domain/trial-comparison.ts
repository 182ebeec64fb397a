import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Sheet } from '@/lib/regions/domain/sheet';
import type { Trial, TrialStatus } from '@/lib/regions/domain/trial';
import type { BothLines, Lines } from './compiled-days';
import type { Question } from './questions';
import { statusesOfTrial } from './trial-run';

/** A line of a trial piece that comes out otherwise. Null: the rule is not in that version of the line. */
export type ChangedLine = { readonly rule: string; readonly before: TrialStatus | null; readonly after: TrialStatus | null };

export type ChangedTrial = {
  readonly id: string;
  readonly title: string;
  readonly on: CalendarDate;
  readonly lines: readonly ChangedLine[];
};

/** The trial pieces of two versions of a sheet, judged by both. Every piece is unchanged, changed, or could not be judged. */
export type TrialComparison = {
  readonly total: number;
  readonly unchanged: number;
  readonly unread: number;
  readonly changed: readonly ChangedTrial[];
};

type Versions = { readonly before: Sheet; readonly after: Sheet };

/**
 * Judges each trial piece of either version, by its later description, for its own day, by both lines. Looks at the lines that
 * either version expects something of, whatever it expects: that a piece comes out as expected is another check's matter.
 */
export function compareTrials({ before, after }: Versions, lines: BothLines, questions: readonly Question[]): TrialComparison {
  const pieces = [...new Map([...before.trials, ...after.trials].map((trial) => [trial.id, trial])).values()].map((trial) => ({
    ...trial,
    expected: { ...before.trials.find(({ id }) => id === trial.id)?.expected, ...trial.expected },
  }));
  const judged = pieces.map((trial) => {
    const statuses = (side: Lines): Statuses | null => statusesIn(side, { code: after.code, trial, questions });
    return { trial, lines: changedLines(trial, statuses(lines.before), statuses(lines.after)) };
  });
  const changed = judged.flatMap(({ trial: { id, title, on }, lines: own }) =>
    own === null || own.length === 0 ? [] : [{ id, title, on, lines: own }],
  );
  const unread = judged.filter(({ lines: own }) => own === null).length;
  return { total: pieces.length, unchanged: pieces.length - unread - changed.length, unread, changed };
}

type Statuses = Readonly<Record<string, TrialStatus>>;
type Run = { readonly code: string; readonly trial: Trial; readonly questions: readonly Question[] };

function statusesIn(lines: Lines, { code, trial, questions }: Run): Statuses | null {
  const line = lines.compiled(code, trial.on);
  return line.ok ? statusesOfTrial(line.value, trial, questions) : null;
}

function changedLines({ expected }: Trial, before: Statuses | null, after: Statuses | null): readonly ChangedLine[] | null {
  if (before === null || after === null) return null;
  return Object.keys(expected)
    .map((rule) => ({ rule, before: before[rule] ?? null, after: after[rule] ?? null }))
    .filter((line) => line.before !== line.after);
}
