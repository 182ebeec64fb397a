import type { Variables } from './cells';
import { LEAVES, NodeStore, lowestBit, questionsOf, type Diagram } from './diagram';

/**
 * Diagrams under what is known. What is left of a node is again a reduced diagram, so that it is a leaf exactly if nothing
 * still open can change the outcome, and the questions in it are exactly those that can. Linear in the diagram: each node is
 * restricted once.
 */
export class Restriction {
  private readonly store: NodeStore;
  /** One more than the restricted node, zero while there is none. */
  private readonly memo: Int32Array;
  private depth = 0;

  constructor(
    private readonly diagram: Diagram,
    variables: Variables,
    private readonly masks: Int32Array,
  ) {
    this.store = new NodeStore(variables, masks.map(countBits), diagram.size + LEAVES);
    this.memo = new Int32Array(diagram.size);
    this.memo.set([1, 2]);
  }

  /** Positions of the questions that can still change the outcome of a node, in order. Empty once it is settled. */
  questionsOpen(node: number): readonly number[] {
    return questionsOf(this.store, this.restrict(node));
  }

  private restrict(node: number): number {
    const known = this.memo[node]!;
    if (known !== 0) return known - 1;
    const made = this.branch(node);
    this.memo[node] = made + 1;
    return made;
  }

  private branch(node: number): number {
    const variable = this.diagram.variable[node]!;
    const first = this.diagram.first[node]!;
    const base = this.depth;
    let next = base;
    this.depth += countBits(this.masks[variable]!);
    for (let live = this.masks[variable]!; live !== 0; live &= live - 1) {
      this.store.stack[next] = this.restrict(this.diagram.child[first + lowestBit(live)]!);
      next += 1;
    }
    this.depth = base;
    return this.store.make(variable, base);
  }
}

function countBits(mask: number): number {
  let count = 0;
  for (let bits = mask; bits !== 0; bits &= bits - 1) count += 1;
  return count;
}
