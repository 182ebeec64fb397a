import { canonicalJson } from '@/lib/kernel/canonical-json';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Result } from '@/lib/kernel/result';
import { regionLine, type Memberships, type RegionLine } from '@/lib/regions/domain/line';
import type { Rule, Term } from '@/lib/regions/domain/rule';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { compileLine, type CompiledLine } from './line';
import type { CompileFault, LineInput, Place } from './line-input';
import type { Question } from './questions';

/** A proposed sheet and all it is judged by. */
export type Proposal = {
  readonly proposed: Sheet;
  /** The edition it is based on; null for a place that has no sheet yet. */
  readonly base: Sheet | null;
  /** Every sheet in use, by code; of the proposed place that in use, if any. */
  readonly sheets: ReadonlyMap<string, Sheet>;
  /** Memberships in use of all places, those without a sheet too. */
  readonly memberships: Memberships;
  readonly on: CalendarDate;
  readonly questions: readonly Question[];
};

/** The sheets of all places and how they hang together, before or after the proposal. */
export type World = Pick<Proposal, 'sheets' | 'memberships' | 'questions'>;

export const worldBefore = ({ proposed, base, sheets, memberships, questions }: Proposal): World => ({
  sheets: new Map([...sheets].flatMap(([code, sheet]) => (code !== proposed.code ? [[code, sheet]] : base === null ? [] : [[code, base]]))),
  memberships: base === null ? memberships : new Map([...memberships, [proposed.code, base.memberships]]),
  questions,
});

export const worldAfter = ({ proposed, sheets, memberships, questions }: Proposal): World => ({
  sheets: new Map([...sheets, [proposed.code, proposed]]),
  memberships: new Map([...memberships, [proposed.code, proposed.memberships]]),
  questions,
});

type CompiledLines = {
  readonly input: (code: string, on: CalendarDate) => LineInput;
  readonly compiled: (code: string, on: CalendarDate) => Result<CompiledLine, CompileFault>;
};

/** The codes of a place's layers on a day, general to local, the base layer first. */
export function layersOf({ sheets, memberships }: World, code: string, on: CalendarDate): readonly string[] {
  const base = [...sheets.values()].filter(({ kind }) => kind === 'base').map(({ code: layer }) => layer);
  return [...new Set([...base, ...regionLine(memberships, code, on).layers])];
}

/** The lines of a world, each compiled once. */
export function linesOf(world: World): CompiledLines {
  const compiled = new Map<string, Result<CompiledLine, CompileFault>>();
  const placesOn = new Map<CalendarDate, readonly Place[]>();
  const input = (code: string, on: CalendarDate): LineInput => {
    const places = placesOn.get(on) ?? placesIn(world, on);
    placesOn.set(on, places);
    return inputOf(world, { code, on, places });
  };
  return {
    input,
    compiled: (code, on) => {
      const key = `${code} ${on}`;
      const line = compiled.get(key) ?? compileLine(input(code, on));
      compiled.set(key, line);
      return line;
    },
  };
}

type Wanted = { readonly code: string; readonly on: CalendarDate; readonly places: readonly Place[] };

function inputOf(world: World, { code, on, places }: Wanted): LineInput {
  const layers = layersOf(world, code, on).flatMap((layer) => world.sheets.get(layer) ?? []);
  const line: RegionLine = regionLine(world.memberships, code, on);
  return {
    questions: world.questions,
    layers: layers.map((sheet) => ({ region: sheet.code, rules: sheet.rules, terms: sheet.terms })),
    except: line.except.map(({ rule }) => rule),
    on,
    places,
  };
}

/** Places that are part of another on that day. */
function placesIn({ memberships }: World, on: CalendarDate): readonly Place[] {
  return [...memberships.keys()].flatMap((code) => {
    const { layers } = regionLine(memberships, code, on);
    return layers.length > 1 ? [{ code, line: layers }] : [];
  });
}

type Dated = { readonly from: CalendarDate | null; readonly to: CalendarDate | null };

const endsOf = (dated: readonly Dated[], on: CalendarDate): readonly CalendarDate[] =>
  dated.flatMap(({ from, to }) => [from, to]).flatMap((day) => (day !== null && on < day ? day : []));

const sorted = (days: readonly CalendarDate[]): readonly CalendarDate[] => [...new Set(days)].sort();

/** The day itself and every later one on which something of the place's own line begins or ends: between them nothing changes. */
export function daysToCheck(proposal: Proposal): readonly CalendarDate[] {
  const { proposed, on } = proposal;
  const world = worldAfter(proposal);
  const sheets = layersOf(world, proposed.code, on).flatMap((code) => world.sheets.get(code) ?? []);
  const dated = [proposed, ...sheets].flatMap(({ rules, terms, memberships }): readonly Dated[] => [...rules, ...terms, ...memberships]);
  return sorted([on, ...endsOf(dated, on)]);
}

/** The day itself and the later ones on which something that the proposal changes begins or ends. */
export function daysOfChange(proposal: Proposal): readonly CalendarDate[] {
  return sorted([proposal.on, ...endsOf(changedItems(proposal), proposal.on)]);
}

/** Whether a rule, a term or a membership is otherwise than in the edition before. */
export const isChanged = (proposal: Proposal): boolean => changedItems(proposal).length > 0;

type Item = Rule | Term | Sheet['memberships'][number];

function changedItems({ proposed, base }: Proposal): readonly Item[] {
  const textsOf = (sheet: Sheet | null): ReadonlyMap<string, Item> =>
    new Map(sheet === null ? [] : itemsOf(sheet).map((item) => [canonicalJson(item), item]));
  const [old, now] = [textsOf(base), textsOf(proposed)];
  const missingIn = (other: ReadonlyMap<string, Item>, own: ReadonlyMap<string, Item>): readonly Item[] =>
    [...own].flatMap(([text, item]) => (other.has(text) ? [] : [item]));
  return [...missingIn(old, now), ...missingIn(now, old)];
}

const itemsOf = ({ rules, terms, memberships }: Sheet): readonly Item[] => [...rules, ...terms, ...memberships];

/** Places with a sheet whose line holds the proposed one on one of the days, before or after, itself left out. */
export function regionsBelow(proposal: Proposal, days: readonly CalendarDate[]): readonly string[] {
  const worlds = [worldBefore(proposal), worldAfter(proposal)];
  const own = proposal.proposed.code;
  return [...proposal.sheets.values()]
    .filter(({ code, kind }) => code !== own && kind !== 'base')
    .map(({ code }) => code)
    .filter((code) => days.some((on) => worlds.some((world) => layersOf(world, code, on).includes(own))))
    .sort();
}
