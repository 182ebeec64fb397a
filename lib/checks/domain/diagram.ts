import type { Variables } from './cells';

/**
 * Reduced ordered decision diagrams over variables with several cells. Node 0 is the leaf "no", node 1 the leaf "yes"; every
 * other node has one child a cell, tests a variable before those of its children, and stands after its children. No two nodes
 * mean the same, so a function is constant exactly if its node is a leaf.
 */
export type Diagram = {
  readonly size: number;
  readonly variable: Int32Array;
  /** Where a node's children begin in `child`. */
  readonly first: Int32Array;
  readonly child: Int32Array;
  /** The questions a node rests on, as bits, `words` machine words a node. */
  readonly support: Int32Array;
  readonly words: number;
};

export const LEAVES = 2;

const grown = (array: Int32Array, length: number): Int32Array => {
  if (length <= array.length) return array;
  const larger = new Int32Array(Math.max(length, 2 * array.length));
  larger.set(array);
  return larger;
};

/** Where nodes are made. Beyond `most` nodes it only remembers that there were too many. */
export class NodeStore implements Diagram {
  size = LEAVES;
  overfull = false;
  variable: Int32Array = new Int32Array(64);
  first: Int32Array = new Int32Array(64);
  child: Int32Array = new Int32Array(256);
  support: Int32Array;
  readonly words: number;
  /** Children wait here for their node; as deep as one path of the diagram at most. */
  readonly stack: Int32Array;
  private used = 0;
  private slots = new Int32Array(256);

  /** `arity` is the number of children of a node, by variable. */
  constructor(
    private readonly variables: Variables,
    private readonly arity: Int32Array,
    private readonly most: number,
  ) {
    this.words = 1 + (Math.max(0, ...variables.question) >> 5);
    this.support = new Int32Array(64 * this.words);
    this.stack = new Int32Array(arity.reduce((sum, count) => sum + count, 0));
  }

  /** The node that tests `variable` and has the children at `base` of the stack. */
  make(variable: number, base: number): number {
    const count = this.arity[variable]!;
    if (this.isRedundant(base, count)) return this.stack[base]!;
    const slot = this.slotFor(variable, base, count);
    const found = this.slots[slot]!;
    if (found !== 0) return found;
    if (this.size >= this.most) {
      this.overfull = true;
      return 0;
    }
    this.slots[slot] = this.size;
    const node = this.add(variable, base, count);
    if (2 * this.size > this.slots.length) this.rehash();
    return node;
  }

  private isRedundant(base: number, count: number): boolean {
    const only = this.stack[base]!;
    for (let cell = 1; cell < count; cell += 1) if (this.stack[base + cell]! !== only) return false;
    return true;
  }

  private slotFor(variable: number, base: number, count: number): number {
    const last = this.slots.length - 1;
    let slot = hash(variable, this.stack, base, count) & last;
    for (let node = this.slots[slot]!; node !== 0 && !this.isSame(node, variable, base, count); node = this.slots[slot]!) {
      slot = (slot + 1) & last;
    }
    return slot;
  }

  private isSame(node: number, variable: number, base: number, count: number): boolean {
    if (this.variable[node]! !== variable) return false;
    const first = this.first[node]!;
    for (let cell = 0; cell < count; cell += 1) if (this.child[first + cell]! !== this.stack[base + cell]!) return false;
    return true;
  }

  private add(variable: number, base: number, count: number): number {
    const node = this.size;
    this.size += 1;
    this.variable = grown(this.variable, this.size);
    this.first = grown(this.first, this.size);
    this.child = grown(this.child, this.used + count);
    this.support = grown(this.support, this.size * this.words);
    this.variable[node] = variable;
    this.first[node] = this.used;
    for (let cell = 0; cell < count; cell += 1) {
      const child = this.stack[base + cell]!;
      this.child[this.used + cell] = child;
      addSupport(this, node, child);
    }
    this.used += count;
    const question = this.variables.question[variable]!;
    const word = node * this.words + (question >> 5);
    this.support[word] = this.support[word]! | (1 << (question & 31));
    return node;
  }

  private rehash(): void {
    this.slots = new Int32Array(2 * this.slots.length);
    const last = this.slots.length - 1;
    for (let node = LEAVES; node < this.size; node += 1) {
      const variable = this.variable[node]!;
      let slot = hash(variable, this.child, this.first[node]!, this.arity[variable]!) & last;
      while (this.slots[slot]! !== 0) slot = (slot + 1) & last;
      this.slots[slot] = node;
    }
  }
}

function hash(variable: number, children: Int32Array, base: number, count: number): number {
  let value = variable + 1;
  for (let cell = 0; cell < count; cell += 1) value = Math.imul(value ^ children[base + cell]!, 0x9e3779b1) ^ (value >>> 15);
  return value ^ (value >>> 13);
}

function addSupport(diagram: Diagram, node: number, child: number): void {
  for (let word = 0; word < diagram.words; word += 1) {
    const to = node * diagram.words + word;
    diagram.support[to] = diagram.support[to]! | diagram.support[child * diagram.words + word]!;
  }
}

/** The questions a node rests on, in order. */
export function questionsOf(diagram: Diagram, node: number): readonly number[] {
  const questions: number[] = [];
  for (let word = 0; word < diagram.words; word += 1) {
    for (let bits = diagram.support[node * diagram.words + word]!; bits !== 0; bits &= bits - 1) {
      questions.push(32 * word + lowestBit(bits));
    }
  }
  return questions;
}

/** The position of the lowest bit that is set. */
export const lowestBit = (bits: number): number => 31 - Math.clz32(bits & -bits);
