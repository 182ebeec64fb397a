import Engine, { type RawPublicodes } from 'publicodes';
import type { Plain, PlainComparison, PlainFacts, PlainRule } from './plain-rules';

const OPERATORS: Readonly<Record<PlainComparison, string>> = { lt: '<', le: '<=', gt: '>', ge: '>=' };
const quoted = (value: boolean | string | number): string | number => {
  if (typeof value === 'number') return value;
  return typeof value === 'string' ? `'${value}'` : value ? 'oui' : 'non';
};
const SILENT = { log: () => undefined, warn: () => undefined, error: () => undefined };

/** Names of facts as publicodes can read them. */
class Names {
  private readonly names = new Map<string, string>();

  of(fact: string): string {
    const name = this.names.get(fact) ?? `fait ${'abcdefghijklmnopqrstuvwxyz'[this.names.size % 26] ?? ''}${this.names.size}`;
    this.names.set(fact, name);
    return name;
  }

  known(fact: string): string | undefined {
    return this.names.get(fact);
  }

  all(): readonly string[] {
    return [...this.names.values()];
  }
}

function expressionOf(plain: Plain, names: Names): unknown {
  if (typeof plain === 'boolean') return quoted(plain);
  if ('all' in plain) return { 'toutes ces conditions': plain.all.map((part) => expressionOf(part, names)) };
  if ('any' in plain) return { 'une de ces conditions': plain.any.map((part) => expressionOf(part, names)) };
  if ('not' in plain) return { '=': [expressionOf(plain.not, names), 'non'] };
  const fact = names.of(plain.fact);
  if ('is' in plain) return { '=': [fact, quoted(plain.is)] };
  if ('in' in plain) return { 'une de ces conditions': plain.in.map((option) => ({ '=': [fact, quoted(option)] })) };
  return { [OPERATORS[plain.by]]: [fact, plain.at] };
}

/** Every rule as one of publicodes, which leaves open what the facts leave open. */
export function publicodesRules(rules: readonly PlainRule[]): (facts: PlainFacts) => readonly number[] {
  const names = new Names();
  const written = rules.map(({ when }, at) => [`rule ${at}`, expressionOf(when, names)] as const);
  const asked = names.all().map((name) => [name, { question: name }] as const);
  const engine = new Engine(Object.fromEntries([...asked, ...written]) as RawPublicodes<string>, { logger: SILENT });
  return (facts) => {
    const situation = Object.entries(facts).flatMap(([fact, value]): (readonly [string, string | number])[] => {
      const name = names.known(fact);
      return name === undefined ? [] : [[name, quoted(value)]];
    });
    engine.setSituation(Object.fromEntries(situation));
    return written.map(([name]) => {
      const { nodeValue } = engine.evaluate(name);
      return nodeValue === undefined ? 1 : nodeValue === true ? 2 : 0;
    });
  };
}
