import { err, ok, type Result } from '@/lib/kernel/result';
import { rankRules, readAttacks, type RankedRule } from './attacks';
import type { OwnedTest } from './cells';
import { compileCondition, keep, type Compiled, type Part, type Workshop } from './compile-condition';
import { readCondition, type Reading, type Scope, type Test } from './condition-reading';
import { questionsOf } from './diagram';
import { readGates, type Gate } from './gates';
import { MOST_QUESTIONS, type CompileFault, type LineInput } from './line-input';
import { namesOfTerms, readTerms, type Terms } from './terms';

/** A rule as compiled: `node` and `slot` hold when it is effective, that is, when it applies and no attacker is effective. */
export type CompiledRule = Omit<Compiled, 'part'> & {
  readonly id: string;
  readonly region: string;
  /** Positions in rank order: the rules that attack it, and those that stand beside it in disagreement. */
  readonly attackers: readonly number[];
  readonly disagrees: readonly number[];
};

/** A compiled rule with its own condition, whoever attacks it. */
export type BuiltRule = CompiledRule & { readonly when: Part };

/** An active rule with every name in it looked up. */
type ReadRule = RankedRule & Pick<CompiledRule, 'attackers' | 'disagrees'> & { readonly reading: Reading };

/** A line with every name in it looked up, before anything is cut or built. */
export type ReadLine = {
  readonly terms: Terms;
  readonly rules: readonly ReadRule[];
  readonly gates: readonly Gate[];
  /** Every test that stands in it, those of gates first. */
  readonly tests: readonly OwnedTest[];
};

/** Looks up every name in the rules of a line that are active on its day, or says which rule, term or gate is at fault. */
export function readLine(input: LineInput): Result<ReadLine, CompileFault> {
  const scope = { questions: input.questions, placeOf: new Map(input.questions.map(({ id }, place) => [id, place])) };
  const written = readWritten(input, scope);
  if (!written.ok) return written;
  const own = testsOf(written.value);
  const gates = readGates(own, scope);
  return gates.ok ? ok({ ...written.value, gates: gates.value, tests: [...gates.value, ...own] }) : gates;
}

type Written = Pick<ReadLine, 'terms' | 'rules'>;

function readWritten(input: LineInput, scope: Omit<Scope, 'termOf'>): Result<Written, CompileFault> {
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

function testsOf({ terms, rules }: Written): readonly OwnedTest[] {
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

/**
 * Builds the diagrams of a line in rank order: gates first, then terms after those they use, then rules from the highest rank
 * down, attackers before their targets. Lines built with one builder share its nodes.
 */
export function buildLine({ terms, rules, gates }: ReadLine, shop: Workshop): Result<readonly BuiltRule[], CompileFault> {
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
