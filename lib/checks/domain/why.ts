import type { LoadedLine } from './checklist';
import { cheapestFacts, type Fact } from './cheapest-fact';
import { knowledgeOf, type Answers } from './knowledge';
import { nearestOutcome, type NearestOutcome } from './nearest-outcome';
import { timelineOf, type TimelineInput, type TimelineStep } from './timeline';
import { traceRules, type RuleTrace } from './trace';

/** Why a rule stands as it does, and what would change it. */
export type Why = { readonly trace: RuleTrace; readonly nearest: NearestOutcome | null };

/** Why each line of a checklist stands as it does, by rule id. */
export function whysOf({ compiled }: LoadedLine, answers: Answers): ReadonlyMap<string, Why> {
  const knowledge = knowledgeOf(compiled, answers);
  return new Map(
    traceRules(compiled, knowledge).map((trace, rank) => [trace.id, { trace, nearest: nearestOutcome(compiled, rank, knowledge) }]),
  );
}

/** The open questions of some places by what one answer would settle among their duties. What is only said among potters is none. */
export function factsOver(lines: readonly LoadedLine[], answers: Answers): readonly Fact[] {
  return cheapestFacts(
    lines.map(({ compiled, layers }) => ({
      compiled,
      duties: layers.flatMap(({ sheet }) => sheet.rules.filter(isDuty).map(({ id }) => id)),
    })),
    answers,
  );
}

type SheetRule = LoadedLine['layers'][number]['sheet']['rules'][number];

const isDuty = ({ strength, standing }: SheetRule): boolean =>
  (strength === 'must' || strength === 'should') && standing !== 'common-practice';

/** What a list is explained with: the next facts, and for a place shown in full why each line stands and what is coming. */
export type Explanation = {
  readonly facts: readonly Fact[];
  readonly whys: ReadonlyMap<string, Why>;
  readonly timeline: readonly TimelineStep[];
};

type Judged = Omit<TimelineInput, 'loaded'> & { readonly lines: readonly LoadedLine[] };

/** Explains the list of one place, or of several side by side: `place` is the one shown in full, if any. */
export function explain({ lines, ...judged }: Judged, place: string | null): Explanation {
  const shown = lines.length === 1 ? lines[0] : lines.find(({ code }) => code === place);
  if (shown === undefined) return { facts: factsOver(lines, judged.answers), whys: new Map(), timeline: [] };
  return {
    facts: factsOver([shown], judged.answers),
    whys: whysOf(shown, judged.answers),
    timeline: timelineOf({ ...judged, loaded: shown }),
  };
}
