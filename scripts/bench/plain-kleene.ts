import type { Plain, PlainComparison, PlainFacts } from './plain-rules';

/** A condition as a function of facts: 0 for no, 1 for open, 2 for yes. The simplest way to read the tables of Kleene. */
export type Reading = (facts: PlainFacts) => number;

const COMPARE: Readonly<Record<PlainComparison, (value: number, at: number) => boolean>> = {
  lt: (value, at) => value < at,
  le: (value, at) => value <= at,
  gt: (value, at) => value > at,
  ge: (value, at) => value >= at,
};

/** The condition as nested functions. */
export function readPlain(plain: Plain): Reading {
  if (typeof plain === 'boolean') return () => (plain ? 2 : 0);
  if ('all' in plain) {
    const parts = plain.all.map(readPlain);
    return (facts) => Math.min(2, ...parts.map((part) => part(facts)));
  }
  if ('any' in plain) {
    const parts = plain.any.map(readPlain);
    return (facts) => Math.max(0, ...parts.map((part) => part(facts)));
  }
  if ('not' in plain) {
    const part = readPlain(plain.not);
    return (facts) => 2 - part(facts);
  }
  const holds = testOf(plain);
  return (facts) => {
    const fact = facts[plain.fact];
    return fact === undefined ? 1 : holds(fact) ? 2 : 0;
  };
}

function testOf(leaf: Extract<Plain, { readonly fact: string }>): (fact: boolean | string | number) => boolean {
  if ('is' in leaf) return (fact) => fact === leaf.is;
  if ('in' in leaf) return (fact) => leaf.in.includes(String(fact));
  const compare = COMPARE[leaf.by];
  return (fact) => compare(Number(fact), leaf.at);
}
