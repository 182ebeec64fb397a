import type { LoadedLine } from './checklist';
import type { AnswerValue, Answers } from './knowledge';
import { nextOver } from './next-over';
import { QUESTIONS, TOPICS, type Question, type Topic } from './questions';

/** One line of the review. `setAside`: said earlier, and nothing rests on it any more; kept all the same. */
export type ReviewRow =
  | { readonly question: Question; readonly kind: 'answered'; readonly value: AnswerValue; readonly setAside: boolean }
  | { readonly question: Question; readonly kind: 'not-known' };

export type Review = {
  readonly notKnown: readonly ReviewRow[];
  readonly topics: readonly { readonly topic: Topic; readonly rows: readonly ReviewRow[] }[];
};

const LIST: readonly Question[] = QUESTIONS;

/** Everything said of a piece, unknowns first, the rest by topic. */
export function reviewOf(lines: readonly LoadedLine[], answers: Answers, declined: readonly string[]): Review {
  const rows = LIST.flatMap((question) => rowOf(question, lines, answers, declined));
  const answered = rows.filter(({ kind }) => kind === 'answered');
  return {
    notKnown: rows.filter(({ kind }) => kind === 'not-known'),
    topics: TOPICS.map((topic) => ({ topic, rows: answered.filter(({ question }) => question.topic === topic) })).filter(
      ({ rows: own }) => own.length > 0,
    ),
  };
}

function rowOf(question: Question, lines: readonly LoadedLine[], answers: Answers, declined: readonly string[]): readonly ReviewRow[] {
  const value = answers[question.id];
  if (value === undefined) return declined.includes(question.id) ? [{ question, kind: 'not-known' }] : [];
  return [{ question, kind: 'answered', value, setAside: !restsOn(question.id, lines, answers, declined) }];
}

/** Whether some rule would be open again without this answer. */
function restsOn(id: string, lines: readonly LoadedLine[], answers: Answers, declined: readonly string[]): boolean {
  const without = Object.fromEntries(Object.entries(answers).filter(([key]) => key !== id));
  return nextOver(
    lines,
    without,
    declined.filter((one) => one !== id),
  ).stillMatters.includes(id);
}

/** How far a topic is: all said, being asked, or still to come. */
export type TopicProgress = { readonly topic: Topic; readonly state: 'done' | 'now' | 'later' };

export function progressOf(now: Topic | null, said: readonly string[], matters: readonly string[]): readonly TopicProgress[] {
  return TOPICS.flatMap((topic): TopicProgress[] => {
    const own = LIST.filter((question) => question.topic === topic).map(({ id }) => id);
    if (topic === now) return [{ topic, state: 'now' }];
    if (own.some((id) => matters.includes(id))) return [{ topic, state: 'later' }];
    return own.some((id) => said.includes(id)) ? [{ topic, state: 'done' }] : [];
  });
}
