import { NO, UNKNOWN, YES, type Tri } from '@/lib/kernel/tri';
import type { Condition } from '@/lib/regions/domain/condition';
import type { Part } from './compile-condition';
import { ExactStatus } from './exact-status';
import { exactOf } from './judge';
import type { Knowledge } from './knowledge';
import type { CompiledLine } from './line';

/** How a part of a condition came to its value, with only the branches that decide it. */
export type Trace =
  | { readonly kind: 'always'; readonly value: Tri }
  /** `gate`: how the question's own gate stands. Where it is shut, the test was never put and the gate alone decides. */
  | { readonly kind: 'leaf'; readonly value: Tri; readonly question: string; readonly leaf: Condition; readonly gate: Trace | null }
  /** `why` is null for a term that uses itself too far down to be told. */
  | { readonly kind: 'term'; readonly value: Tri; readonly id: string; readonly why: Trace | null }
  | { readonly kind: 'all' | 'any' | 'not'; readonly value: Tri; readonly parts: readonly Trace[] };

/** How a rule came to its status: its own condition and the rules that attack it, each only if it decides. */
export type RuleTrace = {
  readonly id: string;
  readonly value: Tri;
  readonly when: Trace | null;
  readonly attackers: readonly { readonly id: string; readonly value: Tri }[];
};

/** Terms and gates are told this many times inside each other. */
const DEEPEST = 8;

/** Traces every active rule of the line, in rank order. */
export function traceRules(line: CompiledLine, knowledge: Knowledge): readonly RuleTrace[] {
  const rules = exactOf(line, knowledge);
  const exact = new ExactStatus(line.wording.diagram);
  const statusOf = (part: Part): Tri => exact.of(part.node, knowledge.masks);
  return line.rules.map(({ id, attackers }, rank) => {
    const value = rules[rank] ?? UNKNOWN;
    const when = line.wording.rules[rank];
    const against = attackers.flatMap((at) => ({ id: line.rules[at]?.id ?? '', value: rules[at] ?? UNKNOWN }));
    if (when === undefined) return { id, value, when: null, attackers: against };
    const own = { kind: 'own', value: statusOf(when) } as const;
    const decide = deciding('all', value, [own, ...against.map((one) => ({ kind: 'attacker', value: opposite(one.value), one }) as const)]);
    return {
      id,
      value,
      when: decide.some(({ kind }) => kind === 'own')
        ? tracePart(when, { line, statusOf, depth: 0, isWhole: isTogether(value, decide) })
        : null,
      attackers: decide.flatMap((side) => (side.kind === 'attacker' ? side.one : [])),
    };
  });
}

const OPPOSITE: Readonly<Record<Tri, Tri>> = { 0: YES, 1: UNKNOWN, 2: NO };
const opposite = (value: Tri): Tri => OPPOSITE[value];

/**
 * The parts that make the whole what it is: one true part of an `any`, one false part of an `all`, every part of what holds by
 * all of them. While the whole is open, or decided only by open parts taken together, those open parts.
 */
function deciding<P extends { readonly value: Tri }>(kind: 'all' | 'any', value: Tri, parts: readonly P[]): readonly P[] {
  const alone = kind === 'any' ? YES : NO;
  if (value !== alone && value !== UNKNOWN) return parts;
  const first = value === alone ? parts.find((part) => part.value === alone) : undefined;
  return first === undefined ? parts.filter((part) => part.value === UNKNOWN) : [first];
}

/** Whether the whole is decided though the parts that decide it are open: none of them can then be told short. */
const isTogether = (value: Tri, parts: readonly { readonly value: Tri }[]): boolean =>
  value !== UNKNOWN && parts.some((part) => part.value === UNKNOWN);

type At = { readonly line: CompiledLine; readonly statusOf: (part: Part) => Tri; readonly depth: number; readonly isWhole: boolean };

function tracePart(part: Part, at: At): Trace {
  const value = at.statusOf(part);
  switch (part.kind) {
    case 'always':
      return { kind: 'always', value };
    case 'test':
      return { kind: 'leaf', value, question: at.line.questions[part.question] ?? '', leaf: part.leaf, gate: traceGate(part.question, at) };
    case 'term':
      return { kind: 'term', value, id: part.id, why: traceInside(at.line.wording.terms[part.term], at) };
    case 'not':
      return { kind: 'not', value, parts: part.parts.map((inner) => tracePart(inner, at)) };
    case 'all':
    case 'any': {
      const parts = part.parts.map((inner) => ({ inner, value: at.statusOf(inner) }));
      const decide = at.isWhole && value === UNKNOWN ? parts : deciding(part.kind, value, parts);
      const isWhole = at.isWhole || isTogether(value, decide);
      return { kind: part.kind, value, parts: decide.map(({ inner }) => tracePart(inner, { ...at, isWhole })) };
    }
  }
}

const traceGate = (question: number, at: At): Trace | null => traceInside(at.line.wording.gates.get(question), at);

const traceInside = (part: Part | null | undefined, at: At): Trace | null =>
  part === null || part === undefined || at.depth === DEEPEST ? null : tracePart(part, { ...at, depth: at.depth + 1 });
