import { canonicalJson, type Json } from '@/lib/kernel/canonical-json';

/** One line of the day book: who did what to what, and why. Persons are named by the id of their account alone. */
export type DayBookEntry = {
  /** 1, 2, 3 … without a gap. */
  readonly number: number;
  readonly at: Date;
  /** Null for what the site did by itself. */
  readonly actorId: string | null;
  /** `role.grant`. */
  readonly did: string;
  readonly subject: { readonly kind: string; readonly id: string };
  readonly reason: string | null;
  readonly details: Json;
};

/** An entry bound to the one before it by that one's hash. */
export type BoundEntry = DayBookEntry & { readonly previousHash: string; readonly hash: string };

/** What stands before the first entry. */
export const BEGINNING = '0'.repeat(64);

/** The text whose SHA-256 is the entry's hash. It holds the hash of the entry before, so that no earlier line can change unseen. */
export function boundText(entry: DayBookEntry, previousHash: string): string {
  const { number, at, actorId, did, subject, reason, details } = entry;
  return canonicalJson({ number, at: at.toISOString(), actorId, did, subject, reason, details, previousHash });
}

/** Where the chain of the day book does not hold. */
export type Break = { readonly number: number; readonly why: 'missing' | 'not-bound' | 'changed' | 'cut-off' };

/**
 * The first break among entries that follow `before`, whose numbers ascend. `hashOf` is SHA-256; the domain has none of its own.
 */
export function firstBreak(
  entries: readonly BoundEntry[],
  before: { readonly number: number; readonly hash: string },
  hashOf: (text: string) => string,
): Break | null {
  let last = before;
  for (const entry of entries) {
    const number = last.number + 1;
    if (entry.number !== number) return { number, why: 'missing' };
    if (entry.previousHash !== last.hash) return { number, why: 'not-bound' };
    if (entry.hash !== hashOf(boundText(entry, entry.previousHash))) return { number, why: 'changed' };
    last = entry;
  }
  return null;
}
