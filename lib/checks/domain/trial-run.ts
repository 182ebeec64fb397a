import { NO, UNKNOWN, YES } from '@/lib/kernel/tri';
import type { Trial, TrialStatus } from '@/lib/regions/domain/trial';
import { ExactStatus } from './exact-status';
import { knowledgeOf, type AnswerValue, type Answers, type Knowledge } from './knowledge';
import type { CompiledLine, CompiledRule } from './line';
import type { Question } from './questions';
import { Restriction } from './restriction';
import { typedAnswer } from './typed-answer';

/** What is otherwise than a trial piece says. */
export type TrialDifference =
  | { readonly kind: 'otherwise'; readonly rule: string; readonly expected: TrialStatus; readonly found: TrialStatus }
  /** No rule of this id is active in the line on that day. */
  | { readonly kind: 'no-such-rule'; readonly rule: string; readonly expected: TrialStatus }
  | { readonly kind: 'unknown-question' | 'wrong-answer' | 'answered-and-declined'; readonly question: string };

/**
 * Judges a trial piece and tells every line that came out otherwise than expected, in the order of the expectations. A piece
 * whose answers make no sense is not judged. `line` is compiled for the trial's day, over `questions`.
 */
export function runTrial(line: CompiledLine, trial: Trial, questions: readonly Question[]): readonly TrialDifference[] {
  const { faults, answers } = readAnswers(trial, questions);
  if (faults.length > 0) return faults;
  const statusOf = statusReader(line, answers, trial.declined);
  const ranks = new Map(line.rules.map(({ id }, rank) => [id, rank]));
  return Object.entries(trial.expected).flatMap(([rule, expected]): readonly TrialDifference[] => {
    const compiled = line.rules[ranks.get(rule) ?? -1];
    if (compiled === undefined) return [{ kind: 'no-such-rule', rule, expected }];
    const found = statusOf(compiled);
    return found === expected ? [] : [{ kind: 'otherwise', rule, expected, found }];
  });
}

/** What every trial piece gives in a line, whatever is expected of it: by rule id. Null where its answers make no sense. */
export function statusesOfTrial(
  line: CompiledLine,
  trial: Trial,
  questions: readonly Question[],
): Readonly<Record<string, TrialStatus>> | null {
  const { faults, answers } = readAnswers(trial, questions);
  if (faults.length > 0) return null;
  const statusOf = statusReader(line, answers, trial.declined);
  const wanted = line.rules.filter(({ id }) => Object.hasOwn(trial.expected, id));
  return Object.fromEntries(wanted.map((rule) => [rule.id, statusOf(rule)]));
}

type ReadAnswers = { readonly faults: readonly TrialDifference[]; readonly answers: Answers };

function readAnswers({ answers, declined }: Trial, questions: readonly Question[]): ReadAnswers {
  const known = new Map(questions.map((question) => [question.id, question]));
  const faults: TrialDifference[] = [];
  const read: [string, AnswerValue][] = [];
  for (const [id, value] of Object.entries(answers)) {
    const question = known.get(id);
    const answer = question === undefined ? null : typedAnswer(question, value);
    if (answer !== null) read.push([id, answer]);
    else faults.push({ kind: question === undefined ? 'unknown-question' : 'wrong-answer', question: id });
  }
  for (const id of declined) {
    if (!known.has(id)) faults.push({ kind: 'unknown-question', question: id });
    else if (Object.hasOwn(answers, id)) faults.push({ kind: 'answered-and-declined', question: id });
  }
  return { faults, answers: Object.fromEntries(read) };
}

/** The status of single rules, as `judge` gives it for all of them together with the reasons that nobody asks for here. */
function statusReader(line: CompiledLine, answers: Answers, declined: readonly string[]): (rule: CompiledRule) => TrialStatus {
  const knowledge: Knowledge = knowledgeOf(line, answers);
  const exact = new ExactStatus(line.diagram);
  const passed = new Set(declined);
  let restriction: Restriction | null = null;
  const restsOnDeclined = (node: number): boolean => {
    restriction ??= new Restriction(line.diagram, line.variables, knowledge.masks);
    return restriction.questionsOpen(node).every((place) => passed.has(line.questions[place] ?? ''));
  };
  const isEffective = (rank: number): boolean => exact.of(line.rules[rank]?.node ?? 0, knowledge.masks) === YES;
  return ({ node, disagrees }) => {
    const status = exact.of(node, knowledge.masks);
    if (status === NO) return 'does-not-apply';
    if (status === UNKNOWN) return restsOnDeclined(node) ? 'treat-as-applying' : 'not-settled';
    return disagrees.some(isEffective) ? 'sources-disagree' : 'applies';
  };
}
