import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Condition } from '@/lib/regions/domain/condition';
import type { Answers } from './knowledge';
import type { EngineRule, EngineTerm, Place } from './line-input';
import { compareMeaning } from './meaning';
import { QUESTIONS } from './questions';

export type SampleGround = {
  /** Words by the sheet that defines them, from general to local. */
  readonly layers: readonly { readonly region: string; readonly terms: readonly EngineTerm[] }[];
  readonly region: string;
  readonly on: CalendarDate;
  readonly places: readonly Place[];
};

/** Two pieces beside a condition: one it is true of, and one it is not. Null where there is none, or none with real answers. */
export type SamplePots = { readonly yes: Answers | null; readonly no: Answers | null };

const ID = 'sample';

/** Finds two pieces that show what a condition says, as few answers each as do. Null for a condition that cannot be read yet. */
export function samplePots(condition: Condition, ground: SampleGround): SamplePots | null {
  const yes = exampleBetween(false, condition, ground);
  const no = exampleBetween(true, condition, ground);
  return yes === undefined || no === undefined ? null : { yes, no };
}

/** A piece on which the two conditions differ; undefined where one of them cannot be read. */
function exampleBetween(before: Condition, after: Condition, { layers, region, on, places }: SampleGround): Answers | null | undefined {
  const line = (when: Condition) => ({
    questions: QUESTIONS,
    layers: layers.map((layer) => ({ ...layer, rules: layer.region === region ? [ruleOf(region, when)] : [] })),
    except: [],
    on,
    places,
  });
  const compared = compareMeaning({ before: line(before), after: line(after) });
  if (!compared.ok) return undefined;
  return compared.value.find(({ rule }) => rule === ID)?.example?.answers ?? null;
}

const ruleOf = (region: string, when: Condition): EngineRule => ({
  id: ID,
  region,
  kind: 'adds',
  targets: [],
  alongside: [],
  when,
  from: null,
  to: null,
  order: 1,
  firm: false,
});
