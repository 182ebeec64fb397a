import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Rule, Term } from '@/lib/regions/domain/rule';
import type { Question } from './questions';

export type EngineRule = Pick<Rule, 'id' | 'region' | 'kind' | 'targets' | 'alongside' | 'when' | 'from' | 'to' | 'order' | 'firm'>;
export type EngineTerm = Pick<Term, 'id' | 'region' | 'when' | 'from' | 'to'>;

/** A place someone may name in an answer, with its line from general to local, itself included. */
export type Place = { readonly code: string; readonly line: readonly string[] };

export type Layer = { readonly region: string; readonly rules: readonly EngineRule[]; readonly terms: readonly EngineTerm[] };

export type LineInput = {
  readonly questions: readonly Question[];
  /** From general to local, `care` first. */
  readonly layers: readonly Layer[];
  /** Ids of rules that are not active in this line. */
  readonly except: readonly string[];
  readonly on: CalendarDate;
  readonly places: readonly Place[];
};

/** Why a line cannot be compiled. `in` is the rule, term or gated question at fault; `about` the question, term or rule it stumbles over. */
export type CompileFault = {
  readonly kind:
    | 'unknown-question'
    | 'unknown-term'
    | 'term-cycle'
    | 'bad-test'
    | 'too-many-cells'
    | 'too-many-questions'
    | 'too-many-nodes'
    | 'attack-not-downwards'
    | 'attack-on-firm';
  readonly in: string;
  readonly about?: string;
};

/** Cells of one question: they must fit the bits of one machine word. */
export const MOST_CELLS = 30;
/** Questions one rule may rest on, its attackers' questions included. */
export const MOST_QUESTIONS = 14;
/** Nodes of one line's diagrams. */
export const MOST_NODES = 50_000;
/** Levels of a condition. Sheets allow far fewer; this only bounds the recursion. */
export const MOST_LEVELS = 24;
