import { err, ok, type Result } from '@/lib/kernel/result';
import { rankRules, readAttacks, type RankedRule } from './attacks';
import { cutSpace, type OwnedTest, type QuestionCells, type Variables } from './cells';
import { compileCondition, keep, nodesIn, renameNodes, type Compiled, type Part, type Workshop } from './compile-condition';
import { readCondition, type Reading, type Scope, type Test } from './condition-reading';
import { questionsOf, type Diagram } from './diagram';
import { DiagramBuilder, keepReachable } from './diagram-builder';
import { readGates, type Gate } from './gates';
import { MOST_QUESTIONS, type CompileFault, type LineInput } from './line-input';
import { TapeWriter, type Tape } from './tape';
import { namesOfTerms, readTerms, type Terms } from './terms';

export type { CompileFault, EngineRule, EngineTerm, Layer, LineInput, Place } from './line-input';

/** A rule as compiled: `node` and `slot` hold when it is effective, that is, when it applies and no attacker is effective. */
export type CompiledRule = Omit<Compiled, 'part'> & {
  readonly id: string;
  readonly region: string;
  /** Positions in rank order: the rules that attack it, and those that stand beside it in disagreement. */
  readonly attackers: readonly number[];
  readonly disagrees: readonly number[];
};

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

/** An active rule with every name in it looked up. */
type ReadRule = RankedRule & Pick<CompiledRule, 'attackers' | 'disagrees'> & { readonly reading: Reading };

type ReadLine = { readonly terms: Terms; readonly rules: readonly ReadRule[] };

/** Compiles the rules of a line that are active on its day, or says which rule or term is at fault. */
export function compileLine(input: LineInput): Result<CompiledLine, CompileFault> {
  const scope = { questions: input.questions, placeOf: new Map(input.questions.map(({ id }, place) => [id, place])) };
  const line = readLine(input, scope);
  if (!line.ok) return line;
  const own = testsOf(line.value);
  const gates = readGates(own, scope);
  if (!gates.ok) return gates;
  const space = cutSpace(input.questions, [...gates.value, ...own], input.places);
  if (!space.ok) return space;
  const builder = new DiagramBuilder(space.value.variables);
  const shop: Workshop = { space: space.value, builder, tape: new TapeWriter(), terms: [], gates: [] };
  const rules = build(line.value, gates.value, shop);
  return rules.ok ? ok(finish(input, line.value.terms, { shop, rules: rules.value })) : rules;
}

function readLine(input: LineInput, scope: Omit<Scope, 'termOf'>): Result<ReadLine, CompileFault> {
  const ranked = rankRules(input);
  const attacks = readAttacks(ranked);
  if (!attacks.ok) return attacks;
  const names = namesOfTerms(input.layers, input.on);
  const terms = readTerms(names, scope);
  if (!terms.ok) return terms;
  const rules: ReadRule[] = [];
  for (const [rank, { rule, layer }] of ranked.entries()) {
    const reading = readCondition(rule.when, { ...scope, termOf: (id) => names.termOf(id, layer) });
    if (!reading.ok) return err({ ...reading.error, in: rule.id });
    const { on, disagree } = attacks.value;
    rules.push({ rule, layer, reading: reading.value, attackers: on[rank] ?? [], disagrees: disagree[rank] ?? [] });
  }
  return ok({ terms: terms.value, rules });
}

function testsOf({ terms, rules }: ReadLine): readonly OwnedTest[] {
  const own = (reading: Reading, owner: string): readonly OwnedTest[] => testsIn(reading).map((test) => ({ test, owner }));
  return [...terms.list.flatMap(({ reading, id }) => own(reading, id)), ...rules.flatMap(({ reading, rule }) => own(reading, rule.id))];
}

function testsIn(reading: Reading): readonly Test[] {
  switch (reading.kind) {
    case 'test':
      return [reading.test];
    case 'not':
      return testsIn(reading.part);
    case 'all':
    case 'any':
      return reading.parts.flatMap(testsIn);
    case 'always':
    case 'term':
      return [];
  }
}

/** Gates first, then terms after those they use, then rules from the highest rank down: attackers before their targets. */
function build({ terms, rules }: ReadLine, gates: readonly Gate[], shop: Workshop): Result<readonly BuiltRule[], CompileFault> {
  for (const { question, test, leaf } of gates) {
    shop.gates[question] = keep(compileCondition({ kind: 'test', test, leaf }, shop), shop);
  }
  for (const place of terms.inOrder) {
    const term = terms.list[place];
    if (term === undefined) continue;
    shop.terms[place] = keep(compileCondition(term.reading, shop), shop);
    if (shop.builder.store.overfull) return err({ kind: 'too-many-nodes', in: term.id });
  }
  const built: BuiltRule[] = [];
  for (const [fromTop, rule] of rules.toReversed().entries()) {
    const attackers = rule.attackers.flatMap((rank) => built[rules.length - 1 - rank] ?? []);
    const made = buildRule(rule, attackers, shop);
    if (!made.ok) return made;
    built[fromTop] = made.value;
  }
  return ok(built.toReversed());
}

type BuiltRule = CompiledRule & { readonly when: Part };

function buildRule(read: ReadRule, attackers: readonly CompiledRule[], shop: Workshop): Result<BuiltRule, CompileFault> {
  const { id, region } = read.rule;
  const when = compileCondition(read.reading, shop);
  const nodes = [when.node];
  for (const attacker of attackers) {
    shop.tape.load(attacker.slot);
    shop.tape.not();
    nodes.push(shop.builder.not(attacker.node));
  }
  shop.tape.join('all', nodes.length);
  const compiled = { node: shop.builder.all(nodes), slot: shop.tape.store(), when };
  if (shop.builder.store.overfull) return err({ kind: 'too-many-nodes', in: id });
  if (questionsOf(shop.builder.store, compiled.node).length > MOST_QUESTIONS) return err({ kind: 'too-many-questions', in: id });
  return ok({ ...compiled, id, region, attackers: read.attackers, disagrees: read.disagrees });
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
