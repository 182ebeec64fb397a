import 'server-only';
import type { Check } from '@/db/rows/check-row';
import { ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { currenciesOf } from './domain/currencies';
import { readEntry, type EntryFault, type Fields } from './domain/entry';
import { fieldsOfSaid } from './domain/fields-of-said';
import type { CheckId } from './domain/ids';
import { stillMatters } from './domain/next-question';
import { progressOf, type TopicProgress } from './domain/review';
import { QUESTIONS, type Question } from './domain/questions';
import { shownOn, suggestedBy } from './domain/steps';
import { readCheck, type OpenCheck } from './read-check';

/** A page of questions of a check as it is to be shown. */
export type ReadQuestionPage = {
  readonly open: OpenCheck;
  readonly questions: readonly Question[];
  readonly fields: Fields;
  readonly faults: readonly EntryFault[];
  /** Questions whose field is filled in from the form, not by the maker. */
  readonly suggested: readonly string[];
  /** Questions whose field is filled in from the note the check was begun from. */
  readonly fromNote: readonly string[];
  /** No rule turns on any of these questions now. */
  readonly settled: boolean;
  /** Codes of the places for which the question asked matters. */
  readonly matters: readonly string[];
  readonly currencies: Readonly<Record<string, readonly string[]>>;
  readonly progress: readonly TopicProgress[];
  /** The question answered before this page, to go back to. */
  readonly before: string | null;
};

const LIST: readonly Question[] = QUESTIONS;

/** The page that asks a question; with `look`, the last refused entry of that page in place of what was said. */
export async function readQuestionPage(
  ctx: Ctx,
  input: { readonly id: CheckId; readonly question: Question; readonly look: boolean },
): Promise<Result<ReadQuestionPage, { kind: 'not-found' }>> {
  const open = await readCheck(ctx, input.id);
  if (!open.ok) return open;
  const { check, lines } = open.value;
  const said = [...Object.keys(check.answers), ...check.declined];
  const questions = shownOn(input.question.id, open.value.stillMatters, said);
  const matters = placesAsking(open.value, input.question.id);
  return ok({
    open: open.value,
    questions,
    ...entryOf(check, questions, input),
    settled: matters.length === 0,
    matters,
    currencies: Object.fromEntries(questions.filter(({ kind }) => kind === 'money').map(({ id }) => [id, currenciesOf(lines, id)])),
    progress: progressOf(input.question.topic, said, open.value.stillMatters),
    before: questionBefore(input.question, questions, said),
  });
}

/** What stands in the fields: a refused entry with its faults, or what was said, or what the form suggests. */
function entryOf(
  check: Check,
  questions: readonly Question[],
  { question, look }: { readonly question: Question; readonly look: boolean },
): Pick<ReadQuestionPage, 'fields' | 'faults' | 'suggested' | 'fromNote'> {
  if (look && check.entry?.question === question.id) {
    const read = readEntry(
      questions.map(({ id }) => id),
      check.entry.fields,
    );
    return { fields: check.entry.fields, faults: read.ok ? [] : read.error, suggested: [], fromNote: [] };
  }
  const open = questions.filter(({ id }) => !(id in check.answers) && !check.declined.includes(id));
  const noted = open.filter(({ id }) => id in check.fromNote);
  const suggested = suggestionsFor(
    open.filter((one) => !noted.includes(one)),
    check,
  );
  return {
    fields: { ...suggested, ...fieldsOfSaid(noted, check.fromNote, []), ...fieldsOfSaid(questions, check.answers, check.declined) },
    faults: [],
    suggested: Object.keys(suggested),
    fromNote: noted.map(({ id }) => id),
  };
}

/** The places in which some rule turns on this question, whatever was answered to it before. */
function placesAsking({ check, lines }: OpenCheck, asked: string): readonly string[] {
  const answers = Object.fromEntries(Object.entries(check.answers).filter(([id]) => id !== asked));
  const declined = check.declined.filter((id) => id !== asked);
  return lines.filter(({ compiled }) => stillMatters(compiled, answers, declined).includes(asked)).map(({ code }) => code);
}

function questionBefore(asked: Question, shown: readonly Question[], said: readonly string[]): string | null {
  const earlier = LIST.slice(0, LIST.indexOf(asked)).filter((question) => said.includes(question.id) && !shown.includes(question));
  return earlier.at(-1)?.id ?? null;
}

function suggestionsFor(open: readonly Question[], { answers }: Check): Fields {
  return Object.fromEntries(
    open.flatMap(({ id }): readonly (readonly [string, readonly string[]])[] => {
      const suggestion = suggestedBy(answers['form'], id);
      return suggestion === null ? [] : [[id, [suggestion ? 'yes' : 'no']]];
    }),
  );
}
