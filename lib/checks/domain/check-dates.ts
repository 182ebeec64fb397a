import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Rule } from '@/lib/regions/domain/rule';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { fault, inRule, remark, type Finding, type FindingAt } from './finding';

/** C6: spans begin before they end, no days lie bare between rules that take a target's place one after the other, looks are due. */
export function checkDates(proposed: Sheet, on: CalendarDate): readonly Finding[] {
  return [...spans(proposed), ...gaps(proposed), ...dueLooks(proposed, on)];
}

type Span = { readonly from: CalendarDate | null; readonly to: CalendarDate | null };

const isEmpty = ({ from, to }: Span): boolean => from !== null && to !== null && to <= from;

function spans({ rules, terms, memberships }: Sheet): readonly Finding[] {
  const dated: readonly (readonly [FindingAt, Span])[] = [
    ...rules.map((rule) => [{ list: 'rules', id: rule.id, field: 'to' }, rule] as const),
    ...terms.map((term) => [{ list: 'terms', id: term.id, field: 'to' }, term] as const),
    ...memberships.map((edge) => [{ list: 'memberships', id: edge.parent, field: 'to' }, edge] as const),
  ];
  return dated
    .filter(([, span]) => isEmpty(span))
    .map(([at, { from, to }]) => fault('C6', { at, kind: 'ends-before-start', values: { from: from ?? '', to: to ?? '' } }));
}

/**
 * Days between rules of the sheet that replace the same target, on which nothing does. A note on the rule before or after the
 * gap states that it is meant.
 */
function gaps({ rules }: Sheet): readonly Finding[] {
  const replacing = rules.filter(({ kind }) => kind === 'replaces');
  const targets = [...new Set(replacing.flatMap(({ targets: own }) => own))];
  return targets.flatMap((target) =>
    gapsOver(
      target,
      replacing.filter((rule) => rule.targets.includes(target)),
    ),
  );
}

function gapsOver(target: string, replacing: readonly Rule[]): readonly Finding[] {
  return replacing.flatMap((earlier): readonly Finding[] => {
    const { to } = earlier;
    if (to === null || replacing.some((rule) => coversDay(rule, to))) return [];
    const [next] = replacing.filter(({ from }) => from !== null && to < from).sort((a, b) => ((a.from ?? '') < (b.from ?? '') ? -1 : 1));
    if (next === undefined) return [];
    const isStated = earlier.note !== undefined || next.note !== undefined;
    const said = { at: inRule(next.id, 'from'), values: { target, earlier: earlier.id, from: to, to: next.from ?? '' } };
    return [isStated ? remark('C6', { ...said, kind: 'gap-stated' }) : fault('C6', { ...said, kind: 'gap-between' })];
  });
}

const coversDay = ({ from, to }: Span, day: CalendarDate): boolean => (from === null || from <= day) && (to === null || day < to);

function dueLooks({ rules }: Sheet, on: CalendarDate): readonly Finding[] {
  return rules
    .filter(({ lookAgainBy }) => lookAgainBy < on)
    .map(({ id, lookAgainBy }) => remark('C6', { at: inRule(id, 'lookAgainBy'), kind: 'look-again-passed', values: { by: lookAgainBy } }));
}
