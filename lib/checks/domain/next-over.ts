import type { LoadedLine } from './checklist';
import type { Answers } from './knowledge';
import { nextQuestion, stillMatters } from './next-question';
import { QUESTIONS } from './questions';

export type NextQuestion = { readonly question: string; readonly regions: readonly string[] };

/** What still matters over several places, in the order of asking, and the first of it that can be asked now. */
export function nextOver(
  lines: readonly LoadedLine[],
  answers: Answers,
  declined: readonly string[],
): { readonly next: NextQuestion | null; readonly stillMatters: readonly string[] } {
  const open = lines.map(({ code, compiled }) => ({
    code,
    matters: stillMatters(compiled, answers, declined),
    next: nextQuestion(compiled, answers, declined),
  }));
  const first = QUESTIONS.find(({ id }) => open.some(({ next }) => next === id));
  return {
    next:
      first === undefined
        ? null
        : { question: first.id, regions: open.filter(({ matters }) => matters.includes(first.id)).map(({ code }) => code) },
    stillMatters: QUESTIONS.map(({ id }) => id).filter((id) => open.some(({ matters }) => matters.includes(id))),
  };
}
