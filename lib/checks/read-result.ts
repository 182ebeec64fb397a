import 'server-only';
import { ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { judgeLines, type Checklist } from './build-checklist';
import type { CheckId } from './domain/ids';
import { questionsOpenFor } from './domain/next-question';
import { QUESTIONS } from './domain/questions';
import { changesBetween, type StatusChange } from './domain/status-change';
import type { LoadedLine } from './domain/checklist';
import { explain, type Explanation } from './domain/why';
import { readCheck, type OpenCheck } from './read-check';

/** Questions each open rule of a place turns on, by rule id. */
export type OpenQuestions = ReadonlyMap<string, readonly string[]>;

/** A checklist as the pages show it. */
export type ReadResult = {
  readonly open: OpenCheck;
  readonly checklist: Omit<Checklist, 'copy'>;
  /** In the order of the places. */
  readonly openQuestions: readonly OpenQuestions[];
  readonly explanation: Explanation;
  /** Null before a second list was shown. */
  readonly changes: readonly StatusChange[] | null;
};

/** The checklist of a check as it stands, explained, and what changed since the list shown before. `place` is the one shown in full. */
export async function readResult(ctx: Ctx, id: CheckId, place: string | null): Promise<Result<ReadResult, { kind: 'not-found' }>> {
  const open = await readCheck(ctx, id);
  if (!open.ok) return open;
  const { check, lines, places, on } = open.value;
  const checklist = judgeLines(lines, check, on);
  const before = check.shown?.before ?? null;
  return ok({
    open: open.value,
    checklist,
    openQuestions: openQuestionsOf(lines, checklist, check),
    explanation: explain({ lines, questions: QUESTIONS, places, answers: check.answers, declined: check.declined, on }, place),
    changes: before === null ? null : changesBetween(judgeLines(lines, before, on).regions, checklist.regions),
  });
}

/** What each line that is neither settled nor treated as applying turns on. */
export function openQuestionsOf(
  lines: readonly LoadedLine[],
  { regions }: Omit<Checklist, 'copy'>,
  { answers, declined }: Pick<OpenCheck['check'], 'answers' | 'declined'>,
): readonly OpenQuestions[] {
  return lines.map(({ compiled }, place) => {
    const open = (regions[place]?.rules ?? []).filter(({ status }) => status === 'not-settled' || status === 'treat-as-applying');
    return new Map(open.map((rule) => [rule.id, questionsOpenFor(compiled, answers, declined, rule.id)]));
  });
}
