import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Money } from '@/lib/kernel/quantity';
import type { Condition } from './condition';

export type Standing = 'law' | 'guidance' | 'standard' | 'lab' | 'common-practice';
export type Strength = 'must' | 'should' | 'may' | 'note';
export type Evidence = 'read' | 'memory';

/** A text a claim rests on. `id` is its key within the sheet. */
export type Source = {
  readonly id: string;
  readonly title: string;
  readonly publisher: string;
  readonly identifier?: string;
  readonly url?: string;
  readonly versionDate?: string;
  readonly seenOn?: CalendarDate;
  /** Where the text was read when that was a copy and not `url`. */
  readonly seenVia?: string;
  /** The page as it was seen, kept: the hash of its bytes, its kind and size. */
  readonly fingerprint?: Fingerprint;
};

/** A kept file by its content: SHA-256 in lower-case hex, media type, size in bytes. */
export type Fingerprint = { readonly sha256: string; readonly type: string; readonly bytes: number };

/** One use of a source: the place in it, what standing it has for this claim, and whether it was read or is from memory. */
export type Citation = {
  readonly source: string;
  readonly locator?: string;
  readonly passage?: string;
  readonly passageLang?: string;
  readonly standing: Standing;
  readonly evidence: Evidence;
};

export type Decision = {
  readonly kind: 'each' | 'mean-of' | 'first-then-three';
  readonly specimens: number;
  readonly evidence: Evidence;
  /** Where a figure exactly on the limit falls. */
  readonly atLimit: 'within' | 'over' | 'unclear';
};

export type LimitPayload = {
  readonly topic: 'limit';
  /** Symbol of the element, "Pb". */
  readonly substance: string;
  readonly part: 'inside' | 'rim' | 'article' | 'glaze' | 'metal-part';
  readonly per: 'L' | 'dm2' | 'article' | 'kg';
  /** As the source quotes it. */
  readonly amount: { readonly value: number; readonly unit: string; readonly evidence: Evidence };
  readonly decision: Decision;
};

export type Tolerance = { readonly value: number; readonly plusMinus: number };

export type MethodPayload = {
  readonly topic: 'method';
  readonly simulant?: string;
  readonly concentrationPercent?: number;
  readonly temperatureC?: Tolerance;
  readonly hours?: Tolerance;
  readonly light?: 'dark' | 'dark-if-cadmium' | 'any';
  readonly hot?: boolean;
  readonly fill?: string;
  readonly reporting?: string;
  readonly details?: string;
};

export type FiringPayload = {
  readonly topic: 'firing';
  readonly leastPeakC?: number;
  readonly glazedInside?: boolean;
  readonly details?: string;
};

export type VolumePayload = {
  readonly topic: 'volume-threshold';
  readonly mostPiecesAYear?: number;
  readonly mostTurnoverAYear?: Money;
  readonly details?: string;
};

export type TestingPayload = {
  readonly topic: 'testing';
  readonly who?: string;
  readonly accredited?: boolean;
  readonly often?: string;
  readonly details?: string;
};

export type CostPayload = {
  readonly topic: 'cost';
  readonly low: number;
  readonly high: number;
  readonly currency: string;
  readonly per: 'combination' | 'substance' | 'specimen';
  readonly asOf: CalendarDate;
};

export type LabelPayload = {
  readonly topic: 'label';
  /** Exact words by language (BCP 47), only where the source fixes them. */
  readonly words?: Readonly<Record<string, string>>;
  readonly leastLetterMm?: number;
  readonly permanent?: boolean;
  readonly placement?: string;
  readonly symbol?: string;
  readonly details?: string;
};

export type PaperPayload = {
  readonly topic: 'paper';
  readonly document: string;
  readonly fields?: readonly string[];
  readonly heldBy?: string;
  readonly stage?: string;
  readonly yearsKept?: number;
};

export const NOTE_TOPICS = [
  'registration',
  'representative',
  'traceability',
  'packaging',
  'customs',
  'surface',
  'practice',
  'other',
] as const;

export type NotePayload = {
  readonly topic: (typeof NOTE_TOPICS)[number];
  readonly who?: string;
  readonly where?: string;
  readonly by?: string;
  readonly link?: string;
  readonly details?: string;
};

export type Payload =
  LimitPayload | MethodPayload | FiringPayload | VolumePayload | TestingPayload | CostPayload | LabelPayload | PaperPayload | NotePayload;

/** One duty, advice or note of a region, with its condition, dates and sources. */
export type Rule = {
  readonly id: string;
  readonly region: string;
  readonly kind: 'adds' | 'replaces' | 'excepts';
  /** Rules this one defeats while it applies. */
  readonly targets: readonly string[];
  /** Rules this one stands beside although both replace the same target: the sources disagree. */
  readonly alongside: readonly string[];
  readonly when: Condition;
  /** In force from this day on. Null: since before our records. */
  readonly from: CalendarDate | null;
  /** In force until the day before. Null: no end known. */
  readonly to: CalendarDate | null;
  readonly order: number;
  readonly firm: boolean;
  readonly strength: Strength;
  readonly standing: Standing;
  readonly title: string;
  readonly says: string;
  readonly payload: Payload;
  readonly sources: readonly Citation[];
  /** Ids of the researched facts it carries. */
  readonly facts: readonly string[];
  readonly lookAgainBy: CalendarDate;
  readonly note?: string;
};

/** A dated, sourced definition used in conditions. `category` marks the classes of ware a region's limits speak of. */
export type Term = {
  readonly id: string;
  readonly region: string;
  readonly name: string;
  readonly says: string;
  readonly category: boolean;
  readonly when: Condition;
  readonly from: CalendarDate | null;
  readonly to: CalendarDate | null;
  readonly sources: readonly Citation[];
  readonly facts: readonly string[];
};

/** In force on that day: `from` included, `to` excluded. */
export function isInForce(span: { readonly from: CalendarDate | null; readonly to: CalendarDate | null }, on: CalendarDate): boolean {
  return (span.from === null || span.from <= on) && (span.to === null || on < span.to);
}
