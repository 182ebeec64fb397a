import 'server-only';
import { findCopy } from '@/db/copies';
import { fingerprint } from '@/db/fingerprint';
import { listRegions } from '@/db/regions';
import { calendarDateOf, type CalendarDate } from '@/lib/kernel/calendar-date';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { judgeLines, type Checklist } from './build-checklist';
import { QUESTIONS } from './domain/questions';
import { changesBetween, type StatusChange } from './domain/status-change';
import { SEMANTICS, type DatedCopy } from './domain/dated-copy';
import type { LoadedLine } from './domain/checklist';
import { explain, type Explanation } from './domain/why';
import type { CopyHash } from './domain/ids';
import { loadLine, loadLines } from '@/lib/server/load-lines';
import { openQuestionsOf, type OpenQuestions } from './read-result';
import { copyDocument } from './schema';

/** A dated copy as it was judged, and what the sheets of today say otherwise. `changes` is null when a place is no longer read. */
export type ReadCopy = {
  readonly copy: DatedCopy;
  readonly checklist: Checklist;
  readonly madeOn: CalendarDate;
  readonly today: CalendarDate;
  readonly changes: readonly StatusChange[] | null;
  readonly lines: readonly LoadedLine[];
  readonly openQuestions: readonly OpenQuestions[];
  readonly explanation: Explanation;
  /** Names of every place, by code. */
  readonly names: ReadonlyMap<string, string>;
};

/** Judges a kept copy again out of the very editions it rested on, and compares with today. `place` is the one shown in full. */
export async function readCopy(ctx: Ctx, hash: CopyHash, place: string | null): Promise<Result<ReadCopy, { kind: 'not-found' }>> {
  const kept = await findCopy(ctx.db, hash);
  if (kept === null) return err({ kind: 'not-found' });
  if (fingerprint(kept.text) !== hash) throw new Error(`The dated copy ${hash} was changed after it was made`);
  const copy = copyDocument.parse(JSON.parse(kept.text));
  if (copy.semantics !== SEMANTICS) throw new Error(`No evaluator for semantics ${String(copy.semantics)} of copy ${hash}`);
  const lines = await Promise.all(
    copy.regions.map(({ code, line, except, editions }) =>
      loadLine(ctx.db, { code, line: { layers: line, except }, on: copy.on, places: copy.places, heads: editions }),
    ),
  );
  const checklist = { ...judgeLines(lines, copy, copy.on), copy: hash };
  const today = calendarDateOf(ctx.now);
  return ok({
    copy,
    checklist,
    madeOn: calendarDateOf(kept.madeAt),
    today,
    changes: await changesSince(ctx, copy, checklist, today),
    lines,
    openQuestions: openQuestionsOf(lines, checklist, copy),
    explanation: explain({ ...copy, lines, questions: QUESTIONS }, place),
    names: new Map((await listRegions(ctx.db)).map(({ code, name }) => [code, name])),
  });
}

async function changesSince(ctx: Ctx, copy: DatedCopy, then: Checklist, today: CalendarDate): Promise<ReadCopy['changes']> {
  const on = today > copy.on ? today : copy.on;
  const loaded = await loadLines(
    ctx.db,
    copy.regions.map(({ code }) => code),
    on,
  );
  return loaded.ok ? changesBetween(then.regions, judgeLines(loaded.value.lines, copy, on).regions) : null;
}
