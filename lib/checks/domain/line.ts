import { ok, type Result } from '@/lib/kernel/result';
import { cutSpace, type QuestionCells, type Variables } from './cells';
import { nodesIn, renameNodes, type Part, type Workshop } from './compile-condition';
import type { Diagram } from './diagram';
import { DiagramBuilder, keepReachable } from './diagram-builder';
import { buildLine, readLine, type BuiltRule, type CompiledRule } from './line-build';
import type { CompileFault, LineInput } from './line-input';
import { TapeWriter, type Tape } from './tape';
import type { Terms } from './terms';

export type { CompiledRule } from './line-build';
export type { CompileFault, EngineRule, EngineTerm, Layer, LineInput, Place } from './line-input';

/** The conditions as they are written, part by part, over a diagram of their own: two wordings of one meaning differ only here. */
export type Wording = {
  readonly diagram: Diagram;
  /** In rank order: when a rule applies, whoever attacks it. */
  readonly rules: readonly Part[];
  readonly terms: readonly (Part | null)[];
  /** By position of the gated question. */
  readonly gates: ReadonlyMap<number, Part>;
};

/** One place's rules on one day, ready to be judged as often as wanted. */
export type CompiledLine = {
  /** Ids of all questions in the order of asking; positions in this list name a question elsewhere. */
  readonly questions: readonly string[];
  readonly cells: readonly (QuestionCells | null)[];
  readonly variables: Variables;
  /** Active rules in rank order. */
  readonly rules: readonly CompiledRule[];
  /** Nodes of terms; where layers share an id, the most local one. */
  readonly terms: ReadonlyMap<string, number>;
  /** Nodes of gates, by position of the gated question. */
  readonly gates: ReadonlyMap<number, number>;
  readonly diagram: Diagram;
  readonly tape: Tape;
  readonly wording: Wording;
};

/** Compiles the rules of a line that are active on its day, or says which rule or term is at fault. */
export function compileLine(input: LineInput): Result<CompiledLine, CompileFault> {
  const line = readLine(input);
  if (!line.ok) return line;
  const space = cutSpace(input.questions, line.value.tests, input.places);
  if (!space.ok) return space;
  const builder = new DiagramBuilder(space.value.variables);
  const shop: Workshop = { space: space.value, builder, tape: new TapeWriter(), terms: [], gates: [] };
  const rules = buildLine(line.value, shop);
  return rules.ok ? ok(finish(input, line.value.terms, { shop, rules: rules.value })) : rules;
}

type Built = { readonly shop: Workshop; readonly rules: readonly BuiltRule[] };

/** Drops what was only scaffolding from the diagrams. */
function finish(input: LineInput, terms: Terms, { shop, rules }: Built): CompiledLine {
  const gates = shop.gates.flatMap((gate, question): (readonly [number, number])[] => (gate === undefined ? [] : [[question, gate.node]]));
  // Terms are listed from general to local, so that of two with one id the local one is set last.
  const named = terms.list.map(({ id }, place): readonly [string, number] => [id, shop.terms[place]?.node ?? 0]);
  const roots = [...rules.map(({ node }) => node), ...gates.map(([, node]) => node), ...named.map(([, node]) => node)];
  const { byQuestion, variables } = shop.space;
  const { diagram, rename } = keepReachable(shop.builder.store, variables, roots);
  const renamed = (node: number): number => rename[node]!;
  return {
    questions: input.questions.map(({ id }) => id),
    cells: byQuestion,
    variables,
    rules: rules.map(({ when: _, ...rule }) => ({ ...rule, node: renamed(rule.node) })),
    terms: new Map(named.map(([id, node]) => [id, renamed(node)])),
    gates: new Map(gates.map(([question, node]) => [question, renamed(node)])),
    diagram,
    tape: shop.tape.finish(),
    wording: keepWording({ shop, rules }),
  };
}

function keepWording({ shop, rules }: Built): Wording {
  const gates = shop.gates.flatMap((gate, question): (readonly [number, Part])[] => (gate === undefined ? [] : [[question, gate.part]]));
  const terms = Array.from(shop.terms, (term) => term?.part ?? null);
  const parts = [...rules.map(({ when }) => when), ...terms.flatMap((part) => part ?? []), ...gates.map(([, part]) => part)];
  const { diagram, rename } = keepReachable(shop.builder.store, shop.space.variables, parts.flatMap(nodesIn));
  const renamed = (part: Part): Part => renameNodes(part, (node) => rename[node]!);
  return {
    diagram,
    rules: rules.map(({ when }) => renamed(when)),
    terms: terms.map((part) => (part === null ? null : renamed(part))),
    gates: new Map(gates.map(([question, part]) => [question, renamed(part)])),
  };
}
