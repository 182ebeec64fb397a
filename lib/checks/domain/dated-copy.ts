import { canonicalJson, type Json } from '@/lib/kernel/canonical-json';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { RegionLine } from '@/lib/regions/domain/line';
import type { Answers } from './knowledge';
import type { Place } from './line';

/** Number of the engine's rules of judging. A change of meaning raises it and keeps the earlier evaluator for earlier copies. */
export const SEMANTICS = 1;

/** All that a result rested on, and nothing else: judging it again gives the same result. */
export type DatedCopy = {
  readonly semantics: number;
  readonly on: CalendarDate;
  /** Fingerprint of the list of questions. */
  readonly questions: string;
  readonly regions: readonly {
    readonly code: string;
    readonly line: RegionLine['layers'];
    readonly except: RegionLine['except'];
    /** The base layer included, general to local. */
    readonly editions: readonly { readonly region: string; readonly number: number; readonly hash: string }[];
  }[];
  /** Places that are part of another on that day. */
  readonly places: readonly Place[];
  readonly answers: Answers;
  readonly declined: readonly string[];
};

/**
 * The copy as canonical text (RFC 8785): equal for equal copies, whatever the order in which answers were given.
 * Its SHA-256 is the copy's address.
 */
export function copyText(copy: DatedCopy): string {
  const document: Json = { ...copy, declined: [...new Set(copy.declined)].sort() };
  return canonicalJson(document);
}
