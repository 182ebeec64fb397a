import { NO, UNKNOWN, YES, type Tri } from '@/lib/kernel/tri';
import { ExactStatus } from './exact-status';
import { knowledgeOf, type AnswerValue, type Answers, type Knowledge } from './knowledge';
import type { CompiledLine, CompiledRule } from './line';
import { smallestReason } from './reason';
import { Restriction } from './restriction';
import { runTape } from './tape';

export type Status = 'applies' | 'does-not-apply' | 'not-settled' | 'treat-as-applying' | 'sources-disagree';

export type Outcome = {
  readonly id: string;
  readonly region: string;
  readonly status: Status;
  /** Yes or no if every completion of the answers says so. */
  readonly exact: Tri;
  /** The rules attacking it that apply, in rank order. */
  readonly silencedBy: readonly string[];
  /** A smallest set of answers that settles it; empty while it is not settled. */
  readonly because: readonly { readonly question: string; readonly answer: AnswerValue }[];
};

/** Kleene value of every active rule, in rank order: by the tables alone, never wrong where definite. */
export function kleeneOf(line: CompiledLine, { masks }: Knowledge): readonly Tri[] {
  const slots = runTape(line.tape, masks);
  return line.rules.map(({ slot }) => triOf(slots[slot] ?? UNKNOWN));
}

/** Exact status of every active rule, in rank order. */
export function exactOf(line: CompiledLine, { masks }: Knowledge): readonly Tri[] {
  const exact = new ExactStatus(line.diagram);
  return line.rules.map(({ node }) => exact.of(node, masks));
}

const triOf = (value: number): Tri => {
  if (value === NO) return NO;
  return value === YES ? YES : UNKNOWN;
};

/** Judges every active rule of the line, in rank order. */
export function judge(line: CompiledLine, answers: Answers, declined: readonly string[]): readonly Outcome[] {
  const knowledge = knowledgeOf(line, answers);
  const statuses = exactOf(line, knowledge);
  const restriction = new Restriction(line.diagram, line.variables, knowledge.masks);
  const passed = new Set(declined);
  const exact = new ExactStatus(line.diagram);
  const effective = (rank: number): boolean => statuses[rank] === YES;
  const statusOf = (rule: CompiledRule, status: Tri): Status => {
    if (status === NO) return 'does-not-apply';
    if (status === YES) return rule.disagrees.some(effective) ? 'sources-disagree' : 'applies';
    const open = restriction.questionsOpen(rule.node);
    return open.some((question) => !passed.has(line.questions[question] ?? '')) ? 'not-settled' : 'treat-as-applying';
  };
  return line.rules.map((rule, rank) => {
    const status = statuses[rank] ?? UNKNOWN;
    return {
      id: rule.id,
      region: rule.region,
      status: statusOf(rule, status),
      exact: status,
      silencedBy: rule.attackers.filter(effective).flatMap((attacker) => line.rules[attacker]?.id ?? []),
      because: status === UNKNOWN ? [] : answered(line, answers, smallestReason(line, rule.node, knowledge, exact)),
    };
  });
}

function answered(line: CompiledLine, answers: Answers, questions: readonly number[]): Outcome['because'] {
  return questions.flatMap((place) => {
    const question = line.questions[place];
    const answer = question === undefined ? undefined : answers[question];
    return question === undefined || answer === undefined ? [] : [{ question, answer }];
  });
}

/** Exact status of a term; not known for a term the line does not have. */
export function statusOfTerm(line: CompiledLine, answers: Answers, term: string): Tri {
  const node = line.terms.get(term);
  if (node === undefined) return UNKNOWN;
  const exact = new ExactStatus(line.diagram);
  return exact.of(node, knowledgeOf(line, answers).masks);
}
