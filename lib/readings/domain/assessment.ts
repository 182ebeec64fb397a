import { readFraction, whole, type Fraction } from '@/lib/kernel/fraction';
import { isRunOtherwise, type Method } from './conditions';
import { decide, type Status, type Unclear } from './decision';
import type { Report } from './reading';
import { addsLids, figuresFor, isLidUnread, limitedPart, type LimitOf } from './specimen';

export type Reason =
  Unclear | 'not-measured' | 'no-limit' | 'unconfirmed' | 'conditions-differ' | 'needs-conversion' | 'category-open' | 'not-covered';

/** How a report stands against one limit by itself. A reason stands exactly beside cannot-tell. */
export type Assessment = { readonly status: Status; readonly reason: Reason | null; readonly compared: Fraction | null };

export type Asked = { readonly sheet: string; readonly limit: LimitOf; readonly method: Method; readonly lidded: boolean };

const cannotTell = (reason: Reason): Assessment => ({ status: 'cannot-tell', reason, compared: null });

/**
 * Assesses a report against one limit: was it read, was it read as the method asks, can it be brought to the limit's unit,
 * and how does the sheet decide. A vessel whose lid was not read can be over by itself, but not within.
 */
export function assess({ sheet, limit, method, lidded }: Asked, report: Report): Assessment {
  const lids = addsLids(sheet, limit) ? 'added' : 'apart';
  const figures = figuresFor(limit, report, lids);
  if (!figures.ok && figures.error === 'not-measured') return cannotTell('not-measured');
  const known = assessFigures({ limit, method }, report, figures);
  if (known.status === 'over' || !lidded || lids === 'apart') return known;
  return isLidUnread(limit, report) ? cannotTell('not-measured') : known;
}

function assessFigures(
  { limit, method }: Pick<Asked, 'limit' | 'method'>,
  report: Report,
  figures: ReturnType<typeof figuresFor>,
): Assessment {
  const isContent = limitedPart(limit) === 'content';
  if (!isContent && isRunOtherwise(method, report.conditions, isCadmiumReleaseRead(report))) return cannotTell('conditions-differ');
  if (!figures.ok) return cannotTell(figures.error);
  return decide({ ...limit.decision, limit: figureOf(limit) }, figures.value);
}

/** A limit's figure in its own unit, exactly as quoted. */
export const figureOf = ({ amount }: Pick<LimitOf, 'amount'>): Fraction => readFraction(amount.value) ?? whole(0n);

const isCadmiumReleaseRead = ({ readings, furtherPieces }: Report): boolean =>
  [...readings, ...furtherPieces].some(({ substance, part }) => substance === 'Cd' && part !== 'content');
