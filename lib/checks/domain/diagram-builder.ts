import type { Literal, Variables } from './cells';
import { LEAVES, NodeStore, type Diagram } from './diagram';
import { MOST_NODES } from './line-input';

export const NEVER = 0;
export const ALWAYS = 1;

/** Combines diagrams. Once there are too many nodes its answers mean nothing; `overfull` says so. */
export class DiagramBuilder {
  readonly store: NodeStore;
  private readonly both = new Map<number, number>();
  private readonly either = new Map<number, number>();
  private readonly opposite = new Map<number, number>();
  private depth = 0;

  constructor(private readonly variables: Variables) {
    this.store = new NodeStore(variables, variables.cells, MOST_NODES);
  }

  literal({ variable, mask }: Literal): number {
    const count = this.variables.cells[variable]!;
    for (let cell = 0; cell < count; cell += 1) this.store.stack[cell] = (mask >> cell) & 1;
    return this.store.make(variable, 0);
  }

  all(nodes: readonly number[]): number {
    return nodes.reduce((sum, node) => this.combine(sum, node, NEVER), ALWAYS);
  }

  any(nodes: readonly number[]): number {
    return nodes.reduce((sum, node) => this.combine(sum, node, ALWAYS), NEVER);
  }

  not(node: number): number {
    if (node < LEAVES) return 1 - node;
    const known = this.opposite.get(node);
    if (known !== undefined) return known;
    const variable = this.store.variable[node]!;
    const made = this.branch(variable, (cell) => this.not(this.below(node, variable, cell)));
    this.opposite.set(node, made);
    this.opposite.set(made, node);
    return made;
  }

  /** The conjunction where `absorbing` is the leaf "no", the disjunction where it is the leaf "yes". */
  private combine(a: number, b: number, absorbing: number): number {
    if (a === b || a < LEAVES || b < LEAVES) return a === absorbing || b === 1 - absorbing ? a : b;
    return this.store.overfull ? absorbing : this.combineBelow(a, b, absorbing);
  }

  private combineBelow(a: number, b: number, absorbing: number): number {
    const memo = absorbing === NEVER ? this.both : this.either;
    const key = Math.min(a, b) * 0x10000 + Math.max(a, b);
    const known = memo.get(key);
    if (known !== undefined) return known;
    const variable = Math.min(this.store.variable[a]!, this.store.variable[b]!);
    const made = this.branch(variable, (cell) => this.combine(this.below(a, variable, cell), this.below(b, variable, cell), absorbing));
    memo.set(key, made);
    return made;
  }

  private below(node: number, variable: number, cell: number): number {
    if (node < LEAVES || this.store.variable[node]! !== variable) return node;
    return this.store.child[this.store.first[node]! + cell]!;
  }

  private branch(variable: number, childOf: (cell: number) => number): number {
    const base = this.depth;
    const count = this.variables.cells[variable]!;
    this.depth += count;
    for (let cell = 0; cell < count; cell += 1) this.store.stack[base + cell] = childOf(cell);
    this.depth = base;
    return this.store.make(variable, base);
  }
}

/** The part of a diagram that hangs on `roots`, and the roots' new names. */
export function keepReachable(diagram: Diagram, variables: Variables, roots: readonly number[]): { diagram: Diagram; rename: Int32Array } {
  const rename = new Int32Array(diagram.size);
  const arityOf = (node: number): number => variables.cells[diagram.variable[node]!]!;
  for (const root of roots) rename[root] = 1;
  let size = LEAVES;
  let children = 0;
  // Children stand before their parents: down once to find what is reached, up once to name it.
  for (let node = diagram.size - 1; node >= LEAVES; node -= 1) {
    if (rename[node]! === 0) continue;
    size += 1;
    children += arityOf(node);
    for (let cell = 0; cell < arityOf(node); cell += 1) rename[diagram.child[diagram.first[node]! + cell]!] = 1;
  }
  const { words } = diagram;
  const kept = {
    size,
    variable: new Int32Array(size),
    first: new Int32Array(size),
    child: new Int32Array(children),
    support: new Int32Array(size * words),
    words,
  };
  let next = LEAVES;
  let used = 0;
  rename.set([0, 1]);
  for (let node = LEAVES; node < diagram.size; node += 1) {
    if (rename[node]! === 0) continue;
    kept.variable[next] = diagram.variable[node]!;
    kept.first[next] = used;
    kept.support.set(diagram.support.subarray(node * words, (node + 1) * words), next * words);
    const first = diagram.first[node]!;
    for (let cell = 0; cell < arityOf(node); cell += 1) kept.child[used + cell] = rename[diagram.child[first + cell]!]!;
    used += arityOf(node);
    rename[node] = next;
    next += 1;
  }
  return { diagram: kept, rename };
}
