import { NO, YES } from '@/lib/kernel/tri';
import type { Condition } from '@/lib/regions/domain/condition';
import { literalsOf, type Space } from './cells';
import type { Reading } from './condition-reading';
import { ALWAYS, NEVER, type DiagramBuilder } from './diagram-builder';
import type { TapeWriter } from './tape';

/** A part of a condition as it was written, with the node that holds when it does. `term` is a position in the line's list of terms. */
export type Part =
  | { readonly kind: 'always'; readonly node: number }
  | { readonly kind: 'test'; readonly node: number; readonly question: number; readonly leaf: Condition }
  | { readonly kind: 'term'; readonly node: number; readonly id: string; readonly term: number }
  | { readonly kind: 'all' | 'any' | 'not'; readonly node: number; readonly parts: readonly Part[] };

/** A condition that others refer to: its parts, and the slot where the tape keeps its value. */
export type Compiled = { readonly node: number; readonly slot: number; readonly part: Part };

export type Workshop = {
  readonly space: Space;
  readonly builder: DiagramBuilder;
  readonly tape: TapeWriter;
  /** By position in the list of terms; a term stands here before anything that uses it is compiled. */
  readonly terms: (Compiled | undefined)[];
  /** The gates of gated questions, by position of the question. */
  readonly gates: (Compiled | undefined)[];
};

type Joined = Extract<Reading, { readonly kind: 'all' | 'any' }>;
type Named = Extract<Reading, { readonly kind: 'term' }>;
type Tested = Extract<Reading, { readonly kind: 'test' }>;

/** Makes the diagrams of a condition and its parts and leaves its Kleene value on top of the tape's stack. */
export function compileCondition(reading: Reading, shop: Workshop): Part {
  switch (reading.kind) {
    case 'always':
      shop.tape.push(reading.holds ? YES : NO);
      return { kind: 'always', node: reading.holds ? ALWAYS : NEVER };
    case 'term':
      return refer(reading, shop);
    case 'test':
      return compileTest(reading, shop);
    case 'not': {
      const part = compileCondition(reading.part, shop);
      shop.tape.not();
      return { kind: 'not', node: shop.builder.not(part.node), parts: [part] };
    }
    case 'all':
    case 'any':
      return compileJoined(reading, shop);
  }
}

/** Keeps a compiled condition under a slot of its own. */
export function keep(part: Part, { tape }: Workshop): Compiled {
  return { node: part.node, slot: tape.store(), part };
}

/** The same parts with their nodes under other names. */
export function renameNodes(part: Part, renamed: (node: number) => number): Part {
  const node = renamed(part.node);
  return 'parts' in part ? { ...part, node, parts: part.parts.map((inner) => renameNodes(inner, renamed)) } : { ...part, node };
}

/** Every node of a condition and its parts. */
export function nodesIn(part: Part): readonly number[] {
  return 'parts' in part ? [part.node, ...part.parts.flatMap(nodesIn)] : [part.node];
}

function compileJoined({ kind, parts: readings }: Joined, shop: Workshop): Part {
  const parts = shop.tape.group(kind, readings, (part) => compileCondition(part, shop));
  return { kind, node: shop.builder[kind](parts.map(({ node }) => node)), parts };
}

function refer({ id, term }: Named, { tape, terms }: Workshop): Part {
  const compiled = terms[term];
  if (compiled === undefined) {
    tape.push(NO);
    return { kind: 'always', node: NEVER };
  }
  tape.load(compiled.slot);
  return { kind: 'term', node: compiled.node, id, term };
}

/** A test of a gated question means: the gate holds, and so does the test. */
function compileTest({ test, leaf }: Tested, shop: Workshop): Part {
  const cut = shop.space.byQuestion[test.question];
  const literals = cut === undefined || cut === null ? [] : literalsOf(test, cut);
  for (const { variable, mask } of literals) shop.tape.test(variable, mask);
  shop.tape.join('any', literals.length);
  const node = shop.builder.any(literals.map((literal) => shop.builder.literal(literal)));
  const own = { kind: 'test', question: test.question, leaf } as const;
  const gate = shop.gates[test.question];
  if (gate === undefined) return { ...own, node };
  shop.tape.load(gate.slot);
  shop.tape.join('all', 2);
  return { ...own, node: shop.builder.all([gate.node, node]) };
}
