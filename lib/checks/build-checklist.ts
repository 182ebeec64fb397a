import 'server-only';
import { fingerprint } from '@/db/fingerprint';
import { calendarDateOf, type CalendarDate } from '@/lib/kernel/calendar-date';
import { canonicalJson } from '@/lib/kernel/canonical-json';
import { ok, type Result } from '@/lib/kernel/result';
import { cautionFor } from '@/lib/server/caution';
import type { Ctx } from '@/lib/server/ctx';
import { checklistOf, type LoadedLine, type RegionChecklist } from './domain/checklist';
import { copyText, SEMANTICS } from './domain/dated-copy';
import type { Answers } from './domain/knowledge';
import type { Place } from './domain/line';
import { nextOver, type NextQuestion } from './domain/next-over';
import { QUESTIONS } from './domain/questions';
import { keepCopy } from './keep-copy';
import { loadLines, type UnknownRegion } from '@/lib/server/load-lines';

export type ChecklistInput = {
  readonly regions: readonly string[];
  readonly on?: CalendarDate | undefined;
  readonly answers: Answers;
  readonly declined: readonly string[];
  readonly keep: boolean;
};

export type Checklist = {
  readonly on: CalendarDate;
  readonly regions: readonly RegionChecklist[];
  readonly next: NextQuestion | null;
  readonly stillMatters: readonly string[];
  readonly caution: string;
  readonly copy: string;
};

/**
 * The checklist of one piece for some places on a day (today in UTC when none is given). Keeps nothing, unless asked to
 * keep the dated copy. The same request read from the same editions gives the same checklist, byte for byte.
 */
export async function buildChecklist(ctx: Ctx, input: ChecklistInput): Promise<Result<Checklist, UnknownRegion>> {
  const on = input.on ?? calendarDateOf(ctx.now);
  const loaded = await loadLines(ctx.db, input.regions, on);
  if (!loaded.ok) return loaded;
  const { lines, places } = loaded.value;
  const text = copyOf(lines, places, on, input);
  if (input.keep) await keepCopy(ctx, text);
  return ok({ ...judgeLines(lines, input, on), copy: fingerprint(text) });
}

/** The part of a checklist that follows from the sheets and the answers alone. */
export function judgeLines(
  lines: readonly LoadedLine[],
  { answers, declined }: Pick<ChecklistInput, 'answers' | 'declined'>,
  on: CalendarDate,
): Omit<Checklist, 'copy'> {
  const regions = lines.map((line) => checklistOf(line, answers, declined, on));
  const { next, stillMatters: matters } = nextOver(lines, answers, declined);
  const caution = cautionFor({
    sources: regions.flatMap(({ rules }) => rules.flatMap(({ sources }) => sources)),
    authorities: regions.map(({ authorities }) => authorities),
    on,
  });
  return { on, regions, next, stillMatters: matters, caution };
}

function copyOf(
  lines: readonly LoadedLine[],
  places: readonly Place[],
  on: CalendarDate,
  { answers, declined }: Pick<ChecklistInput, 'answers' | 'declined'>,
): string {
  return copyText({
    semantics: SEMANTICS,
    on,
    questions: fingerprint(canonicalJson(QUESTIONS)),
    regions: lines.map(({ code, line, layers }) => ({
      code,
      line: line.layers,
      except: line.except,
      editions: layers.map(({ sheet, edition, hash }) => ({ region: sheet.code, number: edition, hash })),
    })),
    places,
    answers,
    declined,
  });
}
