import { clashesIn, type Clash } from './clashes';
import type { CompiledDay } from './compiled-days';
import { fault, inRule, type Finding } from './finding';
import type { Sheet } from '@/lib/regions/domain/sheet';

/** C3 for the place's own line: a clash is told at the higher of its rules that stands in the sheet, else at the target. */
export function checkClashes(proposed: Sheet, days: readonly CompiledDay[]): readonly Finding[] {
  return days.flatMap(({ line, input, on }) =>
    clashesIn(line, input).flatMap((clash) => {
      const at = placeOfClash(proposed, clash);
      return at === null
        ? []
        : [fault('C3', { at: inRule(at.rule, 'alongside'), kind: 'clash', values: { ...at, target: clash.target, on } })];
    }),
  );
}

/** C3 for a place below: clashes that its line has with the proposed sheet and that neither line has by itself. */
export function checkClashesBelow(region: string, proposed: Sheet, days: readonly CompiledDay[]): readonly Finding[] {
  const own = new Set(proposed.rules.map(({ id }) => id));
  return days.flatMap(({ line, input, before, on }) => {
    const known = new Set((before === null ? [] : clashesIn(before, input)).map(keyOf));
    const fresh = clashesIn(line, input).filter((clash) => !known.has(keyOf(clash)) && !clash.rules.every((id) => own.has(id)));
    return fresh.flatMap((clash) => {
      const at = placeOfClash(proposed, clash);
      return at === null
        ? []
        : [fault('C3', { at: inRule(at.rule, 'alongside'), kind: 'clash-below', values: { ...at, target: clash.target, region, on } })];
    });
  });
}

const keyOf = ({ rules, target }: Clash): string => JSON.stringify([rules, target]);

function placeOfClash(
  proposed: Sheet,
  { rules: [lower, higher], target }: Clash,
): { readonly rule: string; readonly other: string } | null {
  const isOwn = (id: string): boolean => proposed.rules.some((rule) => rule.id === id);
  if (isOwn(higher)) return { rule: higher, other: lower };
  if (isOwn(lower)) return { rule: lower, other: higher };
  return isOwn(target) ? { rule: target, other: higher } : null;
}
