import { words, wordsAt } from '@/lib/kernel/words';
import { sayFigure, saySubstance } from '@/lib/regions/domain/figure-words';
import type { Reason } from './assessment';
import type { Status } from './decision';
import type { Report } from './reading';
import { limitedPart, type LimitedPart, type LimitOf } from './specimen';

type Told = {
  readonly status: Status;
  readonly reason: Reason | null;
  readonly limit: LimitOf;
  readonly compared: { readonly value: string; readonly unit: string } | null;
  readonly report: Report;
  readonly isLidMissing: boolean;
};

/** The reason of a verdict, in one plain sentence. */
export function sayWhy({ status, reason, limit, compared, report, isLidMissing }: Told): string {
  const { kind, specimens } = limit.decision;
  const said = {
    what: sayWhat(limit.substance, limitedPart(limit)),
    limit: withUnit(sayFigure(limit.amount.value), limit.amount.unit),
    compared: compared === null ? words('readings.why.noFigure') : withUnit(compared.value, compared.unit),
  };
  if (status === 'cannot-tell') {
    if (isLidMissing) return words('readings.why.cannot-tell.no-lid', said);
    return words(`readings.why.cannot-tell.${reason ?? 'category-open'}`, said);
  }
  return words(`readings.why.${status}.${kind}`, { ...said, wanted: specimens, ...countOf(limit, report) });
}

/** Why nothing can be told of a figure for which no limit is possible. */
export function sayNoLimit(substance: string, part: LimitedPart, changedSince: boolean): string {
  const what = sayWhat(substance, part);
  return words(changedSince ? 'readings.why.cannot-tell.not-covered' : 'readings.why.cannot-tell.no-limit', { what });
}

const sayWhat = (substance: string, part: LimitedPart): string =>
  words('readings.why.what', { substance: saySubstance(substance), part: words(`readings.part.${part}`) });

const withUnit = (value: string, unit: string): string => words('regions.figure', { value, unit: wordsAt(`regions.unit.${unit}`) ?? unit });

/** Pieces read: all of them, or those after the first where these decide. */
function countOf(limit: LimitOf, { readings, furtherPieces }: Report): { readonly count: number } {
  const counted = limit.decision.kind === 'first-then-three' ? furtherPieces : [...readings, ...furtherPieces];
  return { count: counted.filter(({ substance, part }) => substance === limit.substance && part === limitedPart(limit)).length };
}
