import { NO, YES } from '@/lib/kernel/tri';
import { literalsOf, type Space } from './cells';
import type { Reading, Test } from './condition-reading';
import { ALWAYS, NEVER, type DiagramBuilder } from './diagram-builder';
import type { TapeWriter } from './tape';

/** A condition that others refer to: its diagram, and the slot where the tape keeps its value. */
export type Compiled = { readonly node: number; readonly slot: number };

export type Workshop = {
  readonly space: Space;
  readonly builder: DiagramBuilder;
  readonly tape: TapeWriter;
  /** By position in the list of terms; a term stands here before anything that uses it is compiled. */
  readonly terms: (Compiled | undefined)[];
  /** The gates of gated questions, by position of the question. */
  readonly gates: (Compiled | undefined)[];
};

/** Makes the diagram of a condition and leaves its Kleene value on top of the tape's stack. */
export function compileCondition(reading: Reading, shop: Workshop): number {
  switch (reading.kind) {
    case 'always':
      shop.tape.push(reading.holds ? YES : NO);
      return reading.holds ? ALWAYS : NEVER;
    case 'term':
      return refer(shop.terms[reading.term], shop);
    case 'test':
      return compileTest(reading.test, shop);
    case 'not': {
      const node = compileCondition(reading.part, shop);
      shop.tape.not();
      return shop.builder.not(node);
    }
    case 'all':
    case 'any': {
      const nodes = reading.parts.map((part) => compileCondition(part, shop));
      shop.tape.join(reading.kind, nodes.length);
      return shop.builder[reading.kind](nodes);
    }
  }
}

/** Keeps a compiled condition under a slot of its own. */
export function keep(node: number, { tape }: Workshop): Compiled {
  return { node, slot: tape.store() };
}

function refer(compiled: Compiled | undefined, { tape }: Workshop): number {
  if (compiled === undefined) {
    tape.push(NO);
    return NEVER;
  }
  tape.load(compiled.slot);
  return compiled.node;
}

/** A test of a gated question means: the gate holds, and so does the test. */
function compileTest(test: Test, shop: Workshop): number {
  const cut = shop.space.byQuestion[test.question];
  const literals = cut === undefined || cut === null ? [] : literalsOf(test, cut);
  for (const { variable, mask } of literals) shop.tape.test(variable, mask);
  shop.tape.join('any', literals.length);
  const node = shop.builder.any(literals.map((literal) => shop.builder.literal(literal)));
  const gate = shop.gates[test.question];
  if (gate === undefined) return node;
  shop.tape.load(gate.slot);
  shop.tape.join('all', 2);
  return shop.builder.all([gate.node, node]);
}
