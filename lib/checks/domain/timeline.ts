import { addMonths, type CalendarDate } from '@/lib/kernel/calendar-date';
import { checklistOf, type LoadedLine } from './checklist';
import type { Answers } from './knowledge';
import { compileLine, type Place } from './line';
import type { Question } from './questions';
import { changesBetween, type StatusChange } from './status-change';

/** What changes for a piece on a day; null where the sheets as they will be then cannot be read. */
export type TimelineStep = { readonly on: CalendarDate; readonly changes: readonly StatusChange[] | null };

export type TimelineInput = {
  readonly loaded: LoadedLine;
  readonly questions: readonly Question[];
  readonly places: readonly Place[];
  readonly answers: Answers;
  readonly declined: readonly string[];
  readonly on: CalendarDate;
};

/** Months looked ahead. */
const AHEAD = 24;

/** The days after this one, within 24 months, on which a rule or term of the line begins or ends. */
export function boundariesOf({ layers }: Pick<LoadedLine, 'layers'>, on: CalendarDate): readonly CalendarDate[] {
  const until = addMonths(on, AHEAD);
  const dated = layers.flatMap(({ sheet }) => [...sheet.rules, ...sheet.terms]);
  const days = dated.flatMap(({ from, to }) => [from, to]).flatMap((day) => (day !== null && on < day && day <= until ? day : []));
  return [...new Set(days)].sort();
}

/**
 * What changes for one piece in one place on each boundary, by the editions and the memberships of today. Between two
 * boundaries nothing changes, so each interval is judged once. Days on which nothing changes for this piece are left out.
 */
export function timelineOf(input: TimelineInput): readonly TimelineStep[] {
  const { loaded, answers, declined, on } = input;
  const steps: TimelineStep[] = [];
  let before = checklistOf(loaded, answers, declined, on);
  for (const day of boundariesOf(loaded, on)) {
    const then = lineOn(input, day);
    if (then === null) {
      steps.push({ on: day, changes: null });
      continue;
    }
    const after = checklistOf(then, answers, declined, day);
    const changes = changesBetween([before], [after]).filter(concerns);
    if (changes.length > 0) steps.push({ on: day, changes });
    before = after;
  }
  return steps;
}

/** A line that comes or goes without ever applying to the piece is no news to its maker. */
function concerns({ before, after }: StatusChange): boolean {
  return [before, after].some((status) => status !== null && status !== 'does-not-apply');
}

function lineOn({ loaded, questions, places }: TimelineInput, on: CalendarDate): LoadedLine | null {
  const compiled = compileLine({
    questions,
    layers: loaded.layers.map(({ sheet }) => ({ region: sheet.code, rules: sheet.rules, terms: sheet.terms })),
    except: loaded.line.except.map(({ rule }) => rule),
    on,
    places,
  });
  return compiled.ok ? { ...loaded, compiled: compiled.value } : null;
}
