import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { CompiledLine } from './line';
import type { LineInput } from './line-input';
import { linesOf, type Proposal, worldAfter, worldBefore } from './proposal-lines';

/** The proposed place's own line on one day, as it would be and as it is; null where it is not, or does not compile. */
export type CompiledDay = {
  readonly on: CalendarDate;
  readonly input: LineInput;
  readonly line: CompiledLine;
  readonly before: CompiledLine | null;
};

export type Lines = ReturnType<typeof linesOf>;

/** The lines before and after a proposal, each compiled once whoever asks. */
export type BothLines = { readonly before: Lines; readonly after: Lines };

export const bothLines = (proposal: Proposal): BothLines => ({
  before: linesOf(worldBefore(proposal)),
  after: linesOf(worldAfter(proposal)),
});

/** The line of a place on those days on which it compiles. */
export function compiledDays({ before, after }: BothLines, code: string, days: readonly CalendarDate[]): readonly CompiledDay[] {
  return days.flatMap((on): readonly CompiledDay[] => {
    const line = after.compiled(code, on);
    if (!line.ok) return [];
    const old = before.compiled(code, on);
    return [{ on, input: after.input(code, on), line: line.value, before: old.ok ? old.value : null }];
  });
}
