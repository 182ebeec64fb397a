import { LogicEngine } from 'json-logic-engine';
import type { Plain, PlainComparison, PlainFacts, PlainRule } from './plain-rules';

const OPERATORS: Readonly<Record<PlainComparison, string>> = { lt: '<', le: '<=', gt: '>', ge: '>=' };

function logicOf(plain: Plain): unknown {
  if (typeof plain === 'boolean') return plain;
  if ('all' in plain) return { and: plain.all.map(logicOf) };
  if ('any' in plain) return { or: plain.any.map(logicOf) };
  return 'not' in plain ? { '!': [logicOf(plain.not)] } : testOf(plain);
}

function testOf(plain: Extract<Plain, { readonly fact: string }>): unknown {
  const fact = { var: plain.fact };
  if ('is' in plain) return { '===': [fact, plain.is] };
  return 'in' in plain ? { in: [fact, plain.in] } : { [OPERATORS[plain.by]]: [fact, plain.at] };
}

/** Whether each rule applies, 0 or 2; this library leaves nothing open. */
export type Judging = (facts: PlainFacts) => readonly number[];

/** Every rule as a function that json-logic-engine compiled. */
export function compiledLogic(rules: readonly PlainRule[]): Judging {
  const engine = new LogicEngine();
  const built = rules.map(({ when }) => engine.build(logicOf(when)) as (facts: PlainFacts) => unknown);
  return (facts) => built.map((run) => (run(facts) === true ? 2 : 0));
}

/** The same rules read anew each time. */
export function interpretedLogic(rules: readonly PlainRule[]): Judging {
  const engine = new LogicEngine();
  const logic = rules.map(({ when }) => logicOf(when));
  return (facts) => logic.map((rule) => (engine.run(rule, facts) === true ? 2 : 0));
}
