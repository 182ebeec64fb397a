import { knowledgeOf, type Answers } from './knowledge';
import type { CompiledLine } from './line';
import { Restriction } from './restriction';

/** A question still matters if, for some rule, two completions of the answers differ in it alone and give different outcomes. */
export function stillMatters(line: CompiledLine, answers: Answers, declined: readonly string[]): readonly string[] {
  return idsOf(line, mattering(line, restrict(line, answers), declined));
}

/**
 * The first question that still matters and may be asked: its own gate is open, or would be if the maker knew what was
 * declined. Null when nothing is left to ask.
 */
export function nextQuestion(line: CompiledLine, answers: Answers, declined: readonly string[]): string | null {
  const restriction = restrict(line, answers);
  const mayBeAsked = (question: number): boolean => {
    const gate = line.gates.get(question);
    return gate === undefined || without(line, restriction.questionsOpen(gate), declined).length === 0;
  };
  const next = mattering(line, restriction, declined).find(mayBeAsked);
  return next === undefined ? null : (line.questions[next] ?? null);
}

/**
 * What one rule still hangs on: first the questions that can be answered, then those that were declined, each in the order
 * of asking. Empty once the rule is settled, or if the line does not have it.
 */
export function questionsOpenFor(line: CompiledLine, answers: Answers, declined: readonly string[], ruleId: string): readonly string[] {
  const rule = line.rules.find(({ id }) => id === ruleId);
  if (rule === undefined) return [];
  const open = restrict(line, answers).questionsOpen(rule.node);
  const askable = without(line, open, declined);
  return idsOf(line, [...askable, ...open.filter((question) => !askable.includes(question))]);
}

const restrict = (line: CompiledLine, answers: Answers): Restriction =>
  new Restriction(line.diagram, line.variables, knowledgeOf(line, answers).masks);

const idsOf = (line: CompiledLine, questions: readonly number[]): readonly string[] =>
  questions.flatMap((question) => line.questions[question] ?? []);

const without = (line: CompiledLine, questions: readonly number[], declined: readonly string[]): readonly number[] =>
  questions.filter((question) => !declined.includes(line.questions[question] ?? ''));

/** An answer that leaves its question open, such as an amount in a currency no rule names, does not take it off the list. */
function mattering(line: CompiledLine, restriction: Restriction, declined: readonly string[]): readonly number[] {
  const open = new Set(line.rules.flatMap(({ node }) => restriction.questionsOpen(node)));
  return without(
    line,
    [...open].sort((a, b) => a - b),
    declined,
  );
}
