import { NO, UNKNOWN, YES, type Tri } from '@/lib/kernel/tri';
import { cellsOf, type Cells, type Picked } from './cell-range';
import { LEAVES, lowestBit, type Diagram } from './diagram';
import { ExactStatus } from './exact-status';
import type { Knowledge } from './knowledge';
import type { CompiledLine } from './line';

export type OtherAnswer = { readonly question: string; readonly cells: Cells };

/** The fewest other answers with which a settled rule would no longer stand as it does. */
export type NearestOutcome = {
  readonly changes: readonly OtherAnswer[];
  /** Answers not given yet that the other outcome then also needs. */
  readonly besides: readonly OtherAnswer[];
  /** What would be known with the changed answers. */
  readonly masks: Int32Array;
  /** The status then: the other outcome, or open while it also needs answers not given yet. */
  readonly becomes: Tri;
};

/** A changed answer outweighs any number of answers not given yet: a line has fewer variables than this. */
const CHANGE = 10_000;
const CHANGED = 1;
const NARROWED = 2;

type Step = { readonly variable: number; readonly mask: number; readonly flags: number; readonly to: number };
type Way = { readonly cost: number; readonly step: Step | null };
type Search = { readonly line: CompiledLine; readonly masks: Int32Array; readonly leaf: number; readonly memo: Map<number, Way> };

/**
 * The nearest other outcome of a settled rule; null while it is open, or when no answers change it. Of ways as short the one
 * with the fewest further answers, then the one through the first cells.
 */
export function nearestOutcome(line: CompiledLine, rank: number, { masks }: Knowledge): NearestOutcome | null {
  const node = line.rules[rank]?.node ?? 0;
  const now = new ExactStatus(line.diagram).of(node, masks);
  if (now === UNKNOWN || node < LEAVES) return null;
  const other = now === YES ? NO : YES;
  const search: Search = { line, masks, leaf: other === NO ? 0 : 1, memo: new Map() };
  const steps = stepsOf(search, node);
  const then = changedMasks(masks, steps);
  const becomes = new ExactStatus(line.diagram).of(node, then);
  const told = (flags: number): readonly OtherAnswer[] =>
    answersOf(
      line,
      steps.filter((step) => step.flags === flags),
    );
  return {
    changes: told(CHANGED),
    besides: becomes === other ? [] : told(NARROWED),
    masks: then,
    becomes,
  };
}

function changedMasks(masks: Int32Array, steps: readonly Step[]): Int32Array {
  const then = masks.slice();
  for (const { variable, mask, flags } of steps) if (flags === CHANGED) then[variable] = mask;
  return then;
}

function stepsOf(search: Search, root: number): readonly Step[] {
  const steps: Step[] = [];
  let at: Step | null = wayFrom(search, { node: root, flags: 0, question: -1 }).step;
  while (at !== null) {
    steps.push(at);
    const question = search.line.variables.question[at.variable]!;
    at = wayFrom(search, { node: at.to, flags: flagsAfter(steps, search.line), question }).step;
  }
  return steps;
}

/** What the question of the last step has been made to cost so far. */
function flagsAfter(steps: readonly Step[], { variables }: CompiledLine): number {
  const question = variables.question[steps.at(-1)?.variable ?? 0];
  return steps.reduce((flags, step) => (variables.question[step.variable] === question ? flags | step.flags : flags), 0);
}

type Place = { readonly node: number; readonly flags: number; readonly question: number };

/** The cheapest way to the leaf. Variables of one question follow each other, so its price is asked for once. */
function wayFrom(search: Search, { node, flags, question }: Place): Way {
  if (node < LEAVES) return { cost: node === search.leaf ? 0 : Infinity, step: null };
  const variable = search.line.diagram.variable[node]!;
  const own = search.line.variables.question[variable]!;
  const paid = own === question ? flags : 0;
  const key = 4 * node + paid;
  const known = search.memo.get(key);
  if (known !== undefined) return known;
  let best: Way = { cost: Infinity, step: null };
  for (const [to, mask] of cellsByChild(search.line, node)) {
    const step = flagOf(mask, search.masks[variable]!);
    const further = wayFrom(search, { node: to, flags: paid | step, question: own }).cost;
    const cost = further + priceOf(step & ~paid);
    if (cost < best.cost) best = { cost, step: { variable, mask, flags: step, to } };
  }
  search.memo.set(key, best);
  return best;
}

const priceOf = (flag: number): number => (flag === CHANGED ? CHANGE : flag === NARROWED ? 1 : 0);

function flagOf(mask: number, known: number): number {
  if ((mask & known) === 0) return CHANGED;
  return (known & ~mask) === 0 ? 0 : NARROWED;
}

/** The children of a node, each with the cells that lead to it, in the order of their first cells. */
function cellsByChild(
  { diagram, variables }: { readonly diagram: Diagram } & Pick<CompiledLine, 'variables'>,
  node: number,
): ReadonlyMap<number, number> {
  const cells = new Map<number, number>();
  for (let live = variables.all[diagram.variable[node]!]!; live !== 0; live &= live - 1) {
    const cell = lowestBit(live);
    const child = diagram.child[diagram.first[node]! + cell]!;
    cells.set(child, (cells.get(child) ?? 0) | (1 << cell));
  }
  return cells;
}

function answersOf(line: CompiledLine, steps: readonly Step[]): readonly OtherAnswer[] {
  const picked = new Map<number, Picked[]>();
  for (const { variable, mask } of steps) {
    const place = line.variables.question[variable]!;
    const own = picked.get(place) ?? [];
    own.push({ offset: variable - (line.cells[place]?.first ?? 0), mask });
    picked.set(place, own);
  }
  return [...picked].flatMap(([place, own]) => {
    const cut = line.cells[place];
    const question = line.questions[place];
    return cut === null || cut === undefined || question === undefined ? [] : { question, cells: cellsOf(cut, own) };
  });
}
