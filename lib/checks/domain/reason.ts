import { UNKNOWN } from '@/lib/kernel/tri';
import { questionsOf } from './diagram';
import type { ExactStatus } from './exact-status';
import type { Knowledge } from './knowledge';
import type { CompiledLine } from './line';

/**
 * A smallest set of answered questions that settles a node by itself: answers are dropped one by one, from the last question
 * to the first, as long as the rest still settles it. Questions in the order of asking.
 */
export function smallestReason(line: CompiledLine, node: number, { masks }: Knowledge, exact: ExactStatus): readonly number[] {
  const left = masks.slice();
  const needed: number[] = [];
  for (const question of questionsOf(line.diagram, node).toReversed()) {
    if (!change(line, question, { to: line.variables.all, masks: left })) continue;
    exact.forget();
    if (exact.of(node, left) !== UNKNOWN) continue;
    change(line, question, { to: masks, masks: left });
    needed.unshift(question);
  }
  return needed;
}

/** Sets what is known of one question to what is known of it elsewhere; says whether that was anything else. */
function change({ cells, variables }: CompiledLine, place: number, { to, masks }: { to: Int32Array; masks: Int32Array }): boolean {
  let changed = false;
  for (let variable = cells[place]?.first ?? 0; variable < masks.length && variables.question[variable] === place; variable += 1) {
    changed ||= masks[variable] !== to[variable];
    masks[variable] = to[variable]!;
  }
  return changed;
}
