import 'server-only';
import type { Answers } from '@/lib/checks/domain/knowledge';
import { calendarDateOf, type CalendarDate } from '@/lib/kernel/calendar-date';
import { ok, type Result } from '@/lib/kernel/result';
import { cautionFor } from '@/lib/server/caution';
import type { Ctx } from '@/lib/server/ctx';
import { loadLines, type UnknownRegion } from '@/lib/server/load-lines';
import type { Report } from './domain/reading';
import { regionVerdicts } from './domain/region-verdicts';
import type { RegionVerdicts } from './domain/verdict';

export type ReadingsInput = Report & {
  readonly regions: readonly string[];
  readonly on?: CalendarDate | undefined;
  readonly answers: Answers;
};

export type JudgedReadings = {
  readonly on: CalendarDate;
  readonly regions: readonly RegionVerdicts[];
  readonly caution: string;
};

/**
 * How a lab's figures for one piece stand in some places on a day (today in UTC when none is given). Keeps nothing. The same
 * request read from the same editions gives the same verdicts, byte for byte.
 */
export async function judgeReadings(ctx: Ctx, input: ReadingsInput): Promise<Result<JudgedReadings, UnknownRegion>> {
  const on = input.on ?? calendarDateOf(ctx.now);
  const loaded = await loadLines(ctx.db, input.regions, on);
  if (!loaded.ok) return loaded;
  const regions = loaded.value.lines.map((line) => regionVerdicts(line, input.answers, input, on));
  const caution = cautionFor({
    sources: regions.flatMap(({ verdicts }) => verdicts.flatMap(({ sources }) => sources)),
    authorities: regions.map(({ authorities }) => authorities),
    on,
  });
  return ok({ on, regions, caution });
}
