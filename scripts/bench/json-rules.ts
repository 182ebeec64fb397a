import { Engine, type ConditionProperties, type NestedCondition } from 'json-rules-engine';
import type { Plain, PlainComparison, PlainFacts, PlainRule } from './plain-rules';

const OPERATORS: Readonly<Record<PlainComparison, string>> = {
  lt: 'lessThan',
  le: 'lessThanInclusive',
  gt: 'greaterThan',
  ge: 'greaterThanInclusive',
};

function conditionOf(plain: Plain): NestedCondition {
  if (typeof plain === 'boolean') return plain ? { all: [] } : { not: { all: [] } };
  if ('all' in plain) return { all: plain.all.map(conditionOf) };
  if ('any' in plain) return { any: plain.any.map(conditionOf) };
  return 'not' in plain ? { not: conditionOf(plain.not) } : testOf(plain);
}

function testOf(leaf: Extract<Plain, { readonly fact: string }>): ConditionProperties {
  const { fact } = leaf;
  if ('is' in leaf) return { fact, operator: 'equal', value: leaf.is };
  return 'in' in leaf ? { fact, operator: 'in', value: leaf.in } : { fact, operator: OPERATORS[leaf.by], value: leaf.at };
}

/** Every rule in one engine of json-rules-engine, for which a fact that is missing is one that is undefined. */
export function rulesEngine(rules: readonly PlainRule[]): (facts: PlainFacts) => Promise<readonly number[]> {
  const engine = new Engine([], { allowUndefinedFacts: true });
  for (const [at, { when }] of rules.entries()) {
    engine.addRule({ name: String(at), conditions: { all: [conditionOf(when)] }, event: { type: String(at) } });
  }
  return async (facts) => {
    const { events } = await engine.run(facts);
    const values = rules.map(() => 0);
    for (const { type } of events) values[Number(type)] = 2;
    return values;
  };
}
