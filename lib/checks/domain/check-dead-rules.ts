import type { Sheet } from '@/lib/regions/domain/sheet';
import type { CompiledDay } from './compiled-days';
import { ALWAYS, NEVER } from './diagram-builder';
import { fault, inRule, remark, type Finding } from './finding';
import type { CompiledLine, CompiledRule } from './line';

/** Ids of rules that no piece makes apply, and of those that apply to every piece, with the attackers counted. */
export function constantRules({ rules }: Pick<CompiledLine, 'rules'>): {
  readonly never: readonly string[];
  readonly always: readonly string[];
} {
  const idsAt = (leaf: number): readonly string[] => rules.flatMap(({ id, node }) => (node === leaf ? id : []));
  return { never: idsAt(NEVER), always: idsAt(ALWAYS) };
}

/**
 * C4: a rule of the sheet that never applies on any day it is in force, and one whose written condition always holds. `true`
 * is no fault: it is written on purpose. An inherited rule that the proposal replaces wholly is worth a note.
 */
export function checkDeadRules(proposed: Sheet, days: readonly CompiledDay[]): readonly Finding[] {
  const constant = days.map(({ line }) => ({ ids: new Set(line.rules.map(({ id }) => id)), ...constantRules(line) }));
  const onEveryDay = (id: string, list: 'never' | 'always'): boolean => {
    const active = constant.filter(({ ids }) => ids.has(id));
    return active.length > 0 && active.every((day) => day[list].includes(id));
  };
  const own = proposed.rules.flatMap(({ id, when }): readonly Finding[] => {
    if (onEveryDay(id, 'never')) return [fault('C4', { at: inRule(id, 'when'), kind: 'never-applies' })];
    return when !== true && onEveryDay(id, 'always') ? [fault('C4', { at: inRule(id, 'when'), kind: 'always-applies' })] : [];
  });
  return [...own, ...days.flatMap((day) => replacedRules(proposed, day))];
}

/** Inherited rules that never apply any more, at the rule of the sheet that takes their place. */
function replacedRules(proposed: Sheet, { line, before }: CompiledDay): readonly Finding[] {
  const own = new Set(proposed.rules.map(({ id }) => id));
  const dead = new Set(before === null ? [] : constantRules(before).never);
  const fresh = line.rules.filter(({ id, node }) => node === NEVER && !own.has(id) && !dead.has(id));
  return fresh.flatMap((rule) => {
    const by = attackersOf(line, rule).find((id) => own.has(id));
    return by === undefined ? [] : [remark('C4', { at: inRule(by, 'targets'), kind: 'fully-replaced', values: { target: rule.id } })];
  });
}

const attackersOf = ({ rules }: CompiledLine, { attackers }: CompiledRule): readonly string[] =>
  attackers.flatMap((rank) => rules[rank]?.id ?? []);
